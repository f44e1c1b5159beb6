import { LockMode } from '@mikro-orm/core';
import type { EntityManager } from '@mikro-orm/postgresql';
import { caseStateWords, findTransition } from '../../../shared/contracts/case-life.ts';
import type { TransitionInput } from '../../../shared/contracts/cases.ts';
import { AppError } from '../../errors.ts';
import { mayTransition } from '../../policy.ts';
import type { Actor } from '../../policy.ts';
import { Person } from '../people/person.entity.ts';
import { civilDateIn, getMunicipality } from '../settings/get-municipality.ts';
import { loadCaseStanding } from './case-standing.ts';
import { CaseTransition } from './case-transition.entity.ts';
import { caseFacts, getCase } from './get-case.ts';
import { giveCaseNumber } from './give-case-number.ts';
import { ReviewCase } from './review-case.entity.ts';
import { findObstacle } from './transition-guards.ts';

/** Takes a case to its next state; the number, the history and the state are written together or not at all. */
export async function changeCaseState(
  em: EntityManager,
  actor: Actor,
  reference: string,
  input: TransitionInput,
  now: Date,
): Promise<ReviewCase> {
  const seen = await getCase(em, actor, reference);
  return em.transactional(async (tx) => {
    // Locked, so that of two people who decide at once the second sees what the first did.
    const reviewCase = await tx.findOneOrFail(ReviewCase, seen.id, {
      lockMode: LockMode.PESSIMISTIC_WRITE,
      refresh: true,
    });
    const from = reviewCase.state;
    await requireTransition(tx, actor, reviewCase, input);

    const hasNumber = (reviewCase.number ?? null) !== null;
    if (!hasNumber && input.to === 'submitted') {
      const civilDate = civilDateIn(await getMunicipality(tx), now);
      reviewCase.number = await giveCaseNumber(tx, Number(civilDate.slice(0, 4)));
    }
    tx.create(CaseTransition, {
      reviewCase,
      position: (await tx.count(CaseTransition, { reviewCase: reviewCase.id })) + 1,
      from,
      to: input.to,
      at: now,
      by: await tx.findOneOrFail(Person, actor.id),
      byRole: actor.role,
      reason: reasonOf(input),
      dueDate: input.to === 'sent-back' ? (input.dueDate ?? null) : null,
    });
    reviewCase.state = input.to;
    reviewCase.stateSince = now;
    return reviewCase;
  });
}

async function requireTransition(
  tx: EntityManager,
  actor: Actor,
  reviewCase: ReviewCase,
  input: TransitionInput,
): Promise<void> {
  if (input.from !== undefined && input.from !== reviewCase.state) {
    throw new AppError('CASE_CHANGED_MEANWHILE');
  }
  const transition = findTransition(reviewCase.state, input.to);
  if (transition === null) {
    const { state } = reviewCase;
    throw new AppError('CASE_TRANSITION_REFUSED', {
      title: `A case in the state “${caseStateWords[state]}” cannot become “${caseStateWords[input.to]}”.`,
    });
  }
  if (!mayTransition(actor, transition, caseFacts(reviewCase))) throw new AppError('FORBIDDEN');
  if (transition.needsReason && reasonOf(input) === null) {
    throw new AppError('INPUT_INVALID', {
      errors: [{ path: 'reason', message: 'Write the reason; it is kept with the case.' }],
    });
  }
  const obstacle = findObstacle(transition, await loadCaseStanding(tx, reviewCase));
  if (obstacle !== null) throw new AppError(obstacle.code, { title: obstacle.title });
}

function reasonOf({ reason }: TransitionInput): string | null {
  return reason === undefined || reason === '' ? null : reason;
}
