import type { RuleDay } from '../../../../../shared/rules/rule-schema.ts';
import { Button } from '../../../../components/button.tsx';
import { FieldGroup } from '../../../../components/field-group.tsx';
import { NumberField } from '../../../../components/number-field.tsx';
import { SelectField } from '../../../../components/select-field.tsx';
import type { ProblemAt } from '../../rule-problems.ts';
import { eventChoices } from '../../rule-words.ts';
import { MonthDayField } from './month-day-field.tsx';
import type { ClausePartProps } from './part-props.ts';

const dayKinds = [
  { id: 'event', label: 'An equinox or solstice' },
  { id: 'date', label: 'A day of the calendar' },
  { id: 'season', label: 'A season' },
  { id: 'year', label: 'Every day of the year' },
] as const;
type DayKind = (typeof dayKinds)[number]['id'];

const firstOfKind: Record<DayKind, RuleDay> = {
  event: { event: 'winter-solstice' },
  date: { date: '03-21' },
  season: { from: '06-21', to: '09-20', everyDays: 1 },
  year: { year: true },
};

/** The days on which a clause judges. */
export function DaysFields({ clause, onChange, problemAt }: ClausePartProps) {
  const { days } = clause;
  const set = (next: RuleDay[]) => onChange({ days: next });
  return (
    <FieldGroup legend="On which days" problem={problemAt('days')}>
      <ul className="grid gap-4">
        {days.map((day, index) => (
          // The entries have no names of their own; only the last is ever added.
          <li key={index} className="grid gap-2">
            <DayFields
              day={day}
              name={days.length > 1 ? `Days ${index + 1}` : 'Days'}
              onChange={(next) => set(days.with(index, next))}
              problemAt={(path) => problemAt(`days.${index}${path}`)}
            />
            {days.length > 1 ? (
              <Button
                kind="plain"
                className="justify-self-start"
                aria-label={`Remove days ${index + 1}`}
                onPress={() => set(days.toSpliced(index, 1))}
              >
                Remove
              </Button>
            ) : null}
          </li>
        ))}
      </ul>
      <Button
        kind="plain"
        className="justify-self-start"
        onPress={() => set([...days, firstOfKind.date])}
      >
        Add another day or season
      </Button>
    </FieldGroup>
  );
}

interface DayFieldsProps {
  day: RuleDay;
  name: string;
  onChange: (day: RuleDay) => void;
  problemAt: ProblemAt;
}

function DayFields({ day, name, onChange, problemAt }: DayFieldsProps) {
  return (
    <div className="grid items-start gap-3 sm:grid-cols-2">
      <SelectField
        label={name}
        options={dayKinds}
        value={kindOf(day)}
        onChange={(kind) => onChange(firstOfKind[kind])}
        problem={problemAt('')}
      />
      {'event' in day ? (
        <SelectField
          label="Which"
          options={eventChoices}
          value={day.event}
          onChange={(event) => onChange({ event })}
        />
      ) : null}
      {'date' in day ? (
        <MonthDayField
          label="On"
          value={day.date}
          onChange={(date) => onChange({ date })}
          problem={problemAt('.date')}
        />
      ) : null}
      {'from' in day ? (
        <>
          <NumberField
            label="Every so many days"
            value={day.everyDays}
            onChange={(everyDays) => onChange({ ...day, everyDays })}
            problem={problemAt('.everyDays')}
          />
          <MonthDayField
            label="From"
            value={day.from}
            onChange={(from) => onChange({ ...day, from })}
            problem={problemAt('.from')}
          />
          <MonthDayField
            label="To"
            value={day.to}
            onChange={(to) => onChange({ ...day, to })}
            problem={problemAt('.to')}
          />
        </>
      ) : null}
    </div>
  );
}

function kindOf(day: RuleDay): DayKind {
  if ('event' in day) return 'event';
  if ('date' in day) return 'date';
  return 'year' in day ? 'year' : 'season';
}
