import { difference, intersection, union, type Geom } from 'polyclip-ts';
import { describe, expect, it } from 'vitest';
import { loadClipper } from '../../../api/clipper.ts';
import { signedRingArea } from '../../../shared/geometry/ring.ts';
import { createLightMeasures, makeLitArea } from '../../../shared/shadow/receptor-light.ts';
import { castShadowLayer, type SceneBlock } from '../../../shared/shadow/shadow-layer.ts';
import { drawShadowPolygons, overlapAreasM2 } from '../../../shared/shadow/shadow-polygons.ts';
import { makeRandomTown, makeRectangle } from '../../support/plane-scenes.ts';
import { createSeededRandom } from '../../support/seeded-random.ts';
import { alongOf, type Along } from './independent-shadow.ts';

const suns = [
  { azimuthDeg: 180, altitudeDeg: 19.8 },
  { azimuthDeg: 90, altitudeDeg: 4 },
  { azimuthDeg: 225, altitudeDeg: 45 },
  { azimuthDeg: 133.7, altitudeDeg: 11 },
  { azimuthDeg: 301.2, altitudeDeg: 62 },
  { azimuthDeg: 270, altitudeDeg: 1.5 },
];

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
  it('agree with polyclip-ts on the union of all edge quads to a millionth of a square metre', () => {
    const random = createSeededRandom(5);
    const measures = createLightMeasures();
    for (const sun of suns.slice(0, 4)) {
      const blocks = makeRandomTown(random, 10);
      const along = alongOf(sun);
      const layer = castShadowLayer(blocks, sun, 0);
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
      const layer = castShadowLayer(blocks, sun, 0);
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
        const area = makeLitArea([ring], []);
        const light = measures.light(area, layer);
        const [drawnNetNew = NaN] = overlapAreasM2(clipper, polygons.netNew, [area]);
        const [shadedBefore = NaN] = overlapAreasM2(clipper, polygons.before, [area]);
        const drawnBefore = 600 - shadedBefore;
        expect(Math.abs(drawnNetNew - light.netNewM2)).toBeLessThan(1e-3);
        expect(Math.abs(drawnBefore - light.sunBeforeM2)).toBeLessThan(1e-3);
        compared += 1;
      }
    }
    expect(compared).toBe(240);
  });
});
