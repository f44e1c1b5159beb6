import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { civilDayBounds, formatInstant } from '../../../shared/solar/civil-time.ts';
import { solarClockToMs, trueSolarHours } from '../../../shared/solar/solar-time.ts';
import { sunPositionAt } from '../../../shared/solar/sun-position.ts';
import {
  equationOfTimeMin,
  sunDeclinationDeg,
  sunTableOf,
} from '../../../shared/solar/sun-table.ts';

const dayMs = 86_400_000;

describe('sunrise, solar noon and sunset', () => {
  // NREL's algorithm (Reda and Andreas, NREL/TP-560-34302) as carried by pvlib's
  // tests/test_solarposition.py and tests/test_spa.py: rise, transit, set. It takes 0.8333° for
  // refraction and radius; astronomy-engine takes 34′ and the radius of the day, some seconds off.
  it.each([
    ['2015-01-02', 'Etc/GMT+7', 39.742476, -105.1786, '07:21:55', '12:04:45', '16:47:43'],
    // That file works by days of UTC: its sunset of 2 August is that of the evening of the 1st.
    ['2015-08-01', 'Etc/GMT+7', 39.742476, -105.1786, null, null, '19:13:58'],
    ['2015-08-02', 'Etc/GMT+7', 39.742476, -105.1786, '05:00:27', '12:06:58', null],
    ['1996-07-05', 'Etc/UTC', -35, 0, '07:08:15', '12:04:36', '17:01:04'],
    ['2004-12-04', 'Etc/UTC', -35, 0, '04:38:57', '11:50:22', '19:02:03'],
    ['2000-01-01', 'Etc/GMT+5', 40, -80, '07:41:51', '12:23:23', '17:05:04'],
  ])(
    'on %s in %s at %d, %d are those of NREL’s algorithm',
    (date, zone, latitude, longitude, rise, noon, set) => {
      const table = sunTableOf(date, zone, longitude, latitude);
      const midnightMs = civilDayBounds(date, zone).startMs;
      const off = (atMs: number | null, clock: string | null) =>
        clock === null
          ? 0
          : Math.abs((atMs ?? NaN) - midnightMs - Date.parse(`1970-01-01T${clock}Z`)) / 1000;
      expect(off(table.sunriseMs, rise)).toBeLessThan(15);
      expect(off(table.solarNoonMs, noon)).toBeLessThan(5);
      expect(off(table.sunsetMs, set)).toBeLessThan(15);
    },
  );

  // USNO, minutes, as carried by pvlib's tests/test_solarposition.py.
  it.each([
    ['2015-01-02', 'Etc/GMT+7', 39, -105, '07:19', '16:49'],
    ['2015-04-02', 'Etc/GMT+7', 39, -105, '05:43', '18:24'],
    ['2015-08-02', 'Etc/GMT+7', 39, -105, '05:01', '19:10'],
    ['2015-12-02', 'Etc/GMT+7', 39, -105, '07:01', '16:38'],
    ['2015-01-02', 'Asia/Shanghai', 39.917, 116.383, '07:36', '17:00'],
    ['2015-04-02', 'Asia/Shanghai', 39.917, 116.383, '05:58', '18:39'],
    ['2015-08-02', 'Asia/Shanghai', 39.917, 116.383, '05:13', '19:28'],
    ['2015-12-02', 'Asia/Shanghai', 39.917, 116.383, '07:17', '16:50'],
  ])(
    'on %s in %s at %d, %d round to the minutes of the almanac',
    (date, zone, latitude, longitude, rise, set) => {
      const table = sunTableOf(date, zone, longitude, latitude);
      const minutes = (atMs: number | null) =>
        formatInstant(Math.round((atMs ?? 0) / 60_000) * 60_000, zone).slice(11, 16);
      expect([minutes(table.sunriseMs), minutes(table.sunsetMs)]).toEqual([rise, set]);
    },
  );

  it('have no rise or set in polar day and polar night, and still a noon', () => {
    for (const date of ['2026-06-21', '2026-12-21']) {
      const table = sunTableOf(date, 'Europe/Oslo', 18.95, 69.65);
      expect([table.sunriseMs, table.sunsetMs]).toEqual([null, null]);
      expect(formatInstant(table.solarNoonMs, 'Europe/Oslo').slice(0, 10)).toBe(date);
    }
  });

  it('fall on the civil date also where the zone is half a day from its meridian', () => {
    for (const [zone, longitude, latitude] of [
      ['Pacific/Kiritimati', -157.4, 1.9],
      ['Pacific/Chatham', -176.5, -44],
      ['Pacific/Pago_Pago', -170.7, -14.3],
      ['Asia/Urumqi', 87.6, 43.8],
    ] as const) {
      const table = sunTableOf('2026-03-20', zone, longitude, latitude);
      for (const atMs of [table.sunriseMs, table.solarNoonMs, table.sunsetMs]) {
        expect(formatInstant(atMs ?? 0, zone).slice(0, 10), zone).toBe('2026-03-20');
      }
    }
  });
});

