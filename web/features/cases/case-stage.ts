import { caseStateWords, type CaseState } from '../../../shared/contracts/case-life.ts';

export interface CaseStage {
  /** What has been reached, in a word or two. */
  title: string;
  /** What it means for somebody who lives nearby. */
  meaning: string;
}

const meanings = {
  draft: 'The applicant is still preparing it. Nobody else sees it yet.',
  submitted: 'The planning department is checking whether the application is complete.',
  'sent-back': 'The applicant was asked to correct the application.',
  complete: 'The application is complete. The planning department takes it under review next.',
  'under-review': 'The planning department is studying it.',
  'open-for-comment':
    'You can read the study and say what you think. The planning department reads every comment before the report is written.',
  'report-issued': 'The staff report is written and goes to the board for a hearing.',
  continued: 'The hearing was put off to another date. Comments are taken again until then.',
  heard: 'The board has held its hearing. The decision follows.',
  approved: 'The board has approved the proposal.',
  'approved-with-conditions': 'The board has approved the proposal and set conditions.',
  refused: 'The board has refused the proposal.',
  appealed: 'The decision was appealed.',
  remanded: 'The case was sent back to the planning department for another review.',
  withdrawn: 'The application was withdrawn. Nothing will be decided.',
} as const satisfies Record<CaseState, string>;

export function describeStage(state: CaseState): CaseStage {
  return { title: caseStateWords[state], meaning: meanings[state] };
}
