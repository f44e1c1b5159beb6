import { loadClipper } from './clipper.ts';
import { parseEnv } from './env.ts';
import { createJobQueue } from './jobs/job-queue.ts';
import { startWorker } from './jobs/start-worker.ts';
import { createLogger } from './logger.ts';
import { createOrm } from './orm.ts';

const env = parseEnv(process.env);
const logger = createLogger(env);
const orm = await createOrm(env.DATABASE_URL);
const queue = createJobQueue(env.DATABASE_URL, { supervise: true });
queue.on('error', (error) => logger.error({ err: error }, 'the job queue failed'));
const worker = await startWorker({ orm, queue, clipper: await loadClipper(), logger });
logger.info('worker ready');

let isStopping = false;

async function stop(signal: NodeJS.Signals): Promise<void> {
  if (isStopping) return;
  isStopping = true;
  logger.info({ signal }, 'stopping');
  await worker.stop();
  await orm.close();
}

process.on('SIGTERM', (signal) => void stop(signal));
process.on('SIGINT', (signal) => void stop(signal));
