import { caseStateWords } from '../../../../shared/contracts/case-life.ts';
import type { CaseDetail } from '../../../../shared/contracts/cases.ts';
import { useFormats } from '../../../lib/place-context.ts';

/** What happened with a case, the latest first. */
export function CaseHistory({ history }: { history: CaseDetail['history'] }) {
  const formats = useFormats();
  if (history.length === 0) return <p>Nothing has happened yet.</p>;
  return (
    <ol className="border-t border-hairline text-small">
      {history
        .toSorted((one, other) => other.at.localeCompare(one.at))
        .map((entry) => (
          <li
            key={`${entry.at} ${entry.to}`}
            className="grid gap-x-6 border-b border-hairline py-1.5 sm:grid-cols-[17rem_1fr]"
          >
            <span className="text-ink-soft">{formats.instant(entry.at)}</span>
            <span>
              {caseStateWords[entry.to]}
              {entry.reason === null ? null : (
                <span className="block whitespace-pre-line text-ink-soft">{entry.reason}</span>
              )}
            </span>
          </li>
        ))}
    </ol>
  );
}
