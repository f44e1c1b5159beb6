import { z } from 'zod';
import type { Role } from './people.ts';

export const caseStates = [
  'draft',
  'submitted',
  'sent-back',
  'complete',
  'under-review',
  'open-for-comment',
  'report-issued',
  'continued',
  'heard',
  'approved',
  'approved-with-conditions',
  'refused',
  'appealed',
  'remanded',
  'withdrawn',
] as const;
export const caseStateSchema = z.enum(caseStates);
export type CaseState = z.infer<typeof caseStateSchema>;

/** The words for a state, as people read them. */
export const caseStateWords = {
  draft: 'Draft',
  submitted: 'Submitted',
  'sent-back': 'Sent back for correction',
  complete: 'Complete',
  'under-review': 'Under review',
  'open-for-comment': 'Open for comment',
  'report-issued': 'Report issued',
  continued: 'Continued',
  heard: 'Heard',
  approved: 'Approved',
  'approved-with-conditions': 'Approved with conditions',
  refused: 'Refused',
  appealed: 'Appealed',
  remanded: 'Remanded',
  withdrawn: 'Withdrawn',
} as const satisfies Record<CaseState, string>;

/** What must hold before a transition; each is checked by the server under this name. */
export const transitionGuards = ['sound-massing', 'finished-study', 'issued-report'] as const;
export type TransitionGuard = (typeof transitionGuards)[number];

export interface CaseTransition {
  from: readonly CaseState[];
  to: CaseState;
  by: readonly Role[];
  guards: readonly TransitionGuard[];
  /** A reason must be written. */
  needsReason: boolean;
  /** The label of the button. */
  label: string;
}

const decisions = ['approved', 'approved-with-conditions', 'refused'] as const;
const beforeDecision = [
  'draft',
  'submitted',
  'sent-back',
  'complete',
  'under-review',
  'open-for-comment',
  'report-issued',
  'continued',
  'heard',
  'appealed',
  'remanded',
] as const;

/** The one state machine of a case. */
export const caseTransitions: readonly CaseTransition[] = [
  {
    from: ['draft', 'sent-back'],
    to: 'submitted',
    by: ['applicant'],
    guards: ['sound-massing'],
    needsReason: false,
    label: 'Submit the application',
  },
  {
    from: ['submitted', 'complete', 'under-review'],
    to: 'sent-back',
    by: ['planner'],
    guards: [],
    needsReason: true,
    label: 'Send back for correction',
  },
  {
    from: ['submitted'],
    to: 'complete',
    by: ['planner'],
    guards: [],
    needsReason: false,
    label: 'Declare the application complete',
  },
  {
    from: ['complete', 'remanded'],
    to: 'under-review',
    by: ['planner'],
    guards: [],
    needsReason: false,
    label: 'Take under review',
  },
  {
    from: ['under-review'],
    to: 'open-for-comment',
    by: ['planner'],
    guards: ['finished-study'],
    needsReason: false,
    label: 'Publish and open for comment',
  },
  {
    from: ['open-for-comment', 'continued'],
    to: 'report-issued',
    by: ['planner'],
    guards: ['finished-study', 'issued-report'],
    needsReason: false,
    label: 'Send the report to the board',
  },
  {
    from: ['report-issued', 'heard'],
    to: 'continued',
    by: ['planner'],
    guards: [],
    needsReason: true,
    label: 'Continue to another date',
  },
  {
    from: ['report-issued'],
    to: 'heard',
    by: ['planner'],
    guards: [],
    needsReason: false,
    label: 'Record the hearing as held',
  },
  ...decisions.map((to): CaseTransition => ({
    from: ['heard'],
    to,
    by: ['planner'],
    guards: [],
    needsReason: true,
    label: {
      approved: 'Record approval',
      'approved-with-conditions': 'Record approval with conditions',
      refused: 'Record refusal',
    }[to],
  })),
  {
    from: decisions,
    to: 'appealed',
    by: ['planner'],
    guards: [],
    needsReason: true,
    label: 'Record an appeal',
  },
  {
    from: decisions,
    to: 'remanded',
    by: ['planner'],
    guards: [],
    needsReason: true,
    label: 'Record a remand',
  },
  {
    from: beforeDecision,
    to: 'withdrawn',
    by: ['applicant', 'planner'],
    guards: [],
    needsReason: true,
    label: 'Withdraw the application',
  },
];

/** The states in which anybody may see a case. */
export const publicCaseStates: readonly CaseState[] = [
  'open-for-comment',
  'report-issued',
  'continued',
  'heard',
  'approved',
  'approved-with-conditions',
  'refused',
  'appealed',
  'remanded',
];

/** The states in which an applicant may change the application and upload a massing. */
export const editableCaseStates: readonly CaseState[] = ['draft', 'sent-back'];

/** The states in which a neighbour's comment is taken. */
export const commentableCaseStates: readonly CaseState[] = ['open-for-comment', 'continued'];

/** The transition from one state to another, or null where there is none. */
export function findTransition(from: CaseState, to: CaseState): CaseTransition | null {
  return caseTransitions.find((one) => one.to === to && one.from.includes(from)) ?? null;
}
