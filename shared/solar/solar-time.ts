import { Body, HourAngle, Observer } from 'astronomy-engine';
import { civilDayBounds } from './civil-time.ts';

const dayMs = 86_400_000;

/**
 * True solar time of an instant in hours, [0, 24): twelve when the sun's centre crosses the
 * meridian. From the sun's apparent hour angle by astronomy-engine.
 */
export function trueSolarHours(atMs: number, longitude: number, latitude: number): number {
  const hourAngleHours = HourAngle(Body.Sun, new Date(atMs), new Observer(latitude, longitude, 0));
  return (hourAngleHours + 12) % 24;
}

/**
 * The solar day whose noon falls on a civil date. The two differ only where a zone's clock is half a
 * day or more from its meridian, as east of the date line.
 */
export function solarDateOf(date: string, timeZone: string, longitude: number): string {
  const { startMs, endMs } = civilDayBounds(date, timeZone);
  const noonMs = Date.parse(`${date}T12:00:00Z`) - (longitude / 360) * dayMs;
  const days = noonMs < startMs ? 1 : noonMs >= endMs ? -1 : 0;
  return new Date(Date.parse(date) + days * dayMs).toISOString().slice(0, 10);
}

/**
 * The instant at which true solar time shows a clock on the solar day of a date, to 0.1 s.
 *
 * @param date `YYYY-MM-DD`: the solar day whose mean noon at this longitude carries the date
 * @param clock `HH:MM`
 */
export function solarClockToMs(
  date: string,
  clock: string,
  longitude: number,
  latitude: number,
): number {
  const wantedHours = Number(clock.slice(0, 2)) + Number(clock.slice(3)) / 60;
  let atMs = Date.parse(`${date}T${clock}:00Z`) - (longitude / 360) * dayMs;
  // The equation of time moves by at most 30 s a day, so each round gains three digits.
  for (let round = 0; round < 3; round += 1) {
    const missing = wantedHours - trueSolarHours(atMs, longitude, latitude);
    atMs += (missing > 12 ? missing - 24 : missing < -12 ? missing + 24 : missing) * 3_600_000;
  }
  return atMs;
}
