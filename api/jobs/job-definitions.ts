import { z } from 'zod';

/** A job as it lies in the queue: a name that never changes, what it carries, how often it is tried. */
export interface JobDefinition<Payload extends object = object> {
  id: string;
  payload: z.ZodType<Payload>;
  queue: {
    /** How often it is tried again after an unexpected error. */
    retryLimit: number;
    retryDelay: number;
    /** The queue gives up on a job that is held longer than this. */
    expireInSeconds: number;
  };
}

/** Computes a study. That a dead worker's study is taken up again is seen to by the study's own lease. */
export const runStudyJob = {
  id: 'run-study',
  payload: z.strictObject({ version: z.literal(1), studyId: z.uuid() }),
  queue: { retryLimit: 3, retryDelay: 2, expireInSeconds: 4 * 60 * 60 },
} satisfies JobDefinition;

/** Every job that lies in the queue; `api/cli/migrate.ts` makes a queue for each. */
export const jobDefinitions: readonly JobDefinition[] = [runStudyJob];
