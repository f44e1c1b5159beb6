import type { z } from 'zod';
import { runStudy } from '../modules/studies/run-study.ts';
import type { JobContext } from './job-context.ts';
import type { runStudyJob } from './job-definitions.ts';

export function handleRunStudy(
  { studyId }: z.output<typeof runStudyJob.payload>,
  context: JobContext,
): Promise<void> {
  return runStudy(studyId, context);
}
