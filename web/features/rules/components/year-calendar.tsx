import { useFormats } from '../../../lib/place-context.ts';
import { monthsOf } from '../counted-days.ts';

export interface YearCalendarProps {
  year: number;
  /** The days that count, in order. */
  dates: readonly string[];
  chosen: string | null;
  onChoose: (date: string) => void;
}

const cell = 11;
const labelWidth = 34;
const headHeight = 12;

/**
 * A calendar of the year in which the counted days are filled. Its words stand in a caption; a pointer
 * may choose a day on it, everybody else by the buttons below.
 */
export function YearCalendar({ year, dates, chosen, onChoose }: YearCalendarProps) {
  const { locale } = useFormats();
  const months = monthsOf(dates, year);
  const monthName = new Intl.DateTimeFormat(locale, { month: 'short', timeZone: 'UTC' });
  const width = labelWidth + 31 * cell;
  return (
    <svg
      viewBox={`0 0 ${width} ${headHeight + months.length * cell + 1}`}
      className="w-full max-w-xl"
      aria-hidden="true"
      data-testid="year-calendar"
    >
      {[1, 5, 10, 15, 20, 25, 30].map((day) => (
        <text
          key={day}
          x={labelWidth + (day - 0.5) * cell}
          y={8}
          textAnchor="middle"
          className="fill-ink-soft text-[7px]"
        >
          {day}
        </text>
      ))}
      {months.map(({ month, dayCount, counted }, row) => (
        <g key={month} transform={`translate(0 ${headHeight + row * cell})`}>
          <text x={0} y={8} className="fill-ink text-[8px]">
            {monthName.format(new Date(`${month}-01T00:00:00Z`))}
            {month.startsWith(String(year)) ? '' : ` ’${month.slice(2, 4)}`}
          </text>
          {Array.from({ length: dayCount }, (_day, index) => {
            const day = index + 1;
            const date = `${month}-${String(day).padStart(2, '0')}`;
            const isCounted = counted.has(day);
            return (
              <rect
                key={date}
                x={labelWidth + index * cell + 1}
                y={1}
                width={cell - 2}
                height={cell - 2}
                onClick={isCounted ? () => onChoose(date) : undefined}
                className={
                  isCounted
                    ? 'cursor-pointer fill-marigold-fill stroke-ink'
                    : 'fill-sheet stroke-hairline'
                }
                strokeWidth={date === chosen ? 2 : isCounted ? 0.8 : 0.5}
              />
            );
          })}
        </g>
      ))}
    </svg>
  );
}
