import type { Place } from '../rules/place.ts';
import { expandDays } from '../rules/rule-days.ts';
import { windowSpans } from '../rules/rule-window.ts';
import { formatInstant, wholeClockHours } from '../solar/civil-time.ts';
import { keyDatesOfYear } from '../solar/key-dates.ts';
import { sunAboveSpans } from '../solar/sun-above.ts';
import type { StudyInput } from './evidence-schema.ts';

/**
 * Every whole clock hour from sunrise to sunset on the four key dates of a year, as RFC 3339 with
 * the zone's offset.
 */
export function listKeyDateInstants(place: Place, year: number): string[] {
  return keyDatesOfYear(year, place.timezone)
    .flatMap(({ date }) => daylightHours(date, place))
    .map((atMs) => formatInstant(atMs, place.timezone));
}

/**
 * The instants of a study that names none: every whole clock hour with the sun up on the rule's
 * days, for a season on the key dates in it, and the ends of each judged window.
 */
export function defaultInstants(input: StudyInput): string[] {
  const { place, year } = input;
  const keyDates = new Set(keyDatesOfYear(year, place.timezone).map(({ date }) => date));
  const instants = input.rule.clauses.flatMap((clause) =>
    expandDays(clause.days, year, place).flatMap((group) => {
      const dates = group.isSeason ? group.dates.filter((date) => keyDates.has(date)) : group.dates;
      return dates.flatMap((date) => [
        ...daylightHours(date, place),
        ...windowSpans(clause, date, place).flatMap(({ startMs, endMs }) => [startMs, endMs]),
      ]);
    }),
  );
  return [...new Set(instants)]
    .sort((a, b) => a - b)
    .map((atMs) => formatInstant(atMs, place.timezone));
}

function daylightHours(date: string, place: Place): number[] {
  const spans = sunAboveSpans(date, place.timezone, place.longitude, place.latitude, 0);
  return wholeClockHours(date, place.timezone).filter((atMs) =>
    spans.some(({ startMs, endMs }) => startMs <= atMs && atMs <= endMs),
  );
}
