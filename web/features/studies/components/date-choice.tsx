import { ChoiceRow } from '../../../components/choice-row.tsx';
import { useFormats } from '../../../lib/place-context.ts';

export interface DateChoiceProps {
  keyDates: readonly { date: string }[];
  value: string;
  onChange: (date: string) => void;
}

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
        <input
          type="date"
          value={value}
          min="1950-01-01"
          max="2099-12-31"
          className="border border-hairline bg-sheet px-2 py-0.5 text-small"
          onChange={(event) => {
            if (event.target.value !== '') onChange(event.target.value);
          }}
        />
      </label>
    </div>
  );
}
