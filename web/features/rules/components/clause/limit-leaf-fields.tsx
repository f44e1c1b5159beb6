import { measureUnits } from '../../../../../shared/rules/measure-kinds.ts';
import type { LimitLeaf, RuleMeasure } from '../../../../../shared/rules/rule-schema.ts';
import { CheckboxField } from '../../../../components/checkbox-field.tsx';
import { NumberField } from '../../../../components/number-field.tsx';
import { SelectField } from '../../../../components/select-field.tsx';
import { kindOfLeaf, leafChoices, leafOfKind, withMeasure } from '../../limit-draft.ts';
import type { ProblemAt } from '../../rule-problems.ts';
import { MeasureFields } from './measure-fields.tsx';

export interface LimitLeafFieldsProps {
  leaf: LimitLeaf;
  /** The clause's own. */
  measure: RuleMeasure;
  name: string;
  onChange: (leaf: LimitLeaf) => void;
  problemAt: ProblemAt;
}

const wholes = [
  { id: 'before', label: 'what there is before' },
  { id: 'theoretical', label: 'what there would be without any building' },
] as const;

/** One requirement: its kind, its figure, and a measure of its own where it has one. */
export function LimitLeafFields({
  leaf,
  measure,
  name,
  onChange,
  problemAt,
}: LimitLeafFieldsProps) {
  const taken = leaf.measure ?? measure;
  const isShare = measureUnits[taken.kind] === '1';
  const unit = isShare ? 'per cent of the area' : measureUnits[taken.kind];
  const figure = (label: string, value: number, path: string, set: (value: number) => void) => (
    <NumberField
      label={label}
      scale={label.startsWith('Per cent') || isShare ? 100 : 1}
      value={value}
      onChange={set}
      problem={problemAt(path)}
    />
  );
  return (
    <div className="grid gap-3">
      <div className="grid items-start gap-3 sm:grid-cols-[minmax(0,3fr)_minmax(0,2fr)]">
        <SelectField
          label={name === '' ? 'Requirement' : `Requirement ${name}`}
          options={leafChoices}
          value={kindOfLeaf(leaf)}
          onChange={(kind) => onChange(leafOfKind(kind, leaf.measure))}
        />
        {'atLeast' in leaf
          ? figure(`At least, in ${unit}`, leaf.atLeast, '.atLeast', (atLeast) =>
              onChange({ ...leaf, atLeast }),
            )
          : null}
        {'atMost' in leaf
          ? figure(`At most, in ${unit}`, leaf.atMost, '.atMost', (atMost) =>
              onChange({ ...leaf, atMost }),
            )
          : null}
        {'keeps' in leaf
          ? figure('Per cent that stay', leaf.keeps, '.keeps', (keeps) =>
              onChange({ ...leaf, keeps }),
            )
          : null}
        {'losesAtMost' in leaf
          ? figure(`Loss at most, in ${unit}`, leaf.losesAtMost, '.losesAtMost', (losesAtMost) =>
              onChange({ ...leaf, losesAtMost }),
            )
          : null}
        {'losesAtMostShare' in leaf
          ? figure(
              'Per cent that may be lost',
              leaf.losesAtMostShare,
              '.losesAtMostShare',
              (losesAtMostShare) => onChange({ ...leaf, losesAtMostShare }),
            )
          : null}
        {'losesAtMostShare' in leaf ? (
          <SelectField
            label="Of"
            options={wholes}
            value={leaf.of}
            onChange={(of) => onChange({ ...leaf, of })}
          />
        ) : null}
      </div>
      <CheckboxField
        label="It has a measure of its own"
        isSelected={leaf.measure !== undefined}
        onChange={(hasOwn) => onChange(withMeasure(leaf, hasOwn ? measure : undefined))}
      />
      {leaf.measure === undefined ? null : (
        <MeasureFields
          label={name === '' ? 'Its measure' : `Measure of requirement ${name}`}
          measure={leaf.measure}
          onChange={(next) => onChange(withMeasure(leaf, next))}
          problemAt={(path) => problemAt(`.measure.${path}`)}
        />
      )}
    </div>
  );
}
