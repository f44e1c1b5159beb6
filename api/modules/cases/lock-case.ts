import { LockMode } from '@mikro-orm/core';
import type { EntityManager } from '@mikro-orm/postgresql';
import type { CaseAbility } from '../../../shared/contracts/cases.ts';
import type { Actor } from '../../policy.ts';
import { requireOnCase } from './get-case.ts';
import { ReviewCase } from './review-case.entity.ts';

/**
 * The case, locked until the transaction ends: what is numbered or must be alone in a case is written
 * under this lock. It is read afresh, and the person's right is looked at again, because the case may
 * have moved on meanwhile.
 */
export async function lockCaseFor(
  tx: EntityManager,
  actor: Actor | null,
  caseId: string,
  ability: CaseAbility,
): Promise<ReviewCase> {
  const reviewCase = await tx.findOneOrFail(ReviewCase, caseId, {
    lockMode: LockMode.PESSIMISTIC_WRITE,
    refresh: true,
  });
  requireOnCase(actor, ability, reviewCase);
  return reviewCase;
}
