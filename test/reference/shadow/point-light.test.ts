import { describe, expect, it } from 'vitest';
import type { PlanePoint } from '../../../shared/geometry/ring.ts';
import { createPointSampler } from '../../../shared/shadow/point-light.ts';
import { createLightMeasures, makeLitArea } from '../../../shared/shadow/receptor-light.ts';
import { sampleArea } from '../../../shared/shadow/sample-grid.ts';
import type { SamplePoints } from '../../../shared/shadow/sample-points.ts';
import { castShadowLayer } from '../../../shared/shadow/shadow-layer.ts';
import { makeRandomTown, makeRectangle } from '../../support/plane-scenes.ts';
import { createSeededRandom } from '../../support/seeded-random.ts';
import { alongOf, isShadedByRay } from './independent-shadow.ts';

const suns = [
  { azimuthDeg: 180, altitudeDeg: 19.8 },
  { azimuthDeg: 90, altitudeDeg: 4 },
  { azimuthDeg: 225, altitudeDeg: 45 },
  { azimuthDeg: 133.7, altitudeDeg: 11 },
  { azimuthDeg: 301.2, altitudeDeg: 62 },
];

/** Where each point lies, by its number. */
function placesOf({ count, runs }: SamplePoints): PlanePoint[] {
  const places: PlanePoint[] = Array.from({ length: count }, () => [NaN, NaN]);
  runs.y.forEach((y, run) => {
    for (let offset = 0; offset < (runs.length[run] ?? 0); offset += 1) {
      places[(runs.first[run] ?? 0) + offset] = [
        (runs.startX[run] ?? NaN) + offset * (runs.stepX[run] ?? NaN),
        y,
      ];
    }
  });
  return places;
}

describe('light at sample points', () => {
  it('agrees with rays shot from every point of grids in random towns', () => {
    const random = createSeededRandom(17);
    const sampler = createPointSampler();
    let points = 0;
    let differing = 0;
    for (const sun of suns) {
      for (const planeM of [0, 3.5]) {
        const blocks = makeRandomTown(random, 60);
        const along = alongOf(sun);
        const ring = makeRectangle(random() * 60 - 60, random() * 60 - 60, 40, 30, random() * 90);
        const grid = sampleArea({
          rings: [ring],
          outside: [],
          areaM2: 1200,
          gridM: 4,
          mostPoints: 10_000,
          withBorder: true,
        });
        const light = sampler(grid, castShadowLayer(blocks, sun, planeM));
        placesOf(grid).forEach((place, point) => {
          const isShaded = (...roles: string[]) =>
            blocks.some(
              (block) => roles.includes(block.role) && isShadedByRay(place, planeM, block, along),
            );
          points += 2;
          if ((light.before[point] === 0) !== isShaded('context', 'existing')) differing += 1;
          if ((light.after[point] === 0) !== isShaded('context', 'proposed')) differing += 1;
        });
      }
    }
    expect(points).toBeGreaterThan(8000);
    // Points on an edge of a snapped block may go either way.
    expect(differing).toBeLessThan(points / 1000);
  });

  it('gives the sunlit share that the sweep measures, but for the grid', () => {
    const random = createSeededRandom(23);
    const sampler = createPointSampler();
    const measures = createLightMeasures();
    for (const sun of suns) {
      const layer = castShadowLayer(makeRandomTown(random, 60), sun, 0);
      const ring = makeRectangle(-25, -20, 50, 40, random() * 90);
      const grid = sampleArea({
        rings: [ring],
        outside: [],
        areaM2: 2000,
        gridM: 1,
        mostPoints: 10_000,
        withBorder: false,
      });
      const light = sampler(grid, layer);
      const area = measures.light(makeLitArea([ring], []), layer);
      const share = (lit: Uint8Array) => lit.reduce((sum, one) => sum + one, 0) / grid.count;
      expect(Math.abs(share(light.before) - area.sunBeforeM2 / 2000)).toBeLessThan(0.01);
      expect(Math.abs(share(light.after) - area.sunAfterM2 / 2000)).toBeLessThan(0.01);
    }
  });
});
