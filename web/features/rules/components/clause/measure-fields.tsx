import type { MeasureKind, RuleMeasure } from '../../../../../shared/rules/rule-schema.ts';
import { NumberField } from '../../../../components/number-field.tsx';
import { SelectField } from '../../../../components/select-field.tsx';
import type { ProblemAt } from '../../rule-problems.ts';
import { measureChoices } from '../../rule-words.ts';

export interface MeasureFieldsProps {
  label: string;
  measure: RuleMeasure;
  onChange: (measure: RuleMeasure) => void;
  /** By a path within the measure: `hours`. */
  problemAt: ProblemAt;
}

/** What is measured, with the figure that some measures need. */
export function MeasureFields({ label, measure, onChange, problemAt }: MeasureFieldsProps) {
  return (
    <div className="grid items-start gap-3 sm:grid-cols-[minmax(0,3fr)_minmax(0,2fr)]">
      <SelectField
        label={label}
        options={measureChoices}
        value={measure.kind}
        onChange={(kind) => onChange(measureOf(kind))}
        problem={problemAt('kind')}
      />
      {'hours' in measure ? (
        <NumberField
          label="Enough is so many hours"
          description="0 means: more than none."
          value={measure.hours}
          onChange={(hours) => onChange({ ...measure, hours })}
          problem={problemAt('hours')}
        />
      ) : null}
      {'share' in measure ? (
        <NumberField
          label="Per cent of the area in sun"
          scale={100}
          value={measure.share}
          onChange={(share) => onChange({ ...measure, share })}
          problem={problemAt('share')}
        />
      ) : null}
    </div>
  );
}

function measureOf(kind: MeasureKind): RuleMeasure {
  switch (kind) {
    case 'sun-share':
    case 'sun-area':
      return { kind, hours: 2 };
    case 'best-run':
      return { kind, share: 0.5 };
    default:
      return { kind };
  }
}
