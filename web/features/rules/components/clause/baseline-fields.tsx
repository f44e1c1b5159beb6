import type { ClauseBaseline } from '../../../../../shared/rules/rule-schema.ts';
import { CheckboxField } from '../../../../components/checkbox-field.tsx';
import { FieldGroup } from '../../../../components/field-group.tsx';
import { NumberField } from '../../../../components/number-field.tsx';
import { SelectField } from '../../../../components/select-field.tsx';
import type { ClausePartProps } from './part-props.ts';

const choices = [
  { id: 'now', label: 'What stands now' },
  { id: 'wall', label: 'A wall along the site’s boundary' },
  { id: 'by-right', label: 'What could be built without this approval' },
  { id: 'proposal-alone', label: 'Nothing: the proposal’s own shadow alone' },
] as const;
type Choice = (typeof choices)[number]['id'];

const beside = [
  { id: 'context', label: 'the buildings around' },
  { id: 'existing', label: 'what stands on the site now' },
] as const;

/** What "before" means: what stands now, or something that is supposed. */
export function BaselineFields({ clause, onChange, problemAt }: ClausePartProps) {
  const { baseline } = clause;
  const wall = typeof baseline === 'object' ? baseline : null;
  return (
    <FieldGroup legend="Compared with what">
      <div className="grid items-start gap-3 sm:grid-cols-[minmax(0,3fr)_minmax(0,2fr)]">
        <SelectField
          label="Before is"
          options={choices}
          value={choiceOf(baseline)}
          onChange={(choice) => onChange({ baseline: baselineOf(choice) })}
          problem={problemAt('baseline')}
        />
        {wall === null ? null : (
          <NumberField
            label="Height of the wall, metres"
            value={wall.wall}
            onChange={(height) => onChange({ baseline: { ...wall, wall: height } })}
            problem={problemAt('baseline.wall')}
          />
        )}
      </div>
      {wall === null ? null : (
        <div className="flex flex-wrap gap-x-5 gap-y-1">
          <span>Beside the wall stand</span>
          {beside.map(({ id, label }) => (
            <CheckboxField
              key={id}
              label={label}
              isSelected={wall.with.includes(id)}
              onChange={(isSelected) =>
                onChange({
                  baseline: {
                    ...wall,
                    with: beside
                      .map((one) => one.id)
                      .filter((one) => (one === id ? isSelected : wall.with.includes(one))),
                  },
                })
              }
            />
          ))}
        </div>
      )}
    </FieldGroup>
  );
}

function choiceOf(baseline: ClauseBaseline | undefined): Choice {
  if (baseline === undefined) return 'now';
  return typeof baseline === 'object' ? 'wall' : baseline;
}

function baselineOf(choice: Choice): ClauseBaseline | undefined {
  if (choice === 'now') return undefined;
  return choice === 'wall' ? { wall: 3, with: ['context'] } : choice;
}
