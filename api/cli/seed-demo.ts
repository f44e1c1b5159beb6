import { loadClipper } from '../clipper.ts';
import { parseEnv } from '../env.ts';
import { createJobQueue } from '../jobs/job-queue.ts';
import { createLogger } from '../logger.ts';
import { createOrm } from '../orm.ts';
import { seedDemo } from '../seeders/seed-demo.ts';

/** Fills an empty database with the demo town; does nothing where there are people. */
const env = parseEnv(process.env);
if (env.NODE_ENV === 'production') {
  console.error('There is no demo data in production.');
  process.exit(1);
}
const logger = createLogger({ LOG_LEVEL: 'warn' });
const orm = await createOrm(env.DATABASE_OWNER_URL);
const queue = createJobQueue(env.DATABASE_OWNER_URL, { supervise: false });
queue.on('error', (error) => logger.error({ err: error }, 'the job queue failed'));
await queue.start();
try {
  const clipper = await loadClipper();
  const lines = await seedDemo({ orm, queue, clipper, logger, publicUrl: env.PUBLIC_URL });
  for (const line of lines) console.log(line);
} finally {
  await queue.stop({ graceful: false });
  await orm.close();
}
