import { useDeferredValue, useState } from 'react';
import type { RuleDay, RuleWindow } from '../../../../shared/rules/rule-schema.ts';
import { Button } from '../../../components/button.tsx';
import type { Formats } from '../../../lib/formats.ts';
import { usePlace } from '../../../lib/place-context.ts';
import { countDays, describeDay, type DayOfClause } from '../counted-days.ts';
import { placeOfMunicipality } from '../place-of-municipality.ts';
import { DayStrip } from './day-strip.tsx';
import { YearCalendar } from './year-calendar.tsx';

export interface CountedInstantsProps {
  days: readonly RuleDay[];
  /** Null while no clock is chosen. */
  window: RuleWindow | null;
  minimumAltitude: number;
  step: number;
}

/** More dates than these are told by the first and the last. */
const mostListed = 12;

/** Which days of the year and which instants of a day a clause counts: drawn, and in words. */
export function CountedInstants(props: CountedInstantsProps) {
  // The sun is looked up after the letter that is typed has been shown.
  const { days, window, minimumAltitude, step } = useDeferredValue(props);
  const { municipality, formats } = usePlace();
  const place = placeOfMunicipality(municipality);
  const year = municipality.studyYear;
  const [wanted, setWanted] = useState<string | null>(null);
  const dates = countDays(days, year, place);
  const chosen = wanted !== null && dates.includes(wanted) ? wanted : (dates[0] ?? null);
  const isReady =
    window !== null && Number.isFinite(minimumAltitude) && Number.isInteger(step) && step > 0;
  const day =
    isReady && chosen !== null && hasClocks(window)
      ? describeDay({ window, minimumAltitude, step }, chosen, place)
      : null;
  const index = chosen === null ? -1 : dates.indexOf(chosen);
  return (
    <section className="grid gap-3" aria-label="Which days and instants count">
      <h4 className="font-strong">Which days count</h4>
      <YearCalendar year={year} dates={dates} chosen={chosen} onChoose={setWanted} />
      <p className="text-small">{describeDates(dates, year, formats)}</p>
      <h4 className="font-strong">Which instants count</h4>
      {chosen === null ? null : (
        <div className="flex flex-wrap items-center gap-x-4 gap-y-1">
          <span className="tabular-nums">{formats.date(chosen)}</span>
          {dates.length < 2 ? null : (
            <span className="no-print flex gap-4">
              <Button
                kind="plain"
                isDisabled={index <= 0}
                onPress={() => setWanted(dates[index - 1] ?? null)}
              >
                Earlier day
              </Button>
              <Button
                kind="plain"
                isDisabled={index >= dates.length - 1}
                onPress={() => setWanted(dates[index + 1] ?? null)}
              >
                Later day
              </Button>
            </span>
          )}
        </div>
      )}
      {day === null ? (
        <p className="text-small">
          {window === null
            ? 'Choose the clock and the hours to see which instants count.'
            : 'Correct the hours and the minutes between instants to see which count.'}
        </p>
      ) : (
        <>
          <DayStrip day={day} minimumAltitudeDeg={minimumAltitude} />
          <p className="text-small" role="status">
            {describeInstants(day, formats)}
          </p>
          {day.instants.length === 0 ? null : (
            <details>
              <summary className="min-h-6 cursor-pointer text-small">
                Every instant of this day
              </summary>
              <p className="mt-1 text-small">
                {day.instants.map((atMs) => formats.clock(new Date(atMs).toISOString())).join(', ')}
              </p>
            </details>
          )}
        </>
      )}
    </section>
  );
}

/** A time field that is emptied has no clock to reckon with. */
function hasClocks(window: RuleWindow): boolean {
  return window.basis === 'sun'
    ? Number.isFinite(window.afterSunrise) && Number.isFinite(window.beforeSunset)
    : /^\d\d:\d\d$/.test(window.from) && /^\d\d:\d\d$/.test(window.to);
}

/** A clock that ends with a point, as in p.m., ends the sentence too. */
function endSentence(words: string): string {
  return words.endsWith('.') ? words : `${words}.`;
}

function describeDates(dates: readonly string[], year: number, formats: Formats): string {
  const [first] = dates;
  const last = dates.at(-1);
  if (first === undefined || last === undefined) return `No day of ${year} counts.`;
  if (dates.length === 1) return `One day of ${year} counts: ${formats.dayOfYear(first)}.`;
  if (dates.length <= mostListed) {
    return `${dates.length} days count: ${dates.map(formats.date).join('; ')}.`;
  }
  return `${dates.length} days count, the first on ${formats.date(first)}, the last on ${formats.date(last)}.`;
}

function describeInstants({ daylight, counted, instants }: DayOfClause, formats: Formats): string {
  const clock = (atMs: number) => formats.clock(new Date(atMs).toISOString());
  const say = (spans: DayOfClause['counted']) =>
    spans.map(({ startMs, endMs }) => `from ${clock(startMs)} to ${clock(endMs)}`).join(' and ');
  const sun =
    daylight.length === 0
      ? 'The sun does not rise.'
      : endSentence(`The sun is up ${say(daylight)}`);
  const [first] = instants;
  if (first === undefined) {
    return `${sun} None of it lies in the hours of the clause: nothing counts on this day.`;
  }
  const zone = formats.zone(new Date(first).toISOString());
  if (instants.length === 1) return `${sun} One instant counts: ${clock(first)} ${zone}.`;
  return `${sun} ${instants.length} instants count, ${say(counted)} ${zone}.`;
}
