import { keyDatesOfYear, type KeyDateEvent } from '../solar/key-dates.ts';
import type { Place } from './place.ts';
import type { DayEvent, RuleDay } from './rule-schema.ts';

/** One entry of a clause's `days`: a single civil date, or a season of them. */
export interface DayGroup {
  isSeason: boolean;
  /** Civil dates, `YYYY-MM-DD`, in the order of the calendar from the season's first day. */
  dates: string[];
}

const dayMs = 86_400_000;

/**
 * The civil dates of a clause's days in a study's year. A season that wraps the year's end begins
 * in the study's year; 29 February is 28 February in a common year.
 */
export function expandDays(days: readonly RuleDay[], year: number, place: Place): DayGroup[] {
  return days.map((day) => {
    if ('event' in day) return { isSeason: false, dates: [dateOfEvent(day.event, year, place)] };
    if ('date' in day) return { isSeason: false, dates: [dateOf(year, day.date)] };
    if ('year' in day) {
      return { isSeason: true, dates: datesBetween(`${year}-01-01`, `${year}-12-31`, 1) };
    }
    const from = dateOf(year, day.from);
    const endsIn = day.to < day.from ? year + 1 : year;
    return { isSeason: true, dates: datesBetween(from, dateOf(endsIn, day.to), day.everyDays) };
  });
}

function dateOfEvent(event: DayEvent, year: number, place: Place): string {
  const isNorth = place.latitude >= 0;
  const keyEvent: KeyDateEvent =
    event === 'winter-solstice'
      ? isNorth
        ? 'december-solstice'
        : 'june-solstice'
      : event === 'summer-solstice'
        ? isNorth
          ? 'june-solstice'
          : 'december-solstice'
        : event;
  const found = keyDatesOfYear(year, place.timezone).find((one) => one.event === keyEvent);
  if (found === undefined) throw new Error(`There is no ${keyEvent} in ${year}.`);
  return found.date;
}

function dateOf(year: number, monthDay: string): string {
  const isLeap = new Date(Date.UTC(year, 1, 29)).getUTCMonth() === 1;
  return `${String(year).padStart(4, '0')}-${monthDay === '02-29' && !isLeap ? '02-28' : monthDay}`;
}

function datesBetween(from: string, to: string, everyDays: number): string[] {
  const dates: string[] = [];
  for (let atMs = Date.parse(from); atMs <= Date.parse(to); atMs += everyDays * dayMs) {
    dates.push(new Date(atMs).toISOString().slice(0, 10));
  }
  return dates;
}
