import { describe, expect, it } from 'vitest';
import type { LngLat } from '../../../shared/geometry/geojson-schema.ts';
import { measureFeatures, stretchesM } from '../../../web/map/measured-line.ts';

// WGS 84: semi-major axis and first eccentricity squared (NGA.STND.0036, from memory).
const axisM = 6_378_137;
const eccentricity2 = 0.006_694_379_990_14;
const latitude = 46.75;
const sine2 = Math.sin((latitude * Math.PI) / 180) ** 2;
/** Metres of a degree along the meridian and along the parallel: the radii of curvature. */
const northM = ((Math.PI / 180) * axisM * (1 - eccentricity2)) / (1 - eccentricity2 * sine2) ** 1.5;
const eastM =
  ((Math.PI / 180) * axisM * Math.cos((latitude * Math.PI) / 180)) /
  Math.sqrt(1 - eccentricity2 * sine2);

const start: LngLat = [-91.3, latitude];

describe('a measured line', () => {
  it('has the lengths of its stretches on the ground, to a centimetre in a hundred metres', () => {
    const points: LngLat[] = [
      start,
      [start[0], latitude + 100 / northM],
      [start[0] + 50 / eastM, latitude + 100 / northM],
    ];
    const [north, east] = stretchesM(points);
    expect(north).toBeCloseTo(100, 1);
    expect(Math.abs((north ?? 0) - 100)).toBeLessThan(0.01);
    expect(Math.abs((east ?? 0) - 50)).toBeLessThan(0.01);
  });

  it('has no stretch before its second point', () => {
    expect(stretchesM([])).toEqual([]);
    expect(stretchesM([start])).toEqual([]);
  });

  it('is drawn as its points, and as a line from the second on', () => {
    const kinds = (points: LngLat[]) =>
      measureFeatures(points).features.map(({ geometry }) => geometry.type);
    expect(kinds([start])).toEqual(['Point']);
    expect(kinds([start, [-91.2, 46.7]])).toEqual(['LineString', 'Point', 'Point']);
  });
});
