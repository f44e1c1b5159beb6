import { FieldGroup } from '../../../../components/field-group.tsx';
import { NumberField } from '../../../../components/number-field.tsx';
import { SelectField } from '../../../../components/select-field.tsx';
import { TextField } from '../../../../components/text-field.tsx';
import type { WindowDraft } from '../../rule-draft.ts';
import type { ClausePartProps } from './part-props.ts';

const bases = [
  { id: 'civil', label: 'The clock on the wall, daylight saving included' },
  { id: 'standard', label: 'Standard time all year, without daylight saving' },
  { id: 'solar', label: 'True solar time: noon is when the sun is highest' },
  { id: 'sun', label: 'The sun itself: from sunrise to sunset' },
] as const;
type Basis = (typeof bases)[number]['id'];

/** The hours that count, and by which clock they are meant: there is no silent choice. */
export function WindowFields({ clause, onChange, problemAt }: ClausePartProps) {
  const { window } = clause;
  const isInstant = 'from' in window && window.from === window.to;
  return (
    <FieldGroup legend="At which hours">
      <SelectField
        label="By which clock are the hours meant?"
        placeholder="Choose a clock …"
        options={bases}
        value={window.basis}
        onChange={(basis) => onChange({ window: windowOn(basis, window) })}
        problem={problemAt('window.basis') ?? problemAt('window')}
      />
      {'from' in window ? (
        <div className="grid grid-cols-2 gap-3">
          <TextField
            label="From"
            type="time"
            value={window.from}
            onChange={(from) => onChange({ window: { ...window, from } })}
            problem={problemAt('window.from')}
          />
          <TextField
            label="To"
            type="time"
            value={window.to}
            onChange={(to) => onChange({ window: { ...window, to } })}
            problem={problemAt('window.to')}
          />
        </div>
      ) : null}
      {'afterSunrise' in window ? (
        <div className="grid items-start gap-3 sm:grid-cols-2">
          <NumberField
            label="Minutes after sunrise"
            value={window.afterSunrise}
            onChange={(afterSunrise) => onChange({ window: { ...window, afterSunrise } })}
            problem={problemAt('window.afterSunrise')}
          />
          <NumberField
            label="Minutes before sunset"
            value={window.beforeSunset}
            onChange={(beforeSunset) => onChange({ window: { ...window, beforeSunset } })}
            problem={problemAt('window.beforeSunset')}
          />
        </div>
      ) : null}
      <div className="grid items-start gap-3 sm:grid-cols-2">
        <NumberField
          label="Lowest sun that counts, degrees"
          description="0 counts the sun from the horizon."
          value={clause.minimumAltitude}
          onChange={(minimumAltitude) => onChange({ minimumAltitude })}
          problem={problemAt('minimumAltitude')}
        />
        {isInstant ? (
          <p className="self-end text-small">One instant is judged; it needs no step.</p>
        ) : (
          <NumberField
            label="Minutes between instants"
            description="Finer steps take longer to compute."
            value={clause.step}
            onChange={(step) => onChange({ step })}
            problem={problemAt('step')}
          />
        )}
      </div>
    </FieldGroup>
  );
}

/** Hours that were written already stay, by another clock. */
function windowOn(basis: Basis, before: WindowDraft): WindowDraft {
  if (basis === 'sun') return { basis, afterSunrise: 0, beforeSunset: 0 };
  const { from, to } = 'from' in before ? before : { from: '09:00', to: '15:00' };
  return { basis, from, to };
}
