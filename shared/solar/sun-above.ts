import { civilDayBounds } from './civil-time.ts';
import { sunPositionAt } from './sun-position.ts';

/** A stretch of time, both ends in milliseconds since 1970-01-01T00:00Z. */
export interface TimeSpan {
  startMs: number;
  endMs: number;
}

const scanMs = 600_000;

/**
 * The stretches of a civil day in which the sun's centre stands at or above an apparent altitude,
 * from the first to the last whole second; none in polar night, the whole day in polar day. The
 * sun is taken as a point: published sunrise, of the disc's upper edge, comes some minutes earlier.
 *
 * @param date civil date, `YYYY-MM-DD`
 * @param minimumAltitudeDeg apparent altitude in degrees; 0 is the horizon
 */
export function sunAboveSpans(
  date: string,
  timeZone: string,
  longitude: number,
  latitude: number,
  minimumAltitudeDeg: number,
): TimeSpan[] {
  const { startMs, endMs } = civilDayBounds(date, timeZone);
  const isAbove = (atMs: number) =>
    sunPositionAt(atMs, longitude, latitude).altitudeDeg >= minimumAltitudeDeg;
  const spans: TimeSpan[] = [];
  let openMs = isAbove(startMs) ? startMs : null;
  for (let fromMs = startMs; fromMs < endMs; fromMs += scanMs) {
    const toMs = Math.min(fromMs + scanMs, endMs);
    const isUpAtEnd = isAbove(toMs);
    if (openMs === null && isUpAtEnd) openMs = firstSecond(fromMs, toMs, isAbove);
    if (openMs !== null && !isUpAtEnd) {
      spans.push({ startMs: openMs, endMs: lastSecond(fromMs, toMs, isAbove) });
      openMs = null;
    }
  }
  if (openMs !== null) spans.push({ startMs: openMs, endMs });
  return spans;
}

/** The first whole second at which the test holds, where it fails at `fromMs` and holds at `toMs`. */
function firstSecond(fromMs: number, toMs: number, holds: (atMs: number) => boolean): number {
  let fails = Math.floor(fromMs / 1000);
  let held = Math.ceil(toMs / 1000);
  while (held - fails > 1) {
    const middle = Math.floor((fails + held) / 2);
    if (holds(middle * 1000)) held = middle;
    else fails = middle;
  }
  return held * 1000;
}

/** The last whole second at which the test holds, where it holds at `fromMs` or later and fails at `toMs`. */
function lastSecond(fromMs: number, toMs: number, holds: (atMs: number) => boolean): number {
  return firstSecond(fromMs, toMs, (atMs) => !holds(atMs)) - 1000;
}
