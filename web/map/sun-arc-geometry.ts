import { DateTime } from 'luxon';
import type { SunDay } from './sun-day.ts';

/** How a day is laid out on the sun arc, in CSS pixels; y runs downwards. */
export interface ArcFrame {
  /** The instants at the left and the right end of the axis. */
  fromMs: number;
  toMs: number;
  left: number;
  right: number;
  top: number;
  /** The horizon. */
  baseline: number;
  /** The altitude that reaches the top. */
  topAltitudeDeg: number;
}

export interface HourTick {
  atMs: number;
  label: string;
  /** The hours that keep a label where there is room for few. */
  isMain: boolean;
}

/** A low winter sun shall look low: the scale never ends below this altitude. */
const leastTopAltitudeDeg = 30;

/** The frame of a day: the axis runs from the whole hour before sunrise to the whole hour after sunset. */
export function layOutArc(
  day: SunDay,
  box: { left: number; right: number; top: number; baseline: number },
): ArcFrame {
  const zone = { zone: day.timeZone };
  const first = DateTime.fromMillis(day.sunriseMs ?? day.startMs, zone).startOf('hour');
  const last = DateTime.fromMillis((day.sunsetMs ?? day.endMs) - 1, zone).startOf('hour');
  return {
    ...box,
    fromMs: Math.max(day.startMs, first.toMillis()),
    toMs: Math.min(day.endMs, last.plus({ hours: 1 }).toMillis()),
    topAltitudeDeg: Math.max(leastTopAltitudeDeg, day.noonAltitudeDeg * 1.06),
  };
}

export function xOfInstant(frame: ArcFrame, atMs: number): number {
  const share = (atMs - frame.fromMs) / (frame.toMs - frame.fromMs);
  return frame.left + share * (frame.right - frame.left);
}

export function instantOfX(frame: ArcFrame, x: number): number {
  const share = (x - frame.left) / (frame.right - frame.left);
  return frame.fromMs + share * (frame.toMs - frame.fromMs);
}

export function yOfAltitude(frame: ArcFrame, altitudeDeg: number): number {
  return frame.baseline - (altitudeDeg / frame.topAltitudeDeg) * (frame.baseline - frame.top);
}

/** The altitude curve as the `d` of an SVG path; empty where the sun stays down. */
export function arcPath(frame: ArcFrame, day: SunDay): string {
  const points = day.curve.map(
    ({ atMs, altitudeDeg }) =>
      `${xOfInstant(frame, atMs).toFixed(1)} ${yOfAltitude(frame, altitudeDeg).toFixed(1)}`,
  );
  return points.length === 0 ? '' : `M${points.join('L')}`;
}

/** Every whole clock hour on the axis; `8`, `12`, `1` in a twelve-hour locale, `13` otherwise. */
export function listHourTicks(frame: ArcFrame, timeZone: string, locale: string): HourTick[] {
  const zone = { zone: timeZone };
  const isTwelveHour =
    new Intl.DateTimeFormat(locale, { hour: 'numeric' }).resolvedOptions().hour12 === true;
  const ticks: HourTick[] = [];
  let hour = DateTime.fromMillis(frame.fromMs, zone).startOf('hour');
  if (hour.toMillis() < frame.fromMs) hour = hour.plus({ hours: 1 });
  for (; hour.toMillis() <= frame.toMs; hour = hour.plus({ hours: 1 })) {
    const label = isTwelveHour
      ? String(hour.hour % 12 === 0 ? 12 : hour.hour % 12)
      : String(hour.hour);
    ticks.push({ atMs: hour.toMillis(), label, isMain: hour.hour % 3 === 0 });
  }
  return ticks;
}

/** The altitudes that get a hairline: every 10° below the top, every 20° where the sun climbs high. */
export function listAltitudeLines(frame: ArcFrame): number[] {
  const stepDeg = frame.topAltitudeDeg > 45 ? 20 : 10;
  const lines: number[] = [];
  for (let altitudeDeg = stepDeg; altitudeDeg < frame.topAltitudeDeg; altitudeDeg += stepDeg) {
    lines.push(altitudeDeg);
  }
  return lines;
}
