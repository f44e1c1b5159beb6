import { difference, intersection, union, type Geom } from 'polyclip-ts';
import { describe, expect, it } from 'vitest';
import { loadClipper } from '../../../api/clipper.ts';
import { signedRingArea, type Ring } from '../../../shared/geometry/ring.ts';
import { createLightMeasures, makeLitArea } from '../../../shared/shadow/receptor-light.ts';
import { shadowVector } from '../../../shared/shadow/shadow-contours.ts';
import { castShadowLayer, type SceneBlock } from '../../../shared/shadow/shadow-layer.ts';
import { drawShadowPolygons, overlapAreaM2 } from '../../../shared/shadow/shadow-polygons.ts';
import { makeRandomTown, makeRectangle } from '../../support/plane-scenes.ts';
import { createSeededRandom } from '../../support/seeded-random.ts';

const suns = [
  { azimuthDeg: 180, altitudeDeg: 19.8 },
  { azimuthDeg: 90, altitudeDeg: 4 },
  { azimuthDeg: 225, altitudeDeg: 45 },
  { azimuthDeg: 133.7, altitudeDeg: 11 },
  { azimuthDeg: 301.2, altitudeDeg: 62 },
  { azimuthDeg: 270, altitudeDeg: 1.5 },
];

/** A ray from a point to the sun against every wall and roof: no contours, no pruning. */
function isShadedByRay(point: readonly [number, number], block: SceneBlock, along: Along): boolean {
  if (block.topM <= 0) return false;
  // Towards the sun the ray passes above (x − along·h, y − along·h) at height h.
  const heights = [Math.max(block.baseM, 0), block.topM];
  for (const ring of block.rings) {
    ring.forEach((from, index) => {
      const to = ring[(index + 1) % ring.length] ?? from;
      const edgeX = to[0] - from[0];
      const edgeY = to[1] - from[1];
      const cross = -along.x * edgeY + along.y * edgeX;
      if (cross === 0) return;
      const toX = from[0] - point[0];
      const toY = from[1] - point[1];
      const height = (toX * edgeY - toY * edgeX) / cross;
      const share = (toX * -along.y - toY * -along.x) / cross;
      if (share >= 0 && share <= 1) heights.push(height);
    });
  }
  const [low = 0, high = 0] = heights;
  const cuts = heights.filter((height) => height >= low && height <= high).sort((a, b) => a - b);
  return cuts.slice(1).some((top, index) => {
    const middle = (top + (cuts[index] ?? top)) / 2;
    return isInside([point[0] - along.x * middle, point[1] - along.y * middle], block.rings);
  });
}

type Along = ReturnType<typeof shadowVector>;

/** Even-odd crossing test. */
function isInside([x, y]: readonly [number, number], rings: readonly Ring[]): boolean {
  let inside = false;
  for (const ring of rings) {
    ring.forEach((a, index) => {
      const b = ring[(index + 1) % ring.length] ?? a;
      if (a[1] > y !== b[1] > y && x < ((b[0] - a[0]) * (y - a[1])) / (b[1] - a[1]) + a[0]) {
        inside = !inside;
      }
    });
  }
  return inside;
}

/** The shadow of a block as the union of its edges' quads and its two caps: no contours. */
function shadowByQuads(block: SceneBlock, along: Along): Geom {
  const nearM = Math.max(block.baseM, 0);
  const move = ([x, y]: readonly [number, number], m: number): [number, number] => [
    x + along.x * m,
    y + along.y * m,
  ];
  const cap = (m: number) =>
    block.rings.map((ring) => ring.map((point) => move(point, m))) satisfies Geom;
  const quads = block.rings.flatMap((ring) =>
    ring.map((from, index) => {
      const to = ring[(index + 1) % ring.length] ?? from;
      return [
        [move(from, nearM), move(to, nearM), move(to, block.topM), move(from, block.topM)],
      ] satisfies Geom;
    }),
  );
  return union(cap(nearM), cap(block.topM), ...quads);
}

function areaOf(geometry: [number, number][][][]): number {
  return geometry.reduce(
    (sum, polygon) =>
      sum + polygon.reduce((part, ring) => part + signedRingArea(ring.slice(0, -1)), 0),
    0,
  );
}

