import { SelectField } from '../../../../components/select-field.tsx';
import { useFormats } from '../../../../lib/place-context.ts';

export interface MonthDayFieldProps {
  /** What the day is: "Day", "First day". */
  label: string;
  /** `MM-DD` */
  value: string;
  onChange: (value: string) => void;
  problem?: string | undefined;
}

/** Days of each month as they can be in some year. */
const longest = [31, 29, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31];

const twoDigits = (value: number) => String(value).padStart(2, '0');

/** A day of the year without its year. */
export function MonthDayField({ label, value, onChange, problem }: MonthDayFieldProps) {
  const { locale } = useFormats();
  const names = new Intl.DateTimeFormat(locale, { month: 'long', timeZone: 'UTC' });
  const months = longest.map((_days, index) => ({
    id: twoDigits(index + 1),
    label: names.format(new Date(Date.UTC(2000, index, 1))),
  }));
  const [month = '01', day = '01'] = value.split('-');
  const lastDay = longest[Number(month) - 1] ?? 31;
  const days = Array.from({ length: lastDay }, (_day, index) => ({
    id: twoDigits(index + 1),
    label: String(index + 1),
  }));
  return (
    <div className="grid grid-cols-[minmax(0,3fr)_minmax(5rem,2fr)] gap-3">
      <SelectField
        label={`${label}: month`}
        options={months}
        value={month}
        onChange={(next) => {
          const last = longest[Number(next) - 1] ?? 31;
          onChange(`${next}-${twoDigits(Math.min(Number(day), last))}`);
        }}
      />
      <SelectField
        label="Day"
        options={days}
        value={day}
        onChange={(next) => onChange(`${month}-${next}`)}
        problem={problem}
      />
    </div>
  );
}
