import { sunPositionAt } from '../../../shared/solar/sun-position.ts';

const dayMs = 86_400_000;

/** The sun's altitude in degrees at the mean solar noon nearest to an instant: the highest of the day within 0.3°. */
export function noonAltitudeDeg(atMs: number, longitude: number, latitude: number): number {
  const noonOffsetMs = dayMs / 2 - (longitude / 360) * dayMs;
  const noonMs = Math.round((atMs - noonOffsetMs) / dayMs) * dayMs + noonOffsetMs;
  return sunPositionAt(noonMs, longitude, latitude).altitudeDeg;
}
