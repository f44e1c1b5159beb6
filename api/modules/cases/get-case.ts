import type { EntityManager } from '@mikro-orm/postgresql';
import type { CaseAbility } from '../../../shared/contracts/cases.ts';
import { AppError } from '../../errors.ts';
import { mayOnCase } from '../../policy.ts';
import type { Actor, CaseFacts } from '../../policy.ts';
import { ReviewCase } from './review-case.entity.ts';

/** What the policy needs to know of this case. */
export function caseFacts(reviewCase: ReviewCase): CaseFacts {
  return { state: reviewCase.state, applicantId: reviewCase.applicant.id };
}

/** The case under this number or draft key. Throws NOT_FOUND also for a case that the person may not see. */
export async function getCase(
  em: EntityManager,
  actor: Actor | null,
  reference: string,
): Promise<ReviewCase> {
  const reviewCase = await em.findOne(
    ReviewCase,
    reference.startsWith('draft-') ? { draftKey: reference } : { number: reference },
    { populate: ['applicant'] },
  );
  if (reviewCase === null || !mayOnCase(actor, 'see', caseFacts(reviewCase))) {
    throw new AppError('NOT_FOUND', { title: 'There is no such case, or it is not public.' });
  }
  return reviewCase;
}

/** The same, for an action: throws FORBIDDEN where the person may see the case but not do this. */
export async function getCaseFor(
  em: EntityManager,
  actor: Actor | null,
  reference: string,
  ability: CaseAbility,
): Promise<ReviewCase> {
  const reviewCase = await getCase(em, actor, reference);
  requireOnCase(actor, ability, reviewCase);
  return reviewCase;
}

/** Throws NOT_SIGNED_IN or FORBIDDEN where the person may not do this with the case now. */
export function requireOnCase(
  actor: Actor | null,
  ability: CaseAbility,
  reviewCase: ReviewCase,
): void {
  if (mayOnCase(actor, ability, caseFacts(reviewCase))) return;
  throw actor === null
    ? new AppError('NOT_SIGNED_IN')
    : new AppError('FORBIDDEN', {
        title: 'Your account may not do this with the case in its present state.',
      });
}
