import express from 'express';
import type { Express } from 'express';
import type { AppDeps } from './deps.ts';
import { endpoints } from './endpoints.ts';
import { errorHandler, notFoundHandler } from './middleware/error-handler.ts';
import { jsonBody } from './middleware/json-body.ts';
import { originCheck } from './middleware/origin-check.ts';
import { packed } from './middleware/packed.ts';
import { requestLog } from './middleware/request-log.ts';
import { securityHeaders } from './middleware/security-headers.ts';
import { sessions } from './middleware/session.ts';
import { mountEndpoints } from './mount-endpoints.ts';
import { mountWebClient } from './web-client.ts';

const bodyLimit = '1mb';

/** Wires the application; it listens nowhere and closes nothing. */
export function createApp(deps: AppDeps): Express {
  const { env } = deps;
  const app = express();
  app.disable('x-powered-by');
  app.set('trust proxy', env.TRUSTED_PROXIES);
  app.set('query parser', 'simple');

  app.use(requestLog(deps.logger));
  app.use(securityHeaders(env.PUBLIC_URL));
  app.use(packed());
  app.use(
    '/api',
    originCheck(env.PUBLIC_URL),
    sessions(env, deps.sessionStore),
    jsonBody(bodyLimit),
  );
  mountEndpoints(app, endpoints, deps);
  app.use('/api', notFoundHandler);
  mountWebClient(app, env.WEB_DIST);
  app.use(notFoundHandler);
  app.use(errorHandler);
  return app;
}
