import type { RuleVersion } from '../../../../shared/contracts/rules.ts';
import { compareRules, type RuleDifference } from '../../../../shared/rules/compare-rules.ts';
import { SelectField } from '../../../components/select-field.tsx';
import { useFormats } from '../../../lib/place-context.ts';
import { clauseFigures } from '../clause-in-words.ts';
import { versionStateWords } from '../rule-words.ts';

export interface RuleDifferencesProps {
  version: RuleVersion;
  /** The other versions, of which one is held against it. */
  others: readonly RuleVersion[];
  against: RuleVersion;
  onChoose: (id: string) => void;
}

/** In what a version differs from another, in words. */
export function RuleDifferences({ version, others, against, onChoose }: RuleDifferencesProps) {
  const formats = useFormats();
  const differences = compareRules(against.rule, version.rule, clauseFigures(formats));
  return (
    <div className="grid gap-4">
      <SelectField
        className="no-print max-w-md"
        label="Compared with"
        options={others.map(({ id, rule, state }) => ({
          id,
          label: `Version ${rule.version}, ${versionStateWords[state]}`,
        }))}
        value={against.id}
        onChange={onChoose}
      />
      {differences.length === 0 ? (
        <p>
          Version {version.rule.version} judges exactly as version {against.rule.version} does.
        </p>
      ) : (
        <dl className="measure grid gap-3">
          {groupByClause(differences).map(({ clause, sentences }) => (
            <div key={clause ?? 'rule'} className="grid gap-1 border-t border-hairline pt-2">
              <dt className="font-strong">{clause ?? 'The rule as a whole'}</dt>
              {sentences.map((sentence) => (
                <dd key={sentence}>{sentence}</dd>
              ))}
            </div>
          ))}
        </dl>
      )}
    </div>
  );
}

function groupByClause(
  differences: readonly RuleDifference[],
): { clause: string | null; sentences: string[] }[] {
  const groups = new Map<string | null, string[]>();
  for (const { clause, sentence } of differences) {
    groups.set(clause, [...(groups.get(clause) ?? []), sentence]);
  }
  return [...groups].map(([clause, sentences]) => ({ clause, sentences }));
}
