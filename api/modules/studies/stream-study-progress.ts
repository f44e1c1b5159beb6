import { setTimeout as wait } from 'node:timers/promises';
import type { EntityManager } from '@mikro-orm/postgresql';
import type { Response } from 'express';
import { studyProgressSchema } from '../../../shared/contracts/studies.ts';
import type { StudyProgress } from '../../../shared/contracts/studies.ts';
import { Study } from './study.entity.ts';

const pollEveryMs = 300;
/** Proxies cut a line that is silent for long. */
const heartbeatEveryMs = 15_000;

/**
 * Tells a study's progress as server-sent events named `progress`, until the study has ended or the
 * person goes away. The row is looked at again and again: whichever worker writes it need not be known.
 */
export async function streamStudyProgress(
  em: EntityManager,
  studyId: string,
  response: Response,
): Promise<void> {
  const gone = new AbortController();
  response.on('close', () => gone.abort());
  response.status(200).set({
    'Content-Type': 'text/event-stream; charset=utf-8',
    'Cache-Control': 'no-store',
    'X-Accel-Buffering': 'no',
  });
  response.flushHeaders();

  let told = '';
  let lastMs = performance.now();
  while (!gone.signal.aborted) {
    const progress = await findProgress(em, studyId);
    const text = JSON.stringify(progress);
    if (text !== told) {
      response.write(`event: progress\ndata: ${text}\n\n`);
      told = text;
      lastMs = performance.now();
    } else if (performance.now() - lastMs > heartbeatEveryMs) {
      response.write(': still here\n\n');
      lastMs = performance.now();
    }
    if (progress.status !== 'queued' && progress.status !== 'running') break;
    await wait(pollEveryMs, undefined, { signal: gone.signal }).catch(() => undefined);
  }
  response.end();
}

async function findProgress(em: EntityManager, studyId: string): Promise<StudyProgress> {
  const study = await em.findOneOrFail(Study, studyId, {
    fields: ['status', 'instantsDone', 'instantsTotal'],
    // The row changes while it is watched.
    disableIdentityMap: true,
  });
  return studyProgressSchema.parse(study);
}
