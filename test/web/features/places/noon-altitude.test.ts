import { describe, expect, it } from 'vitest';
import { noonAltitudeDeg } from '../../../../web/features/places/noon-altitude.ts';

describe('the height of the noon sun for the mark', () => {
  // 90° − |latitude − declination| with the declination of the solstices, ±23.44°, and of the
  // equinoxes, 0° (common astronomy); refraction adds less than 0.1° at these heights.
  it.each([
    ['2026-12-21T18:00:00Z', -91.3, 46.75, 90 - 46.75 - 23.44],
    ['2026-06-21T12:00:00Z', -91.3, 46.75, 90 - 46.75 + 23.44],
    ['2026-03-20T23:00:00Z', 151.2, -33.87, 90 - 33.87],
  ])('at %s on %d, %d is %d°', (at, longitude, latitude, expectedDeg) => {
    const altitudeDeg = noonAltitudeDeg(Date.parse(at), longitude, latitude);
    expect(Math.abs(altitudeDeg - expectedDeg)).toBeLessThan(0.5);
  });
});
