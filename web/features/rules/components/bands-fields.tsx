import type { Rule } from '../../../../shared/rules/rule-schema.ts';
import { Button } from '../../../components/button.tsx';
import { FieldGroup } from '../../../components/field-group.tsx';
import { NumberField } from '../../../components/number-field.tsx';
import { TextField } from '../../../components/text-field.tsx';
import type { ProblemAt } from '../rule-problems.ts';

export interface BandsFieldsProps {
  bands: Rule['bands'];
  onChange: (bands: Rule['bands']) => void;
  problemAt: ProblemAt;
}

/** What a loss is called, from the smallest to the whole. */
export function BandsFields({ bands, onChange, problemAt }: BandsFieldsProps) {
  return (
    <FieldGroup
      legend="What a loss is called"
      description="Each name holds up to its share of the sun before; the last reaches 100 per cent."
      problem={problemAt('bands')}
    >
      <ul className="grid gap-3">
        {bands.map((band, index) => (
          // Bands have no names of their own; their order is their meaning.
          <li key={index} className="flex flex-wrap items-end gap-3">
            <TextField
              label={`Name ${index + 1}`}
              className="min-w-40 grow"
              value={band.label}
              onChange={(label) => onChange(bands.with(index, { ...band, label }))}
              problem={problemAt(`bands.${index}.label`)}
            />
            <NumberField
              label="Up to per cent"
              className="w-36"
              scale={100}
              value={band.upTo}
              onChange={(upTo) => onChange(bands.with(index, { ...band, upTo }))}
              problem={problemAt(`bands.${index}.upTo`)}
            />
            {bands.length < 2 ? null : (
              <Button
                kind="plain"
                className="py-2"
                aria-label={`Remove name ${index + 1}`}
                onPress={() => onChange(bands.toSpliced(index, 1))}
              >
                Remove
              </Button>
            )}
          </li>
        ))}
      </ul>
      <Button
        kind="plain"
        className="justify-self-start"
        onPress={() => onChange([...bands, { upTo: Number.NaN, label: '' }])}
      >
        Add a name
      </Button>
    </FieldGroup>
  );
}
