import { useId } from 'react';
import type { RuleVersion } from '../../../../shared/contracts/rules.ts';
import { DefinitionList } from '../../../components/definition-list.tsx';
import { useFormats } from '../../../lib/place-context.ts';
import { describeClause } from '../clause-in-words.ts';

const stateWords = {
  draft: 'draft',
  scheduled: 'in force',
  'in-force': 'in force',
  retired: 'no longer in force',
} as const satisfies Record<RuleVersion['state'], string>;

/** One version of the rule in plain words, with the data that says the same. */
export function RuleVersionView({ version }: { version: RuleVersion }) {
  const formats = useFormats();
  const headingId = useId();
  const { rule, state, inForceFrom } = version;
  return (
    <section className="grid gap-4 border-t border-ink pt-5" aria-labelledby={headingId}>
      <div>
        <h2 id={headingId}>
          {rule.title}, version {rule.version}
        </h2>
        <p className="text-ink-soft">
          {rule.citation === '' ? '' : `${rule.citation} · `}
          {stateWords[state]}
          {inForceFrom === null ? '' : ` from ${formats.date(inForceFrom)}`}
        </p>
      </div>
      {rule.clauses.map((clause) => (
        <div key={clause.id} className="measure grid gap-2">
          <h3>{clause.title}</h3>
          <DefinitionList entries={describeClause(clause, formats)} className="text-small" />
        </div>
      ))}
      <p className="measure text-small">
        A loss is called{' '}
        {rule.bands.map((band) => `${band.label} up to ${formats.share(band.upTo)}`).join(', ')}.
      </p>
      <details>
        <summary className="min-h-6 cursor-pointer">The same as data (JSON)</summary>
        <pre className="mt-2 overflow-x-auto border border-hairline bg-sheet p-3 font-mono text-[0.8125rem]">
          {JSON.stringify(rule, null, 2)}
        </pre>
      </details>
    </section>
  );
}
