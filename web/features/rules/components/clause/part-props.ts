import type { ClauseDraft } from '../../rule-draft.ts';
import type { ProblemAt } from '../../rule-problems.ts';

/** What every part of the clause's form is given. */
export interface ClausePartProps {
  clause: ClauseDraft;
  /** Takes the fields that change. */
  onChange: (change: Partial<ClauseDraft>) => void;
  /** By a path within the clause: `window.to`. */
  problemAt: ProblemAt;
}
