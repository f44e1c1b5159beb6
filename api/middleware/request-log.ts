import { randomUUID } from 'node:crypto';
import type { IncomingMessage, ServerResponse } from 'node:http';
import type { RequestHandler } from 'express';
import type { Logger } from 'pino';
import { pinoHttp } from 'pino-http';
import { serializeError } from '../logger.ts';

/**
 * Gives every request an id and logs it without personal data: no bodies, no cookies, no addresses
 * of machines, and no query strings, which may hold street or e-mail addresses.
 */
export function requestLog(logger: Logger): RequestHandler {
  return pinoHttp({
    logger,
    genReqId: (_request: IncomingMessage, response: ServerResponse) => {
      const id = randomUUID();
      response.setHeader('X-Request-Id', id);
      return id;
    },
    // Ours get the request and the error themselves, not pino's copies with headers and messages.
    wrapSerializers: false,
    serializers: {
      req: (request: IncomingMessage & { originalUrl?: string }) => ({
        id: request.id,
        method: request.method,
        path: (request.originalUrl ?? request.url ?? '').split('?', 1)[0],
      }),
      res: (response: ServerResponse) => ({ status: response.statusCode }),
      err: serializeError,
    },
    customLogLevel: (_request, response, error) => {
      if (error !== undefined || response.statusCode >= 500) return 'error';
      return response.statusCode >= 400 ? 'info' : 'debug';
    },
  });
}

/** The id under which this request stands in the log. */
export function requestIdOf(request: IncomingMessage): string {
  return typeof request.id === 'string' ? request.id : '';
}