describe('the declination', () => {
  // Meeus, Astronomical Algorithms (2nd ed., 1998), example 25.a: 1992 October 13.0 TD, −7.78507°,
  // good to 0.01°. TD is ahead of UTC by 59 s there, in which it moves by 0.0003°.
  it('is that of Meeus’ example', () => {
    const declinationDeg = sunDeclinationDeg(Date.UTC(1992, 9, 13) - 59_000);
    expect(Math.abs(declinationDeg + 7.78507)).toBeLessThan(0.01);
  });

  // NREL/TP-560-34302, appendix A.5: −9.31434°.
  it('is that of NREL’s example', () => {
    expect(sunDeclinationDeg(Date.parse('2003-10-17T12:30:30-07:00'))).toBeCloseTo(-9.31434, 3);
  });

  // With the NREL SPA code of pvlib 0.15.3 at 12 h UTC.
  it.each([
    ['2026-03-20', -0.045],
    ['2026-03-21', 0.35],
    ['2026-06-21', 23.438],
    ['2026-09-22', 0.196],
    ['2026-12-21', -23.437],
    ['2026-01-20', -20.057],
  ])('on %s is that of SPA', (date, declinationDeg) => {
    expect(sunDeclinationDeg(Date.parse(`${date}T12:00:00Z`))).toBeCloseTo(declinationDeg, 2);
  });

  // The tilt of the axis: 23.44° (common practice, no source).
  it('swings as far as the axis leans', () => {
    const year = Array.from({ length: 365 }, (_, day) =>
      sunDeclinationDeg(Date.UTC(2026, 0, 1) + day * dayMs),
    );
    expect(Math.max(...year)).toBeCloseTo(23.44, 1);
    expect(Math.min(...year)).toBeCloseTo(-23.44, 1);
  });
});

describe('the equation of time', () => {
  it.each([
    // NREL/TP-560-34302, A.5, as recomputed with pvlib: 14.6415 min.
    ['2003-10-17T19:30:30Z', 14.6415, 0.02],
    // Meeus, example 28.a: +13 min 42.6 s (from memory).
    ['1992-10-12T23:59:01Z', 13 + 42.6 / 60, 0.02],
    // pvlib's tests/test_irradiance.py, 24 June 2014, UTC−7.
    ['2014-06-24T07:00:00Z', -2.36677, 0.02],
    ['2014-06-25T01:00:00Z', -2.52833, 0.02],
    // Extremes of 2026 with the NREL SPA code of pvlib 0.15.3.
    ['2026-02-11T12:00:00Z', -14.17, 0.02],
    ['2026-05-14T00:00:00Z', 3.68, 0.02],
    ['2026-07-26T12:00:00Z', -6.56, 0.02],
    ['2026-11-03T12:00:00Z', 16.45, 0.02],
    ['2026-12-25T12:00:00Z', 0, 0.3],
  ])('at %s is %d minutes', (at, minutes, toleranceMin) => {
    expect(Math.abs(equationOfTimeMin(Date.parse(at)) - minutes)).toBeLessThan(toleranceMin);
  });
});

describe('the sun in the other hemisphere', () => {
  it('stands mirrored at the same solar time when the declination is the opposite one', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: Date.UTC(1995, 0, 1), max: Date.UTC(2055, 0, 1) }),
        fc.double({ min: -65, max: 65, noNaN: true }),
        fc.double({ min: 6, max: 18, noNaN: true }),
        (fromMs, latitude, hours) => {
          // A southern place at the same solar time, on the day when the sun is as far south.
          const otherMs = findOpposite(fromMs);
          const at = (dayMsOf: number, ofLatitude: number) => {
            const longitude = (hours - trueSolarHours(dayMsOf, 0, 0)) * 15;
            return sunPositionAt(dayMsOf, longitude, ofLatitude);
          };
          const north = at(fromMs, latitude);
          const south = at(otherMs, -latitude);
          if (north.altitudeDeg < 2) return;
          expect(Math.abs(south.altitudeDeg - north.altitudeDeg)).toBeLessThan(0.03);
          const turnDeg = ((north.azimuthDeg + south.azimuthDeg - 180 + 540) % 360) - 180;
          const across = Math.abs(turnDeg * Math.cos((north.altitudeDeg * Math.PI) / 180));
          expect(across).toBeLessThan(0.03);
        },
      ),
      { numRuns: 200 },
    );
  });

  it('comes back to the solar clock that was asked for, everywhere', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 0, max: 364 }),
        fc.double({ min: -180, max: 180, noNaN: true }),
        fc.integer({ min: 0, max: 23 }),
        (day, longitude, hour) => {
          const date = new Date(Date.UTC(2026, 0, 1) + day * dayMs).toISOString().slice(0, 10);
          const clock = `${String(hour).padStart(2, '0')}:00`;
          const off =
            trueSolarHours(solarClockToMs(date, clock, longitude, 0), longitude, 0) - hour;
          expect(Math.abs(off - 24 * Math.round(off / 24))).toBeLessThan(1e-4);
        },
      ),
    );
  });
});

/** The next instant, half a year or so on, at which the declination is the opposite one. */
function findOpposite(fromMs: number): number {
  const sum = (atMs: number) => sunDeclinationDeg(atMs) + sunDeclinationDeg(fromMs);
  let beforeMs = fromMs;
  while (sum(beforeMs) * sum(beforeMs + dayMs) > 0) beforeMs += dayMs;
  let afterMs = beforeMs + dayMs;
  while (afterMs - beforeMs > 1000) {
    const middleMs = (beforeMs + afterMs) / 2;
    if (sum(beforeMs) * sum(middleMs) > 0) beforeMs = middleMs;
    else afterMs = middleMs;
  }
  return beforeMs;
}
