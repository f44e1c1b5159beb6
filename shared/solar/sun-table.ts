import {
  AstroTime,
  Body,
  EquatorFromVector,
  GeoVector,
  Observer,
  RotateVector,
  Rotation_EQJ_EQD,
  SearchRiseSet,
} from 'astronomy-engine';
import { civilDayBounds } from './civil-time.ts';
import { solarClockToMs, solarDateOf, trueSolarHours } from './solar-time.ts';
import { sunPositionAt } from './sun-position.ts';

const dayMs = 86_400_000;

/** What almanacs print for one day at one place. */
export interface SunTable {
  /** The disc's upper edge on a flat horizon, refraction 34′; null where it does not cross it. */
  sunriseMs: number | null;
  /** The sun's centre on the meridian. */
  solarNoonMs: number;
  sunsetMs: number | null;
  /** Apparent altitude of the centre at solar noon, degrees. */
  noonAltitudeDeg: number;
  /** At solar noon, degrees, north positive. */
  declinationDeg: number;
  /** At solar noon: true less mean solar time, minutes. */
  equationOfTimeMin: number;
}

/**
 * Sunrise, solar noon and sunset of a civil day as almanacs print them, by astronomy-engine. The
 * engine itself judges by the disc's centre, which rises some minutes later: see `sunAboveSpans`.
 *
 * @param date civil date, `YYYY-MM-DD`
 */
export function sunTableOf(
  date: string,
  timeZone: string,
  longitude: number,
  latitude: number,
): SunTable {
  const { startMs, endMs } = civilDayBounds(date, timeZone);
  const observer = new Observer(latitude, longitude, 0);
  const crossing = (direction: 1 | -1): number | null => {
    const days = (endMs - startMs) / dayMs;
    const found = SearchRiseSet(Body.Sun, observer, direction, new Date(startMs), days);
    return found === null ? null : found.date.getTime();
  };
  const solarDate = solarDateOf(date, timeZone, longitude);
  const solarNoonMs = solarClockToMs(solarDate, '12:00', longitude, latitude);
  return {
    sunriseMs: crossing(1),
    solarNoonMs,
    sunsetMs: crossing(-1),
    noonAltitudeDeg: sunPositionAt(solarNoonMs, longitude, latitude).altitudeDeg,
    declinationDeg: sunDeclinationDeg(solarNoonMs),
    equationOfTimeMin: equationOfTimeMin(solarNoonMs),
  };
}

/** The sun's apparent declination at an instant, seen from the Earth's centre, in degrees. */
export function sunDeclinationDeg(atMs: number): number {
  const time = new AstroTime(new Date(atMs));
  return EquatorFromVector(RotateVector(Rotation_EQJ_EQD(time), GeoVector(Body.Sun, time, true)))
    .dec;
}

/** True less mean solar time at an instant, in minutes: what a sundial is ahead of an even clock. */
export function equationOfTimeMin(atMs: number): number {
  const meanHours = (atMs % dayMs) / 3_600_000;
  const aheadHours = trueSolarHours(atMs, 0, 0) - meanHours;
  // It never reaches 17 minutes, so what is hours away is a day's turn.
  return 60 * (aheadHours - 24 * Math.round(aheadHours / 24));
}
