import type { FindingRow } from '../../../../shared/contracts/studies.ts';
import { FindingMark } from '../../../components/finding-mark.tsx';

/** What the rule says of one receptor, clause by clause. */
export function FindingLines({ findings }: { findings: readonly FindingRow[] }) {
  if (findings.length === 0) {
    return <p>The municipality’s rule asks nothing for this kind of place.</p>;
  }
  return (
    <ul className="grid gap-2">
      {findings.map((row) => (
        <li key={`${row.clause} ${row.day ?? ''}`}>
          <FindingMark finding={row.finding} close={row.close} />
          <span className="text-ink-soft"> · {row.clauseTitle}</span>
          <p className="text-small">{row.sentence}</p>
        </li>
      ))}
    </ul>
  );
}
