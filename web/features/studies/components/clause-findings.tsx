import type { StudyDetail } from '../../../../shared/contracts/studies.ts';
import { FindingMark } from '../../../components/finding-mark.tsx';
import { useFormats } from '../../../lib/place-context.ts';

/** The study's outcome: the whole, and clause by clause. */
export function ClauseFindings({ study }: { study: StudyDetail }) {
  const formats = useFormats();
  const { findings, rule } = study;
  if (findings === null) return null;
  const titles = new Map(rule.clauses.map(({ id, title }) => [id, title]));
  return (
    <section className="grid gap-2" aria-label="Outcome">
      <p className="text-lead">
        {rule.title}, version {rule.version}:{' '}
        <FindingMark finding={findings.met ? 'met' : 'not-met'} />. Loss index{' '}
        {formats.number(findings.lossIndex, 1)} of 100.
      </p>
      <ul className="border-t border-hairline text-small">
        {findings.clauses.map(({ clause, finding, receptorsNotMet }) => (
          <li key={clause} className="flex flex-wrap gap-x-4 border-b border-hairline py-1.5">
            <span className="min-w-60">{titles.get(clause) ?? clause}</span>
            <span>
              <FindingMark finding={finding} />
              {receptorsNotMet.length === 0
                ? ''
                : ` at ${receptorsNotMet.length} ${receptorsNotMet.length === 1 ? 'receptor' : 'receptors'}`}
            </span>
          </li>
        ))}
      </ul>
    </section>
  );
}
