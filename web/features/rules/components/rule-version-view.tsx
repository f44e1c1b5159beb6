import { sayClause } from '../../../../shared/rules/clause-sentence.ts';
import type { Rule } from '../../../../shared/rules/rule-schema.ts';
import { DefinitionList } from '../../../components/definition-list.tsx';
import { useFormats } from '../../../lib/place-context.ts';
import { clauseFigures, describeClause } from '../clause-in-words.ts';
import { CountedInstants } from './counted-instants.tsx';

/** A rule in plain words, with its calendar and the data that says the same. */
export function RuleVersionView({ rule }: { rule: Rule }) {
  const formats = useFormats();
  return (
    <div className="grid gap-6">
      {rule.clauses.map((clause) => (
        <section key={clause.id} className="grid gap-3 border-t border-hairline pt-4">
          <h3 className="text-lead">{clause.title}</h3>
          <p className="say measure">{sayClause(clause, clauseFigures(formats))}</p>
          <details>
            <summary className="min-h-6 cursor-pointer">
              Point by point, and which days and instants count
            </summary>
            <div className="mt-3 grid gap-x-10 gap-y-6 lg:grid-cols-2 [&>*]:min-w-0">
              <DefinitionList
                entries={describeClause(clause, formats)}
                className="self-start text-small"
              />
              <CountedInstants
                days={clause.days}
                window={clause.window}
                minimumAltitude={clause.minimumAltitude}
                step={clause.step}
              />
            </div>
          </details>
        </section>
      ))}
      <p className="measure text-small">
        A loss is called{' '}
        {rule.bands.map((band) => `${band.label} up to ${formats.share(band.upTo)}`).join(', ')}.
      </p>
      <details>
        <summary className="min-h-6 cursor-pointer">The same as data (JSON)</summary>
        <pre
          className="mt-2 overflow-x-auto border border-hairline bg-sheet p-3 font-mono text-[0.8125rem]"
          tabIndex={0}
        >
          {JSON.stringify(rule, null, 2)}
        </pre>
      </details>
    </div>
  );
}
