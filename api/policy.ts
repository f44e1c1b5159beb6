import {
  caseStates,
  caseTransitions,
  commentableCaseStates,
  editableCaseStates,
  publicCaseStates,
} from '../shared/contracts/case-life.ts';
import type { CaseState, CaseTransition } from '../shared/contracts/case-life.ts';
import { caseAbilities } from '../shared/contracts/cases.ts';
import type { CaseAbility } from '../shared/contracts/cases.ts';
import type { Role } from '../shared/contracts/people.ts';
import type { RuleAbility, RuleVersionState } from '../shared/contracts/rules.ts';

/** Who acts: somebody signed in, or null for the public. */
export interface Actor {
  id: string;
  role: Role;
}

/** What the policy needs to know of a case. */
export interface CaseFacts {
  state: CaseState;
  applicantId: string;
}

export type CaseAction = 'see' | CaseAbility;

/** `owner` is the applicant of this very case; `anybody` includes people who are signed in. */
type Party = 'anybody' | 'owner' | 'planner' | 'board' | 'administrator';

type Grants = Partial<Record<Party, readonly CaseState[]>>;

const sentIn = caseStates.filter((state) => state !== 'draft');

/** THE policy: for each action, who may take it in which states of the case. */
const caseGrants: Record<CaseAction, Grants> = {
  see: {
    anybody: publicCaseStates,
    owner: caseStates,
    planner: sentIn,
    administrator: sentIn,
  },
  edit: { owner: editableCaseStates },
  'upload-massing': { owner: editableCaseStates },
  'request-study': {
    planner: [
      'submitted',
      'complete',
      'under-review',
      'open-for-comment',
      'report-issued',
      'continued',
      'remanded',
    ],
  },
  'read-study': {
    anybody: publicCaseStates,
    owner: sentIn,
    planner: sentIn,
    administrator: sentIn,
  },
  'read-every-comment': { planner: sentIn, administrator: sentIn },
  'moderate-comments': { planner: publicCaseStates },
  'write-comment': { anybody: commentableCaseStates },
  'issue-report': { planner: ['open-for-comment', 'report-issued', 'continued'] },
  'read-report': {
    anybody: publicCaseStates,
    owner: sentIn,
    planner: sentIn,
    administrator: sentIn,
  },
};

/** Whether this person may take this action on this case now. */
export function mayOnCase(actor: Actor | null, action: CaseAction, facts: CaseFacts): boolean {
  const grants = caseGrants[action];
  return partiesOf(actor, facts).some((party) => grants[party]?.includes(facts.state) ?? false);
}

/** All that this person may do with this case now. */
export function abilitiesOnCase(actor: Actor | null, facts: CaseFacts): CaseAbility[] {
  return caseAbilities.filter((ability) => mayOnCase(actor, ability, facts));
}

/** The states in which a role other than the applicant sees every case. */
export function statesSeenBy(role: Role | null): readonly CaseState[] {
  const seen = caseGrants.see;
  const party = role === null || role === 'applicant' ? 'anybody' : role;
  return seen[party] ?? seen.anybody ?? [];
}

/** Whether this person may make this transition, its guards apart. */
export function mayTransition(
  actor: Actor | null,
  transition: CaseTransition,
  facts: CaseFacts,
): boolean {
  if (actor === null || !transition.from.includes(facts.state)) return false;
  if (!transition.by.includes(actor.role)) return false;
  return actor.role !== 'applicant' || actor.id === facts.applicantId;
}

/** The transitions that this person may make now, their guards apart. */
export function transitionsOnCase(actor: Actor | null, facts: CaseFacts): CaseTransition[] {
  return caseTransitions.filter((transition) => mayTransition(actor, transition, facts));
}

/** Whether this person may read a version of the rule that is not in force yet. */
export function mayReadRuleDrafts(actor: Actor | null): boolean {
  return actor?.role === 'administrator' || actor?.role === 'planner';
}

/** Who writes the rule, and who tries it on a case. */
export const ruleWriters = ['administrator'] as const satisfies readonly Role[];
export const ruleTriers = ['administrator', 'planner'] as const satisfies readonly Role[];

/** All that this person may do with a version of the rule now: one that has come into force stays as it is. */
export function abilitiesOnRule(actor: Actor | null, state: RuleVersionState): RuleAbility[] {
  const isKept = state === 'in-force' || state === 'retired';
  const may = (roles: readonly Role[]) => actor !== null && roles.includes(actor.role);
  return [
    ...(may(ruleWriters) ? (['copy'] as const) : []),
    ...(may(ruleWriters) && !isKept ? (['change', 'enact'] as const) : []),
    ...(may(ruleTriers) ? (['try'] as const) : []),
  ];
}

function partiesOf(actor: Actor | null, facts: CaseFacts): Party[] {
  if (actor === null) return ['anybody'];
  if (actor.role === 'applicant') {
    return actor.id === facts.applicantId ? ['anybody', 'owner'] : ['anybody'];
  }
  return ['anybody', actor.role];
}
