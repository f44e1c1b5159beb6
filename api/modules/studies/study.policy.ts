import type { StudyStatus } from '../../../shared/contracts/cases.ts';
import { mayOnCase } from '../../policy.ts';
import type { Actor, CaseFacts } from '../../policy.ts';

/** Everybody who may read a case's studies reads the finished ones; those who work on the case read all. */
export function maySeeStudy(actor: Actor | null, facts: CaseFacts, status: StudyStatus): boolean {
  return (
    mayOnCase(actor, 'read-study', facts) && (status === 'finished' || worksOnCase(actor, facts))
  );
}

function worksOnCase(actor: Actor | null, { applicantId }: CaseFacts): boolean {
  return (
    actor !== null &&
    (actor.role === 'planner' || actor.role === 'administrator' || actor.id === applicantId)
  );
}
