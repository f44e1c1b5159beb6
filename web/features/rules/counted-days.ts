import type { Place } from '../../../shared/rules/place.ts';
import { expandDays } from '../../../shared/rules/rule-days.ts';
import type { RuleDay, RuleWindow } from '../../../shared/rules/rule-schema.ts';
import { instantsOfSpan, windowSpans } from '../../../shared/rules/rule-window.ts';
import { civilDayBounds } from '../../../shared/solar/civil-time.ts';
import { sunAboveSpans, type TimeSpan } from '../../../shared/solar/sun-above.ts';
import { sunPositionAt } from '../../../shared/solar/sun-position.ts';

/** A month of the calendar with the days of it that count. */
export interface CountedMonth {
  /** `2026-03` */
  month: string;
  dayCount: number;
  /** Days of the month, from 1. */
  counted: ReadonlySet<number>;
}

/** The civil days of a clause in a study's year, each once, in the order of the calendar. */
export function countDays(days: readonly RuleDay[], year: number, place: Place): string[] {
  const dates = expandDays(days, year, place).flatMap((group) => group.dates);
  return [...new Set(dates)].sort();
}

/** The months of the year, and those of the next into which a season runs. */
export function monthsOf(dates: readonly string[], year: number): CountedMonth[] {
  const last = dates.at(-1) ?? `${year}-12-31`;
  const lastYear = Math.max(year, Number(last.slice(0, 4)));
  const monthCount = lastYear > year ? 12 + Number(last.slice(5, 7)) : 12;
  return Array.from({ length: monthCount }, (_month, index) => {
    const first = new Date(Date.UTC(year, index, 1));
    const month = first.toISOString().slice(0, 7);
    const ofMonth = dates.filter((date) => date.startsWith(month));
    return {
      month,
      dayCount: new Date(Date.UTC(year, index + 1, 0)).getUTCDate(),
      counted: new Set(ofMonth.map((date) => Number(date.slice(8)))),
    };
  });
}

/** One day as the strip draws it. */
export interface DayOfClause {
  date: string;
  startMs: number;
  endMs: number;
  /** While the sun is up. */
  daylight: TimeSpan[];
  /** What counts of it; empty where the window has no sun. */
  counted: TimeSpan[];
  /** Every judged instant. */
  instants: number[];
  /** The sun's altitude through the day, at most 0 while it is down. */
  curve: { atMs: number; altitudeDeg: number }[];
}

const curveStepMs = 600_000;

/** The daylight of a day, and what of it a clause judges. */
export function describeDay(
  clause: { window: RuleWindow; minimumAltitude: number; step: number },
  date: string,
  place: Place,
): DayOfClause {
  const { timezone, longitude, latitude } = place;
  const { startMs, endMs } = civilDayBounds(date, timezone);
  const counted = windowSpans(clause, date, place);
  const curve: DayOfClause['curve'] = [];
  for (let atMs = startMs; atMs <= endMs; atMs += curveStepMs) {
    curve.push({ atMs, altitudeDeg: sunPositionAt(atMs, longitude, latitude).altitudeDeg });
  }
  return {
    date,
    startMs,
    endMs,
    daylight: sunAboveSpans(date, timezone, longitude, latitude, 0),
    counted,
    instants: counted.flatMap((span) => instantsOfSpan(span, clause.step)),
    curve,
  };
}
