import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { caseStateWords } from '../../../../shared/contracts/case-life.ts';
import type { CaseSummary } from '../../../../shared/contracts/cases.ts';
import { useFormats } from '../../../lib/place-context.ts';
import { describeProposal } from '../proposal-in-words.ts';
import { CaseFinding } from './case-finding.tsx';

export interface CaseListProps {
  cases: readonly CaseSummary[];
  hrefOf: (reviewCase: CaseSummary) => string;
  /** What stands below each case. */
  below?: (reviewCase: CaseSummary) => ReactNode;
}

/** Cases one under the other, each with what is proposed, where it stands and what was found. */
export function CaseList({ cases, hrefOf, below }: CaseListProps) {
  const formats = useFormats();
  return (
    <ol className="border-t border-ink">
      {cases.map((reviewCase) => (
        <li key={reviewCase.reference} className="grid gap-1 border-b border-hairline py-4">
          <h3 className="text-lead">
            <Link to={hrefOf(reviewCase)} className="link">
              {reviewCase.title}
            </Link>
          </h3>
          <p>
            {reviewCase.address} · {describeProposal(reviewCase, formats)}
          </p>
          <p className="flex flex-wrap gap-x-5 text-small">
            <span className="text-ink-soft">{reviewCase.number ?? 'not submitted yet'}</span>
            <span>
              {caseStateWords[reviewCase.state]} since{' '}
              {formats.shortDateOfInstant(reviewCase.stateSince)}
            </span>
            <span>
              Rule: <CaseFinding study={reviewCase.latestStudy} />
            </span>
          </p>
          {below?.(reviewCase)}
        </li>
      ))}
    </ol>
  );
}
