import { receptorsOfClass } from '../../../../../shared/rules/clause-sentence.ts';
import { receptorClasses } from '../../../../../shared/rules/rule-schema.ts';
import { CheckboxField } from '../../../../components/checkbox-field.tsx';
import { FieldGroup } from '../../../../components/field-group.tsx';
import { NumberField } from '../../../../components/number-field.tsx';
import { SelectField } from '../../../../components/select-field.tsx';
import type { ClausePartProps } from './part-props.ts';

const kinds = [
  { id: 'classes', label: 'Kinds of places' },
  { id: 'ring', label: 'A ring around the site' },
] as const;

const areas = [
  { id: 'open', label: 'The open area, without what buildings stand on' },
  { id: 'whole', label: 'The whole area' },
] as const;

const heights = [
  { id: 'own', label: 'At its own height' },
  { id: 'plane', label: 'At a height of the rule’s' },
] as const;

/** What a clause judges: kinds of receptors, or the ground around the site. */
export function ReceptorsFields({ clause, onChange, problemAt }: ClausePartProps) {
  const { receptors } = clause;
  const { ring } = receptors;
  const set = (change: Partial<typeof receptors>) =>
    onChange({ receptors: { ...receptors, ...change } });
  return (
    <FieldGroup legend="Who is judged" problem={problemAt('receptors.classes')}>
      <SelectField
        label="Receptors"
        options={kinds}
        value={ring === undefined ? 'classes' : 'ring'}
        onChange={(kind) => {
          const { ring: _ring, ...rest } = receptors;
          onChange({
            receptors:
              kind === 'ring'
                ? { ...rest, classes: [], ring: { from: 5, to: 10 } }
                : { ...rest, classes: ['yard'] },
          });
        }}
      />
      {ring === undefined ? (
        <div className="flex flex-wrap gap-x-5 gap-y-1">
          {receptorClasses.map((one) => (
            <CheckboxField
              key={one}
              label={receptorsOfClass[one]}
              isSelected={receptors.classes.includes(one)}
              onChange={(isSelected) =>
                set({
                  classes: receptorClasses.filter((other) =>
                    other === one ? isSelected : receptors.classes.includes(other),
                  ),
                })
              }
            />
          ))}
        </div>
      ) : (
        <div className="grid items-start gap-3 sm:grid-cols-2">
          <NumberField
            label="From, metres outside the boundary"
            value={ring.from}
            onChange={(from) => set({ ring: { ...ring, from } })}
            problem={problemAt('receptors.ring.from')}
          />
          {ring.to === undefined ? null : (
            <NumberField
              label="To, metres outside the boundary"
              value={ring.to}
              onChange={(to) => set({ ring: { ...ring, to } })}
              problem={problemAt('receptors.ring.to')}
            />
          )}
          <CheckboxField
            className="sm:col-span-2"
            label="As far as the shadow reaches"
            isSelected={ring.to === undefined}
            onChange={(isEndless) =>
              set({ ring: { from: ring.from, ...(isEndless ? {} : { to: ring.from + 5 }) } })
            }
          />
        </div>
      )}
      <SelectField
        label="Of which area"
        options={areas}
        value={receptors.of}
        onChange={(of) => set({ of })}
      />
      <div className="grid items-start gap-3 sm:grid-cols-2">
        <SelectField
          label="Where the shadow is taken"
          options={heights}
          value={receptors.plane === undefined ? 'own' : 'plane'}
          onChange={(height) => {
            const { plane: _plane, ...rest } = receptors;
            onChange({ receptors: height === 'own' ? rest : { ...rest, plane: 1.5 } });
          }}
        />
        {receptors.plane === undefined ? null : (
          <NumberField
            label="Height, metres above the ground"
            value={receptors.plane}
            onChange={(plane) => set({ plane })}
            problem={problemAt('receptors.plane')}
          />
        )}
      </div>
    </FieldGroup>
  );
}
