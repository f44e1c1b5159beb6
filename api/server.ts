import { createApp } from './app.ts';
import { loadClipper } from './clipper.ts';
import { parseEnv } from './env.ts';
import { createJobQueue } from './jobs/job-queue.ts';
import { createLogger } from './logger.ts';
import { createSessionStore } from './middleware/session.ts';
import { createOrm } from './orm.ts';

/** Open requests get this long to end; streams of events are cut off after it. */
const stopWithinMs = 5000;

const env = parseEnv(process.env);
const logger = createLogger(env);
const orm = await createOrm(env.DATABASE_URL);
const queue = createJobQueue(env.DATABASE_URL, { supervise: false });
queue.on('error', (error) => logger.error({ err: error }, 'the job queue failed'));
await queue.start();
const sessionStore = createSessionStore(env.DATABASE_URL);
const clipper = await loadClipper();
const app = createApp({ orm, env, queue, clipper, logger, sessionStore });

const server = app.listen(env.PORT, env.HOST, (error) => {
  if (error === undefined) {
    logger.info({ host: env.HOST, port: env.PORT }, 'listening');
    return;
  }
  logger.fatal({ err: error }, 'cannot listen');
  process.exitCode = 1;
  void close();
});

async function close(): Promise<void> {
  await queue.stop({ graceful: true, wait: true, timeout: stopWithinMs });
  sessionStore.close();
  await orm.close();
}

let isStopping = false;

function stop(signal: NodeJS.Signals): void {
  if (isStopping) return;
  isStopping = true;
  logger.info({ signal }, 'stopping');
  const cutOff = setTimeout(() => server.closeAllConnections(), stopWithinMs);
  server.close(() => {
    clearTimeout(cutOff);
    void close();
  });
  server.closeIdleConnections();
}

process.on('SIGTERM', stop);
process.on('SIGINT', stop);
