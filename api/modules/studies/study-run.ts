import { randomUUID } from 'node:crypto';
import type { EntityManager } from '@mikro-orm/postgresql';
import type PgBoss from 'pg-boss';
import { enqueueJob } from '../../jobs/enqueue-job.ts';
import { runStudyJob } from '../../jobs/job-definitions.ts';

/** A run that shows no life for so long is taken for dead, and its study is given to another. */
export const studyLeaseMs = 15_000;
/** A study that is begun so often without an end is given up: it would take down worker after worker. */
const mostAttempts = 3;

/** One worker's hold on one study. */
export interface StudyRun {
  studyId: string;
  claim: string;
}

/**
 * Takes hold of a study that waits, or whose run is dead. Null where there is nothing to do: it has
 * ended, was cancelled, or another worker is at it.
 */
export async function claimStudy(em: EntityManager, studyId: string): Promise<StudyRun | null> {
  const claim = randomUUID();
  const claimed = await em.execute<unknown[]>(
    `update study set status = 'running', claim = ?, heartbeat_at = now(), attempts = attempts + 1,
       instants_done = 0
     where id = ?
       and (status = 'queued' or (status = 'running' and heartbeat_at < now() - ? * interval '1 ms'))
     returning id`,
    [claim, studyId, studyLeaseMs],
  );
  return claimed.length === 1 ? { studyId, claim } : null;
}

/** Writes how far the run is and that it lives; false where the study is no longer this run's. */
export async function reportProgress(
  em: EntityManager,
  { studyId, claim }: StudyRun,
  instantsDone: number,
  instantsTotal: number,
): Promise<boolean> {
  const held = await em.execute<unknown[]>(
    `update study set instants_done = ?, instants_total = ?, heartbeat_at = now()
     where id = ? and claim = ? and status = 'running' returning id`,
    [instantsDone, instantsTotal, studyId, claim],
  );
  return held.length === 1;
}

/** Ends the run without a result; `failure` is a sentence. */
export async function failStudy(
  em: EntityManager,
  { studyId, claim }: StudyRun,
  failure: string,
): Promise<void> {
  await em.execute(
    `update study set status = 'failed', claim = null, failure = ?, finished_at = now()
     where id = ? and claim = ? and status = 'running'`,
    [failure, studyId, claim],
  );
}

/** Gives the study back to the queue, because this worker stops. */
export async function handBackStudy(
  em: EntityManager,
  queue: PgBoss,
  { studyId, claim }: StudyRun,
): Promise<void> {
  await em.transactional(async (tx) => {
    const held = await tx.execute<unknown[]>(
      `update study set status = 'queued', claim = null, attempts = attempts - 1
       where id = ? and claim = ? and status = 'running' returning id`,
      [studyId, claim],
    );
    if (held.length === 1) await enqueueJob(tx, queue, runStudyJob, { version: 1, studyId });
  });
}

/** Puts the studies of dead runs back into the queue, or gives them up; returns how many were found. */
export async function requeueDeadStudies(
  em: EntityManager,
  queue: PgBoss,
  leaseMs = studyLeaseMs,
): Promise<number> {
  return em.transactional(async (tx) => {
    const dead = await tx.execute<{ id: string; status: string }[]>(
      `update study set claim = null,
         status = case when attempts < ? then 'queued' else 'failed' end,
         finished_at = case when attempts < ? then null else now() end,
         failure = case when attempts < ? then null else ? end
       where status = 'running' and heartbeat_at < now() - ? * interval '1 ms'
       returning id, status`,
      [
        mostAttempts,
        mostAttempts,
        mostAttempts,
        `The computation broke off ${mostAttempts} times without a result. Tell the operator: the worker's log says more.`,
        leaseMs,
      ],
    );
    for (const { id, status } of dead) {
      if (status === 'queued') {
        await enqueueJob(tx, queue, runStudyJob, { version: 1, studyId: id });
      }
    }
    return dead.length;
  });
}