describe('shadow areas on random towns', () => {
  it('agree with rays shot from thousands of points', () => {
    const random = createSeededRandom(11);
    const blocks = makeRandomTown(random, 60);
    for (const sun of suns) {
      const along = shadowVector(sun);
      const layer = castShadowLayer(blocks, along, 0);
      // Cells so small that each is all in sun or all in shade, but for those on an edge.
      const measures = createLightMeasures();
      const cellM = 0.002;
      let edges = 0;
      for (let sample = 0; sample < 500; sample += 1) {
        const x = random() * 260 - 130;
        const y = random() * 260 - 130;
        const cell = makeLitArea([makeRectangle(x, y, cellM, cellM)], []);
        const litShare = measures.light(cell, layer).sunBeforeM2 / cellM ** 2;
        if (litShare > 0.001 && litShare < 0.999) {
          edges += 1;
          continue;
        }
        const middle = [x + cellM / 2, y + cellM / 2] as const;
        const isShaded = blocks.some(
          (block) => block.role !== 'proposed' && isShadedByRay(middle, block, along),
        );
        expect(litShare < 0.5, `${x}, ${y} with the sun at ${sun.azimuthDeg}°`).toBe(isShaded);
      }
      expect(edges).toBeLessThan(20);
    }
  });

  it('agree with polyclip-ts on the union of all edge quads to a millionth of a square metre', () => {
    const random = createSeededRandom(5);
    const measures = createLightMeasures();
    for (const sun of suns.slice(0, 4)) {
      const blocks = makeRandomTown(random, 10);
      const along = shadowVector(sun);
      const layer = castShadowLayer(blocks, along, 0);
      const ring = makeRectangle(-61, -43, 120, 80, 17);
      const ofRoles = (...roles: SceneBlock['role'][]) =>
        blocks
          .filter((block) => roles.includes(block.role))
          .map((block) => shadowByQuads(block, along));
      const receptor: Geom = [ring.map(([x, y]): [number, number] => [x, y])];
      const sunBefore = difference(receptor, ...ofRoles('context', 'existing'));
      const sunAfter = difference(receptor, ...ofRoles('context', 'proposed'));
      const proposed = ofRoles('proposed');
      const netNew =
        proposed.length === 0 ? [] : intersection(sunBefore, union(proposed[0] ?? [], ...proposed));
      const light = measures.light(makeLitArea([ring], []), layer);
      expect(Math.abs(light.sunBeforeM2 - areaOf(sunBefore))).toBeLessThan(1e-6);
      expect(Math.abs(light.sunAfterM2 - areaOf(sunAfter))).toBeLessThan(1e-6);
      expect(Math.abs(light.netNewM2 - areaOf(netNew))).toBeLessThan(1e-6);
    }
  });

  it('agree with the drawn polygons to a thousandth of a square metre', async () => {
    const clipper = await loadClipper();
    const random = createSeededRandom(3);
    const blocks = makeRandomTown(random, 120);
    const measures = createLightMeasures();
    let compared = 0;
    for (const sun of suns) {
      const layer = castShadowLayer(blocks, shadowVector(sun), 0);
      const polygons = drawShadowPolygons(clipper, layer);
      for (let sample = 0; sample < 40; sample += 1) {
        const turnDeg = random() < 0.5 ? 0 : random() * 90;
        const ring = makeRectangle(
          Math.round(random() * 240 - 120),
          Math.round(random() * 240 - 120),
          20,
          30,
          turnDeg,
        );
        const light = measures.light(makeLitArea([ring], []), layer);
        const drawnNetNew = overlapAreaM2(clipper, polygons.netNew, [ring]);
        const drawnBefore = 600 - overlapAreaM2(clipper, polygons.before, [ring]);
        expect(Math.abs(drawnNetNew - light.netNewM2)).toBeLessThan(1e-3);
        expect(Math.abs(drawnBefore - light.sunBeforeM2)).toBeLessThan(1e-3);
        compared += 1;
      }
    }
    expect(compared).toBe(240);
  });
});
