import { describe, expect, it } from 'vitest';
import { standardClockToMs } from '../../../shared/solar/civil-time.ts';
import { keyDatesOfYear } from '../../../shared/solar/key-dates.ts';
import { solarClockToMs, trueSolarHours } from '../../../shared/solar/solar-time.ts';
import { sunAboveSpans } from '../../../shared/solar/sun-above.ts';
import { sunPositionAt } from '../../../shared/solar/sun-position.ts';

describe('true solar time', () => {
  // Worked out with the NREL SPA code of pvlib 0.15.3; rounded to the minute.
  it.each([
    ['2026-12-21T09:00:00-07:00', 40.015, -105.2705, '09:01'],
    ['2026-03-21T09:00:00-06:00', 40.015, -105.2705, '07:52'],
    ['2026-06-21T09:00:00-06:00', 40.015, -105.2705, '07:57'],
    ['2026-12-21T15:00:00-08:00', 47.6062, -122.3321, '14:52'],
    ['2026-06-21T09:00:00+10:00', -33.8688, 151.2093, '09:03'],
    ['2026-09-22T15:00:00+10:00', -37.8136, 144.9631, '14:47'],
    ['2026-03-21T12:00:00+00:00', 51.5074, -0.1278, '11:52'],
  ])('at %s is read off the sun, not off the clock', (at, latitude, longitude, expected) => {
    const minutes = trueSolarHours(Date.parse(at), longitude, latitude) * 60;
    const [hours = 0, rest = 0] = expected.split(':').map(Number);
    // Half a minute of the table's rounding, and a few seconds.
    expect(Math.abs(minutes - (hours * 60 + rest))).toBeLessThan(0.6);
  });

  // 139.77° E: the longitude takes 19.08 min and the equation of time 1.63 min from the clock of
  // 135° E (closed formula with the equation of time of pvlib's SPA): 11:39:17.
  it('puts noon of 22 December in Tokyo twenty minutes before the clock', () => {
    const noonMs = solarClockToMs('2026-12-22', '12:00', 139.77, 35.68);
    expect(Math.abs(noonMs - Date.parse('2026-12-22T11:39:17+09:00'))).toBeLessThan(3000);
  });

  it('comes back from the clock it was asked for', () => {
    const atMs = solarClockToMs('2026-06-21', '08:00', -91.3, 46.75);
    expect(trueSolarHours(atMs, -91.3, 46.75)).toBeCloseTo(8, 4);
  });
});

describe('key dates', () => {
  // 2026: equinox 20 March 14:46 UTC (from memory), solstice 21 June 08 h, equinox 23 September
  // 00–01 h, solstice 21 December 21 h UTC (by the sign and the extremes of the declination in
  // pvlib's SPA, hour by hour). In Chicago the September instant falls on the evening before.
  it('fall on the civil date of the zone', () => {
    expect(keyDatesOfYear(2026, 'Europe/London').map(({ date }) => date)).toEqual([
      '2026-03-20',
      '2026-06-21',
      '2026-09-23',
      '2026-12-21',
    ]);
    expect(keyDatesOfYear(2026, 'America/Chicago').map(({ date }) => date)).toEqual([
      '2026-03-20',
      '2026-06-21',
      '2026-09-22',
      '2026-12-21',
    ]);
  });
});

describe('the stretch with the sun up', () => {
  // Altitudes at noon of the winter solstice, the equinox and the summer solstice are
  // 90° − latitude + declination; declination ±23.44° (common practice, no source).
  it('has its highest sun at 90 degrees less the latitude plus the declination', () => {
    const noonMs = solarClockToMs('2026-12-21', '12:00', 0, 40);
    const refractionDeg = 0.0316;
    expect(sunPositionAt(noonMs, 0, 40).altitudeDeg - refractionDeg).toBeCloseTo(26.56, 1);
  });

  it('ends at whole seconds between which the sun stands at or above the horizon', () => {
    const [span, ...more] = sunAboveSpans('2026-12-21', 'America/Chicago', -91.3, 46.75, 0);
    expect(more).toEqual([]);
    const altitude = (atMs: number) => sunPositionAt(atMs, -91.3, 46.75).altitudeDeg;
    const startMs = span?.startMs ?? 0;
    const endMs = span?.endMs ?? 0;
    expect(altitude(startMs)).toBeGreaterThanOrEqual(0);
    expect(altitude(startMs - 1000)).toBeLessThan(0);
    expect(altitude(endMs)).toBeGreaterThanOrEqual(0);
    expect(altitude(endMs + 1000)).toBeLessThan(0);
  });

  it('is the whole day in the polar summer and nothing in the polar winter', () => {
    const summer = sunAboveSpans('2026-06-21', 'Europe/Oslo', 18.95, 69.65, 0);
    expect(summer).toHaveLength(1);
    expect((summer[0]?.endMs ?? 0) - (summer[0]?.startMs ?? 0)).toBe(24 * 3_600_000);
    expect(sunAboveSpans('2026-12-21', 'Europe/Oslo', 18.95, 69.65, 0)).toEqual([]);
  });

  // Day length from sunrise to sunset of the disc's centre on a flat horizon: at 45° 8.574 h in
  // December and 15.426 h in June, by 2/15·acos(−tan φ tan δ) (closed form); refraction at the
  // horizon lengthens it by 2·34′ of the sun's path, about 7 minutes at 45°.
  it.each([
    ['2026-12-21', 8.574],
    ['2026-06-21', 15.426],
  ])('on %s at 45 degrees is as long as the closed form says', (date, hours) => {
    const [span] = sunAboveSpans(date, 'Etc/UTC', 0, 45, 0);
    const length = ((span?.endMs ?? 0) - (span?.startMs ?? 0)) / 3_600_000;
    expect(length - hours).toBeGreaterThan(0.08);
    expect(length - hours).toBeLessThan(0.16);
  });
});

describe('standard time', () => {
  it('keeps its offset through the summer', () => {
    expect(standardClockToMs('2026-06-21', '10:00', 'America/Chicago')).toBe(
      Date.parse('2026-06-21T10:00:00-06:00'),
    );
    expect(standardClockToMs('2026-01-21', '10:00', 'Australia/Sydney')).toBe(
      Date.parse('2026-01-21T10:00:00+10:00'),
    );
  });
});
