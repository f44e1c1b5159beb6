import { describe, expect, it } from 'vitest';
import { createLocalPlane } from '../../../shared/geometry/local-plane.ts';

// WGS 84 (NIMA TR8350.2): semi-major axis and flattening.
const semiMajorM = 6_378_137;
const flattening = 1 / 298.257223563;
const eccentricity2 = flattening * (2 - flattening);
const radiansPerDegree = Math.PI / 180;

/** Metres for one degree of latitude and of longitude: the two radii of curvature of the ellipsoid. */
function metresPerDegree(latitude: number): { north: number; east: number } {
  const sine = Math.sin(latitude * radiansPerDegree);
  const across = semiMajorM / Math.sqrt(1 - eccentricity2 * sine * sine);
  const along = (across * (1 - eccentricity2)) / (1 - eccentricity2 * sine * sine);
  return {
    north: along * radiansPerDegree,
    east: across * Math.cos(latitude * radiansPerDegree) * radiansPerDegree,
  };
}

const places = [
  [-91.3, 46.75],
  [151.2, -33.9],
  [0, 0],
  [179.999, 64],
  [-179.999, -64],
] as const;

describe.each(places)('the plane around %d, %d', (longitude, latitude) => {
  const plane = createLocalPlane(longitude, latitude);

  it('has metres that are metres, up to 5 km from its middle', () => {
    for (const [eastM, northM] of [
      [0, 0],
      [5000, 0],
      [-5000, 5000],
      [300, -4000],
    ] as const) {
      const from = plane.toLngLat([eastM, northM]);
      const perDegree = metresPerDegree(from[1]);
      const stepM = 10;
      const start = plane.toPlane(from);
      const east = plane.toPlane([from[0] + stepM / perDegree.east, from[1]]);
      const north = plane.toPlane([from[0], from[1] + stepM / perDegree.north]);
      // On a transverse Mercator plane a length grows by x²/(2R²): 3e-7 at 5 km.
      expect(Math.hypot(east[0] - start[0], east[1] - start[1]) / stepM).toBeCloseTo(1, 5);
      expect(Math.hypot(north[0] - start[0], north[1] - start[1]) / stepM).toBeCloseTo(1, 5);
    }
  });

  it('has y along the meridian and x across it', () => {
    const [x, y] = plane.toPlane([longitude, latitude + 0.01]);
    expect(x).toBeCloseTo(0, 6);
    expect(y).toBeGreaterThan(1100);
    expect(plane.toPlane([longitude, latitude]).map((value) => Math.abs(value))).toEqual([
      expect.closeTo(0, 6),
      expect.closeTo(0, 6),
    ]);
  });

  it('goes across the date line and comes back to the same point', () => {
    const [x] = plane.toPlane([longitude > 0 ? longitude + 0.01 : longitude - 0.01, latitude]);
    expect(Math.abs(x)).toBeLessThan(1200);
    for (const point of [
      [1234.5, -678.9],
      [-4000, 4000],
    ] as const) {
      const back = plane.toPlane(plane.toLngLat(point));
      expect(back[0]).toBeCloseTo(point[0], 5);
      expect(back[1]).toBeCloseTo(point[1], 5);
    }
  });
});
