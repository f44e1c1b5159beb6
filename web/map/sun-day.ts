import { civilDayBounds } from '../../shared/solar/civil-time.ts';
import { sunAboveSpans } from '../../shared/solar/sun-above.ts';
import { sunPositionAt } from '../../shared/solar/sun-position.ts';

export interface SunDay {
  date: string;
  timeZone: string;
  /** The civil day's first instant and the next day's. */
  startMs: number;
  endMs: number;
  /** The sun's centre on the horizon; null where it does not cross it on that side of the day. */
  sunriseMs: number | null;
  sunsetMs: number | null;
  /** The sun's highest point. */
  noonMs: number;
  noonAltitudeDeg: number;
  /** The altitude curve while the sun is up, both ends included; empty where it stays down. */
  curve: { atMs: number; altitudeDeg: number }[];
}

const curveStepMs = 300_000;

/**
 * The sun's course over one civil day.
 *
 * @param date `YYYY-MM-DD` in `timeZone` (IANA name)
 */
export function computeSunDay(
  date: string,
  timeZone: string,
  longitude: number,
  latitude: number,
): SunDay {
  const { startMs, endMs } = civilDayBounds(date, timeZone);
  const altitudeAt = (atMs: number) => sunPositionAt(atMs, longitude, latitude).altitudeDeg;
  // Near the poles a day can hold two stretches of sun; the arc shows from the first to the last.
  const spans = sunAboveSpans(date, timeZone, longitude, latitude, 0);
  const upMs = spans.at(0)?.startMs ?? null;
  const downMs = spans.at(-1)?.endMs ?? null;

  let highestMs = startMs;
  for (let atMs = startMs; atMs <= endMs; atMs += curveStepMs) {
    if (altitudeAt(atMs) > altitudeAt(highestMs)) highestMs = atMs;
  }
  const noonMs = findHighest(altitudeAt, highestMs - curveStepMs, highestMs + curveStepMs);

  const curve: SunDay['curve'] = [];
  if (upMs !== null && downMs !== null) {
    const point = (atMs: number) => ({ atMs, altitudeDeg: Math.max(0, altitudeAt(atMs)) });
    for (let atMs = upMs; atMs < downMs; atMs += curveStepMs) curve.push(point(atMs));
    curve.push(point(downMs));
  }
  return {
    date,
    timeZone,
    startMs,
    endMs,
    sunriseMs: upMs === startMs ? null : upMs,
    sunsetMs: downMs === endMs ? null : downMs,
    noonMs,
    noonAltitudeDeg: altitudeAt(noonMs),
    curve,
  };
}

/** Ternary search to a tenth of a second; the altitude has one maximum between the two. */
function findHighest(altitudeAt: (atMs: number) => number, fromMs: number, toMs: number): number {
  let [lowMs, highMs] = [fromMs, toMs];
  while (highMs - lowMs > 100) {
    const thirdMs = (highMs - lowMs) / 3;
    if (altitudeAt(lowMs + thirdMs) < altitudeAt(highMs - thirdMs)) lowMs += thirdMs;
    else highMs -= thirdMs;
  }
  return Math.round((lowMs + highMs) / 2);
}
