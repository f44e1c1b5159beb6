import { DateTime } from 'luxon';

const dayMs = 86_400_000;

/** An instant as RFC 3339 with the zone's offset: `2026-12-21T12:00:00-06:00`. */
export function formatInstant(atMs: number, timeZone: string): string {
  return createInstantFormat(timeZone)(atMs);
}

/**
 * Makes `formatInstant` for many instants of one zone: its offset is looked up once for each half
 * hour, since no zone of our days changes its clocks within one.
 *
 * @throws RangeError, when used, for a zone that is not known
 */
export function createInstantFormat(timeZone: string): (atMs: number) => string {
  const offsetsMin = new Map<number, number>();
  const offsetAt = (atMs: number): number => {
    const halfHour = Math.floor(atMs / 1_800_000);
    const known = offsetsMin.get(halfHour);
    if (known !== undefined) return known;
    const { offset, isValid } = DateTime.fromMillis(atMs, { zone: timeZone });
    if (!isValid) throw new RangeError(`${timeZone} is no time zone that this program knows.`);
    offsetsMin.set(halfHour, offset);
    return offset;
  };
  return (atMs) => {
    const offsetMin = offsetAt(atMs);
    const shown = new Date(atMs + offsetMin * 60_000).toISOString().replace(/(\.000)?Z$/, '');
    const sign = offsetMin < 0 ? '-' : '+';
    const two = (value: number) => String(value).padStart(2, '0');
    const awayMin = Math.abs(offsetMin);
    return `${shown}${sign}${two(Math.floor(awayMin / 60))}:${two(awayMin % 60)}`;
  };
}

/** The civil date of an instant in a zone: `2026-12-21`. */
export function civilDateOf(atMs: number, timeZone: string): string {
  return DateTime.fromMillis(atMs, { zone: timeZone }).toFormat('yyyy-MM-dd');
}

/** The first instant of a civil day, and the first of the next. */
export function civilDayBounds(date: string, timeZone: string): { startMs: number; endMs: number } {
  const start = DateTime.fromISO(date, { zone: timeZone }).startOf('day');
  return { startMs: start.toMillis(), endMs: start.plus({ days: 1 }).startOf('day').toMillis() };
}

/**
 * The instant at which a zone's clock shows a time on a date. Where clocks go forward over it, the
 * first instant after the gap; where they go back and show it twice, the `first` or the `last`.
 *
 * @param clock `HH:MM`
 */
export function civilClockToMs(
  date: string,
  clock: string,
  timeZone: string,
  which: 'first' | 'last',
): number {
  const shown = DateTime.fromISO(`${date}T${clock}`, { zone: timeZone });
  if (shown.toFormat('HH:mm') !== clock) return endOfGap(shown.toMillis(), timeZone);
  const possible = shown.getPossibleOffsets().map((one) => one.toMillis());
  return which === 'first' ? Math.min(...possible) : Math.max(...possible);
}

/** The instant at which a date's clock shows a time if the zone kept its standard offset all year. */
export function standardClockToMs(date: string, clock: string, timeZone: string): number {
  const offsetMin = standardOffsetMin(Number(date.slice(0, 4)), timeZone);
  return Date.parse(`${date}T${clock}:00Z`) - offsetMin * 60_000;
}

/** The zone's smallest offset from UTC of a year, in minutes: what the rule model calls standard time. */
export function standardOffsetMin(year: number, timeZone: string): number {
  let smallest = Infinity;
  // No zone has kept a summer or a winter time for less than ten days.
  for (let atMs = Date.UTC(year, 0, 1); atMs < Date.UTC(year + 1, 0, 1); atMs += 10 * dayMs) {
    smallest = Math.min(smallest, DateTime.fromMillis(atMs, { zone: timeZone }).offset);
  }
  return smallest;
}

/** Every whole clock hour of a civil day, as instants; 23, 24 or 25 of them. */
export function wholeClockHours(date: string, timeZone: string): number[] {
  const { startMs, endMs } = civilDayBounds(date, timeZone);
  const hours: number[] = [];
  // Quarter hours, because a few zones are off by half an hour or by a quarter.
  for (let atMs = startMs; atMs < endMs; atMs += 900_000) {
    const shown = DateTime.fromMillis(atMs, { zone: timeZone });
    if (shown.minute === 0 && shown.second === 0) hours.push(atMs);
  }
  return hours;
}

function endOfGap(nearMs: number, timeZone: string): number {
  const offsetAt = (atMs: number) => DateTime.fromMillis(atMs, { zone: timeZone }).offset;
  let beforeMs = nearMs - 3 * 3_600_000;
  let afterMs = nearMs + 3 * 3_600_000;
  const offsetBefore = offsetAt(beforeMs);
  while (afterMs - beforeMs > 1000) {
    const middleMs = Math.round((beforeMs + afterMs) / 2);
    if (offsetAt(middleMs) === offsetBefore) beforeMs = middleMs;
    else afterMs = middleMs;
  }
  return Math.floor(afterMs / 1000) * 1000;
}
