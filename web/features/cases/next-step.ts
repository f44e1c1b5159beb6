import type { CaseState } from '../../../shared/contracts/case-life.ts';
import type { CaseSummary } from '../../../shared/contracts/cases.ts';

/** The parts of a case on the planner's desk. */
export const deskParts = ['intake', 'study', 'findings', 'comments', 'report', 'log'] as const;
export type DeskPart = (typeof deskParts)[number];

/** What the planning department does next, and in which part of the case. */
export interface NextStep {
  words: string;
  part: DeskPart;
  /** Nothing for the department to do: somebody else moves first. */
  isWaiting?: boolean;
}

const steps = {
  draft: { words: 'The applicant is preparing it', part: 'intake', isWaiting: true },
  submitted: { words: 'Check that it is complete', part: 'intake' },
  'sent-back': { words: 'The applicant is correcting it', part: 'intake', isWaiting: true },
  complete: { words: 'Take it under review', part: 'intake' },
  'under-review': { words: 'Read the study, then publish', part: 'study' },
  'open-for-comment': { words: 'Read the comments, write the report', part: 'comments' },
  'report-issued': { words: 'Hold the hearing', part: 'report' },
  continued: { words: 'Prepare the report for the new date', part: 'report' },
  heard: { words: 'Record the decision', part: 'intake' },
  approved: { words: 'Decided', part: 'log', isWaiting: true },
  'approved-with-conditions': { words: 'Decided', part: 'log', isWaiting: true },
  refused: { words: 'Decided', part: 'log', isWaiting: true },
  appealed: { words: 'The appeal is pending', part: 'log', isWaiting: true },
  remanded: { words: 'Take it under review again', part: 'intake' },
  withdrawn: { words: 'Withdrawn', part: 'log', isWaiting: true },
} as const satisfies Record<CaseState, NextStep>;

/** The next step of a case; before a study is read it has to be run. */
export function nextStepOf(
  reviewCase: Pick<CaseSummary, 'state' | 'latestStudy' | 'latestRevision'>,
): NextStep {
  if (reviewCase.state !== 'under-review') return steps[reviewCase.state];
  const { latestStudy, latestRevision } = reviewCase;
  if (latestStudy === null || latestStudy.revision !== latestRevision) {
    return { words: 'Run the study', part: 'study' };
  }
  if (latestStudy.status === 'queued' || latestStudy.status === 'running') {
    return { words: 'The study is running', part: 'study' };
  }
  return latestStudy.status === 'finished'
    ? steps['under-review']
    : { words: 'Run the study again', part: 'study' };
}

/** Whole days since an instant, as of another; 0 on the first day. */
export function daysSince(at: string, nowMs: number): number {
  return Math.max(0, Math.floor((nowMs - Date.parse(at)) / 86_400_000));
}
