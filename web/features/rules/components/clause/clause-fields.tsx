import { FieldGroup } from '../../../../components/field-group.tsx';
import { NumberField } from '../../../../components/number-field.tsx';
import { TextField } from '../../../../components/text-field.tsx';
import { BaselineFields } from './baseline-fields.tsx';
import { DaysFields } from './days-fields.tsx';
import { LimitFields } from './limit-fields.tsx';
import { MeasureFields } from './measure-fields.tsx';
import type { ClausePartProps } from './part-props.ts';
import { ReceptorsFields } from './receptors-fields.tsx';
import { WindowFields } from './window-fields.tsx';

/** Everything that one clause says, to be written. */
export function ClauseFields(props: ClausePartProps) {
  const { clause, onChange, problemAt } = props;
  return (
    <div className="grid content-start gap-5">
      <TextField
        label="What the clause asks, as a heading"
        value={clause.title}
        onChange={(title) => onChange({ title })}
        problem={problemAt('title')}
        maxLength={200}
      />
      <ReceptorsFields {...props} />
      <DaysFields {...props} />
      <WindowFields {...props} />
      <FieldGroup legend="What is measured and asked" problem={problemAt('limit')}>
        <MeasureFields
          label="Measure"
          measure={clause.measure}
          onChange={(measure) => onChange({ measure })}
          problemAt={(path) => problemAt(`measure.${path}`)}
        />
        <LimitFields
          limit={clause.limit}
          measure={clause.measure}
          onChange={(limit) => onChange({ limit })}
          problemAt={(path) => (path === '' ? undefined : problemAt(`limit${path}`))}
        />
      </FieldGroup>
      <BaselineFields {...props} />
      <FieldGroup
        legend="What is let pass"
        description="A place on which the new shadow covers no more than this area, or more of it for no longer than this on a day, is reported and not held against the proposal."
      >
        <div className="grid items-start gap-3 sm:grid-cols-2">
          <NumberField
            label="Area, m²"
            value={clause.disregard.area}
            onChange={(area) => onChange({ disregard: { ...clause.disregard, area } })}
            problem={problemAt('disregard.area')}
          />
          <NumberField
            label="Minutes a day"
            value={clause.disregard.minutes}
            onChange={(minutes) => onChange({ disregard: { ...clause.disregard, minutes } })}
            problem={problemAt('disregard.minutes')}
          />
        </div>
      </FieldGroup>
      <details open={problemAt('id') !== undefined || problemAt('weight') !== undefined}>
        <summary className="min-h-6 cursor-pointer">Weight and short name</summary>
        <div className="mt-2 grid gap-3 sm:grid-cols-2">
          <NumberField
            label="Weight in the loss index"
            value={clause.weight}
            onChange={(weight) => onChange({ weight })}
            problem={problemAt('weight')}
          />
          <TextField
            label="Short name in files"
            description="Versions are compared by it."
            value={clause.id}
            onChange={(id) => onChange({ id })}
            problem={problemAt('id')}
          />
        </div>
      </details>
    </div>
  );
}
