import type { JobContext } from './job-context.ts';
import type { JobDefinition } from './job-definitions.ts';
import { runStudyJob } from './job-definitions.ts';
import { handleRunStudy } from './run-study.job.ts';

interface RegisteredJob {
  id: string;
  /** Checks what lay in the queue and works it off. */
  work: (data: unknown, context: JobContext) => Promise<void>;
}

function register<Payload extends object>(
  { id, payload }: JobDefinition<Payload>,
  handle: (payload: Payload, context: JobContext) => Promise<void>,
): RegisteredJob {
  return { id, work: (data, context) => handle(payload.parse(data), context) };
}

/** Every job with its handler: what a worker works off. */
export const jobRegistry: readonly RegisteredJob[] = [register(runStudyJob, handleRunStudy)];
