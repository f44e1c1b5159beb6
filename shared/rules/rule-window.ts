import { civilClockToMs, standardClockToMs } from '../solar/civil-time.ts';
import { solarClockToMs, solarDateOf } from '../solar/solar-time.ts';
import { sunAboveSpans, type TimeSpan } from '../solar/sun-above.ts';
import type { Place } from './place.ts';
import type { RuleClause, RuleWindow } from './rule-schema.ts';

const minuteMs = 60_000;

/**
 * The stretches of a day that a clause judges: its window cut to the whole seconds at which the
 * sun stands at or above the horizon and the clause's minimum altitude. Empty where the window has
 * no sun.
 *
 * @param date civil date, `YYYY-MM-DD`; for a window in solar time, the solar day of that date
 */
export function windowSpans(
  clause: Pick<RuleClause, 'window' | 'minimumAltitude'>,
  date: string,
  place: Place,
): TimeSpan[] {
  const above = sunAboveSpans(
    date,
    place.timezone,
    place.longitude,
    place.latitude,
    clause.minimumAltitude,
  );
  const window = windowBounds(clause.window, date, place);
  if (window === null) return [];
  return above.flatMap((span) => {
    const startMs = Math.max(span.startMs, window.startMs);
    const endMs = Math.min(span.endMs, window.endMs);
    return startMs <= endMs ? [{ startMs, endMs }] : [];
  });
}

/**
 * The judged instants of a stretch: from its start every `stepMin` minutes, and its end.
 */
export function instantsOfSpan(span: TimeSpan, stepMin: number): number[] {
  const instants: number[] = [];
  for (let atMs = span.startMs; atMs < span.endMs; atMs += stepMin * minuteMs) instants.push(atMs);
  instants.push(span.endMs);
  return instants;
}

function windowBounds(window: RuleWindow, date: string, place: Place): TimeSpan | null {
  if (window.basis === 'sun') {
    const { timezone, longitude, latitude } = place;
    const daylight = sunAboveSpans(date, timezone, longitude, latitude, 0);
    const first = daylight[0];
    const last = daylight.at(-1);
    if (first === undefined || last === undefined) return null;
    return {
      startMs: first.startMs + window.afterSunrise * minuteMs,
      endMs: last.endMs - window.beforeSunset * minuteMs,
    };
  }
  return {
    startMs: clockToMs(window.basis, date, window.from, place, 'first'),
    endMs: clockToMs(window.basis, date, window.to, place, 'last'),
  };
}

function clockToMs(
  basis: 'civil' | 'standard' | 'solar',
  date: string,
  clock: string,
  place: Place,
  which: 'first' | 'last',
): number {
  switch (basis) {
    case 'civil':
      return civilClockToMs(date, clock, place.timezone, which);
    case 'standard':
      return standardClockToMs(date, clock, place.timezone);
    case 'solar': {
      const solarDate = solarDateOf(date, place.timezone, place.longitude);
      const atMs = solarClockToMs(solarDate, clock, place.longitude, place.latitude);
      return Math.round(atMs / 1000) * 1000;
    }
  }
}
