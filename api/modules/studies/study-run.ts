import { randomUUID } from 'node:crypto';
import { LockMode, raw } from '@mikro-orm/core';
import type { EntityManager } from '@mikro-orm/postgresql';
import type PgBoss from 'pg-boss';
import { enqueueJob } from '../../jobs/enqueue-job.ts';
import { runStudyJob } from '../../jobs/job-definitions.ts';
import { Study } from './study.entity.ts';

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
  const claimed = await em.nativeUpdate(
    Study,
    {
      id: studyId,
      $or: [{ status: 'queued' }, { status: 'running', heartbeatAt: { $lt: ago(studyLeaseMs) } }],
    },
    {
      status: 'running',
      claim,
      heartbeatAt: raw('now()'),
      attempts: raw('attempts + 1'),
      instantsDone: 0,
    },
  );
  return claimed === 1 ? { studyId, claim } : null;
}

/** Writes how far the run is and that it lives; false where the study is no longer this run's. */
export async function reportProgress(
  em: EntityManager,
  { studyId, claim }: StudyRun,
  instantsDone: number,
  instantsTotal: number,
): Promise<boolean> {
  const held = await em.nativeUpdate(Study, stillHeld(studyId, claim), {
    instantsDone,
    instantsTotal,
    heartbeatAt: raw('now()'),
  });
  return held === 1;
}

/** Ends the run without a result; `failure` is a sentence. */
export async function failStudy(
  em: EntityManager,
  { studyId, claim }: StudyRun,
  failure: string,
): Promise<void> {
  await em.nativeUpdate(Study, stillHeld(studyId, claim), {
    status: 'failed',
    claim: null,
    failure,
    finishedAt: raw('now()'),
  });
}

/** Gives the study back to the queue, because this worker stops. */
export async function handBackStudy(
  em: EntityManager,
  queue: PgBoss,
  { studyId, claim }: StudyRun,
): Promise<void> {
  await em.transactional(async (tx) => {
    const held = await tx.nativeUpdate(Study, stillHeld(studyId, claim), {
      status: 'queued',
      claim: null,
      attempts: raw('attempts - 1'),
    });
    if (held === 1) await enqueueJob(tx, queue, runStudyJob, { version: 1, studyId });
  });
}

/** Puts the studies of dead runs back into the queue, or gives them up; returns how many were found. */
export async function requeueDeadStudies(
  em: EntityManager,
  queue: PgBoss,
  leaseMs = studyLeaseMs,
): Promise<number> {
  return em.transactional(async (tx) => {
    const dead = await tx.find(
      Study,
      { status: 'running', heartbeatAt: { $lt: ago(leaseMs) } },
      { lockMode: LockMode.PESSIMISTIC_PARTIAL_WRITE },
    );
    for (const study of dead) {
      study.claim = null;
      if (study.attempts < mostAttempts) {
        study.status = 'queued';
        await enqueueJob(tx, queue, runStudyJob, { version: 1, studyId: study.id });
      } else {
        study.status = 'failed';
        study.finishedAt = new Date();
        study.failure = `The computation broke off ${mostAttempts} times without a result. Tell the operator: the worker's log says more.`;
      }
    }
    return dead.length;
  });
}

/** The study as long as it is this run's. */
function stillHeld(id: string, claim: string) {
  return { id, claim, status: 'running' } as const;
}

/** By the database's clock, which all workers share. */
function ago(milliseconds: number): Date {
  return raw<Study, Date>("now() - ? * interval '1 ms'", [milliseconds]);
}
