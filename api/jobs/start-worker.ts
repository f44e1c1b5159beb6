import { requeueDeadStudies } from '../modules/studies/study-run.ts';
import type { JobContext } from './job-context.ts';
import { jobRegistry } from './job-registry.ts';

const pollEverySeconds = 0.5;
const lookForDeadEveryMs = 5000;
/** What is under way ends or is handed back within this time; then the worker goes. */
const stopWithinMs = 20_000;

/**
 * Works off the queue until it is stopped. Several workers may share one database: each job is given
 * to one of them, and what a worker leaves behind when it dies is taken up by the others.
 */
export async function startWorker(context: Omit<JobContext, 'stopping'>): Promise<{
  stop(): Promise<void>;
}> {
  const { orm, queue, logger } = context;
  const stopping = new AbortController();

  await queue.start();
  const lookForDead = async () => {
    try {
      const found = await requeueDeadStudies(orm.em.fork(), queue);
      if (found > 0) logger.warn({ found }, 'took up studies of a worker that is gone');
    } catch (error) {
      logger.error({ err: error }, 'could not look for studies of dead workers');
    }
  };
  await lookForDead();
  const timer = setInterval(() => void lookForDead(), lookForDeadEveryMs);

  for (const { id, work } of jobRegistry) {
    await queue.work(id, { pollingIntervalSeconds: pollEverySeconds }, async (jobs) => {
      for (const job of jobs) {
        await work(job.data, { ...context, stopping: stopping.signal });
      }
    });
  }
  return {
    stop: async () => {
      clearInterval(timer);
      stopping.abort();
      await queue.stop({ graceful: true, wait: true, timeout: stopWithinMs });
    },
  };
}
