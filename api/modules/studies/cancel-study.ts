import { LockMode } from '@mikro-orm/core';
import type { EntityManager } from '@mikro-orm/postgresql';
import type { Actor } from '../../policy.ts';
import { requireOnCase } from '../cases/get-case.ts';
import { getStudy } from './get-study.ts';
import { Study } from './study.entity.ts';

/** Stops a study that waits or runs: its worker finds out with its next step. A study that has ended stays as it is. */
export async function cancelStudy(em: EntityManager, actor: Actor, id: string): Promise<Study> {
  const seen = await getStudy(em, actor, id);
  requireOnCase(actor, 'request-study', seen.reviewCase);
  return em.transactional(async (tx) => {
    const study = await tx.findOneOrFail(Study, id, {
      lockMode: LockMode.PESSIMISTIC_WRITE,
      refresh: true,
    });
    if (study.status === 'queued' || study.status === 'running') {
      tx.assign(study, { status: 'cancelled', claim: null, finishedAt: new Date() });
    }
    return study;
  });
}
