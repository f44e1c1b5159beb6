import { describe, expect, it } from 'vitest';
import { computeSunDay } from '../../../web/map/sun-day.ts';

const minuteMs = 60_000;
const larkhaven = ['America/Chicago', -91.3, 46.75] as const;

describe('computeSunDay', () => {
  it('puts the noon sun of a solstice at 90° − latitude ± obliquity', () => {
    // Spherical astronomy: 90 − 46.75 ∓ 23.44, and refraction lifts 20° by 0.04°.
    expect(computeSunDay('2026-12-21', ...larkhaven).noonAltitudeDeg).toBeCloseTo(19.85, 1);
    expect(computeSunDay('2026-06-21', ...larkhaven).noonAltitudeDeg).toBeCloseTo(66.69, 1);
  });

  it('puts noon midway between sunrise and sunset, at the longitude’s own time', () => {
    const day = computeSunDay('2026-12-21', ...larkhaven);
    const middleMs = ((day.sunriseMs ?? 0) + (day.sunsetMs ?? 0)) / 2;
    expect(Math.abs(middleMs - day.noonMs)).toBeLessThan(1.5 * minuteMs);
    // 91.3° W is 1.3° west of the zone's meridian: 5.2 min late; the sun is 2 min fast that day.
    const meanNoonMs = Date.parse('2026-12-21T12:03:12-06:00');
    expect(Math.abs(day.noonMs - meanNoonMs)).toBeLessThan(2 * minuteMs);
  });

  it('begins the curve at sunrise and ends it at sunset, on the horizon', () => {
    const day = computeSunDay('2026-03-20', ...larkhaven);
    expect(day.curve.at(0)).toMatchObject({ atMs: day.sunriseMs });
    expect(day.curve.at(-1)).toMatchObject({ atMs: day.sunsetMs });
    expect(day.curve.at(0)?.altitudeDeg).toBeLessThan(0.01);
    expect(day.curve.every((one) => one.altitudeDeg >= 0)).toBe(true);
  });

  it('has no curve in the polar night and no sunset at midsummer beyond the circle', () => {
    const night = computeSunDay('2026-12-21', 'Europe/Oslo', 25, 71);
    expect(night.curve).toEqual([]);
    expect(night.noonAltitudeDeg).toBeLessThan(0);
    const bright = computeSunDay('2026-06-21', 'Europe/Oslo', 25, 71);
    expect(bright.sunriseMs).toBeNull();
    expect(bright.sunsetMs).toBeNull();
    expect(bright.curve.at(0)?.atMs).toBe(bright.startMs);
  });

  it('knows that the day on which clocks go forward has 23 hours', () => {
    const day = computeSunDay('2026-03-08', ...larkhaven);
    expect(day.endMs - day.startMs).toBe(23 * 60 * minuteMs);
  });
});
