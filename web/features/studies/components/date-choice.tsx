import { useEffect, useEffectEvent, useState } from 'react';
import { ChoiceRow } from '../../../components/choice-row.tsx';
import { useFormats } from '../../../lib/place-context.ts';

export interface DateChoiceProps {
  keyDates: readonly { date: string }[];
  value: string;
  onChange: (date: string) => void;
}

const range = { min: '1950-01-01', max: '2099-12-31' } as const;

/** The four key dates, and any other day of the calendar. */
export function DateChoice({ keyDates, value, onChange }: DateChoiceProps) {
  const formats = useFormats();
  const isKeyDate = keyDates.some((one) => one.date === value);
  return (
    <div className="flex flex-wrap items-baseline gap-x-4 gap-y-1">
      <ChoiceRow
        label="Key date"
        options={keyDates.map(({ date }) => ({ id: date, label: formats.dayOfYear(date) }))}
        value={isKeyDate ? value : null}
        onChange={onChange}
      />
      <label className="flex items-baseline gap-2">
        <span className={isKeyDate ? '' : 'border-b-2 border-marigold font-strong'}>
          Another day
        </span>
        <DayInput value={value} onChange={onChange} />
      </label>
    </div>
  );
}

/** The dates between the parts that a person types are dates too: wait until the typing rests. */
const restMs = 600;

function DayInput({ value, onChange }: Pick<DateChoiceProps, 'value' | 'onChange'>) {
  const [typed, setTyped] = useState<string | null>(null);
  const take = useEffectEvent((date: string) => {
    if (date >= range.min && date <= range.max) onChange(date);
    setTyped(null);
  });
  useEffect(() => {
    if (typed === null || typed === '') return;
    const timer = window.setTimeout(() => take(typed), restMs);
    return () => window.clearTimeout(timer);
  }, [typed]);
  return (
    <input
      type="date"
      value={typed ?? value}
      min={range.min}
      max={range.max}
      className="border border-hairline bg-sheet px-2 py-0.5 text-small"
      onChange={(event) => setTyped(event.target.value)}
      onBlur={() => {
        if (typed === '') setTyped(null);
      }}
    />
  );
}
