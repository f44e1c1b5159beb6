import type { MultiPolygon, Position } from 'geojson';
import { beforeAll, describe, expect, it } from 'vitest';
import { loadClipper } from '../../../api/clipper.ts';
import { makePolygonsValid } from '../../../api/valid-polygons.ts';
import { createLocalPlane } from '../../../shared/geometry/local-plane.ts';
import { blocksTowardSun } from '../../../shared/shadow/blocks-toward-sun.ts';
import type { Clipper } from '../../../shared/shadow/clipper.ts';
import { createLightMeasures, makeLitArea } from '../../../shared/shadow/receptor-light.ts';
import {
  castShadowLayer,
  createShadowCaster,
  indexBlocks,
  type SceneBlock,
} from '../../../shared/shadow/shadow-layer.ts';
import { drawShadowPolygons, overlapAreasM2 } from '../../../shared/shadow/shadow-polygons.ts';
import { hardScenes, hardSuns, moveScene } from '../../support/hard-scenes.ts';
import { makeRandomTown, makeRectangle } from '../../support/plane-scenes.ts';
import {
  loadSecondOpinion,
  multiPolygonOf,
  type SecondOpinion,
} from '../../support/second-opinion.ts';
import { createSeededRandom } from '../../support/seeded-random.ts';
import { alongOf, isShadedByRay, shadowByQuads } from './independent-shadow.ts';

let clipper: Clipper;
let geos: SecondOpinion;
beforeAll(async () => {
  clipper = await loadClipper();
  geos = await loadSecondOpinion();
});

const measures = createLightMeasures();
const plane = createLocalPlane(-91.3, 46.75);

/** Receptors that lie along walls, across them, in a courtyard, with a hole, and far round all. */
const receptors = [
  makeLitArea([makeRectangle(0, 0, 20, 20)], []),
  makeLitArea([makeRectangle(-30, -35, 70, 50, 12)], []),
  makeLitArea([makeRectangle(7, 11, 10, 40)], []),
  makeLitArea(
    [makeRectangle(-60, -60, 130, 130), makeRectangle(-3, -3, 40, 7).toReversed()],
    [makeRectangle(10, -80, 30, 60)],
  ),
  makeLitArea(
    [
      [
        [-10, 8],
        [40, -20],
        [25, 9],
        [55, 44],
        [12, 18],
      ],
    ],
    [],
  ),
];

function shadowsOf(blocks: readonly SceneBlock[], sun: (typeof hardSuns)[number]): MultiPolygon {
  const along = alongOf(sun);
  return geos.union(blocks.map((block) => shadowByQuads(geos, block, along)));
}

describe.each(Object.entries(hardScenes))('the shadow of %s', (_name, blocks) => {
  it('has the area that GEOS finds for the union of all its walls, under every sun', () => {
    for (const sun of hardSuns.filter(({ altitudeDeg }) => altitudeDeg >= 3)) {
      const layer = castShadowLayer(blocks, sun, 0);
      const shade = shadowsOf(
        blocks.filter(({ role }) => role !== 'existing'),
        sun,
      );
      for (const area of receptors) {
        const open = geos.difference(
          multiPolygonOf(area.rings),
          multiPolygonOf(...area.siteRings.map((ring) => [ring])),
        );
        const lit = geos.areaM2(geos.difference(open, shade));
        const { sunAfterM2 } = measures.light(area, layer);
        expect(
          Math.abs(sunAfterM2 - lit),
          `sun at ${sun.azimuthDeg}°, ${sun.altitudeDeg}° high`,
        ).toBeLessThan(1e-6);
      }
    }
  });

  it('is drawn by polygons that hold the same areas to a thousandth of a square metre', () => {
    for (const sun of hardSuns) {
      const layer = castShadowLayer(blocks, sun, 0);
      const drawn = drawShadowPolygons(clipper, layer);
      const shadedM2 = {
        before: overlapAreasM2(clipper, drawn.before, receptors),
        after: overlapAreasM2(clipper, drawn.after, receptors),
        netNew: overlapAreasM2(clipper, drawn.netNew, receptors),
      };
      receptors.forEach((area, index) => {
        const openM2 = measures.openArea(area, []);
        const light = measures.light(area, layer);
        const where = `sun at ${sun.azimuthDeg}°, ${sun.altitudeDeg}° high, receptor ${index}`;
        const off = (expected: number, of: keyof typeof shadedM2) =>
          Math.abs(expected - (shadedM2[of][index] ?? NaN));
        expect(off(openM2 - light.sunBeforeM2, 'before'), where).toBeLessThan(2e-3);
        expect(off(openM2 - light.sunAfterM2, 'after'), where).toBeLessThan(2e-3);
        expect(off(light.netNewM2, 'netNew'), where).toBeLessThan(2e-3);
      });
    }
  });

  it('is handed out as polygons valid by OGC’s rules', async () => {
    for (const sun of hardSuns) {
      for (const published of await publish(blocks, sun)) {
        expect(geos.isValid(published), `${sun.azimuthDeg}° ${sun.altitudeDeg}°`).toBe(true);
      }
    }
  });

  it('is the same a thousand kilometres away', () => {
    for (const sun of hardSuns) {
      const near = castShadowLayer(blocks, sun, 0);
      const far = castShadowLayer(moveScene(blocks, 1e6, -1e6), sun, 0);
      const [area] = receptors;
      if (area === undefined) continue;
      const moved = makeLitArea(
        area.rings.map((ring) => ring.map(([x, y]): [number, number] => [x + 1e6, y - 1e6])),
        [],
      );
      // A coordinate of 1e6 m keeps 1e-10 m, and a shadow's border is up to 1e4 m long.
      expect(measures.light(moved, far).sunAfterM2).toBeCloseTo(
        measures.light(area, near).sunAfterM2,
        4,
      );
    }
  });
});

/** Before, after and net new as they leave the program. */
async function publish(
  blocks: readonly SceneBlock[],
  sun: (typeof hardSuns)[number],
): Promise<MultiPolygon[]> {
  const { before, after, netNew } = drawShadowPolygons(clipper, castShadowLayer(blocks, sun, 0));
  const round = (degrees: number) => Math.round(degrees * 1e8) / 1e8;
  return Promise.all(
    [before, after, netNew].map((polygons) =>
      makePolygonsValid({
        type: 'MultiPolygon',
        coordinates: polygons.map((rings) =>
          rings.map((ring) =>
            [...ring, ...ring.slice(0, 1)].map((point): Position =>
              plane.toLngLat(point).map(round),
            ),
          ),
        ),
      }),
    ),
  );
}

describe('the shadows of random towns', () => {
  const towns = Array.from({ length: 12 }, (_, seed) =>
    makeRandomTown(createSeededRandom(seed + 100), 60),
  );

  it('are handed out as polygons valid by OGC’s rules', async () => {
    for (const town of towns) {
      for (const sun of hardSuns) {
        for (const published of await publish(town, sun)) {
          expect(geos.isValid(published), `${sun.azimuthDeg}° ${sun.altitudeDeg}°`).toBe(true);
        }
      }
    }
  });

  it('have the areas that GEOS finds for the union of all walls, without any pruning', () => {
    for (const town of towns.slice(0, 3)) {
      for (const sun of [
        { azimuthDeg: 180, altitudeDeg: 3 },
        { azimuthDeg: 133.7, altitudeDeg: 11 },
        { azimuthDeg: 270, altitudeDeg: 45 },
      ]) {
        const layer = castShadowLayer(town, sun, 0);
        const before = shadowsOf(
          town.filter(({ role }) => role !== 'proposed'),
          sun,
        );
        for (const area of receptors.slice(0, 3)) {
          const lit = geos.areaM2(geos.difference(multiPolygonOf(area.rings), before));
          expect(Math.abs(measures.light(area, layer).sunBeforeM2 - lit)).toBeLessThan(1e-6);
        }
      }
    }
  });

  it('are the same when only the blocks toward the sun are looked at', () => {
    let leftOut = 0;
    for (const town of towns) {
      const blocks = indexBlocks(town);
      for (const sun of hardSuns) {
        for (const planeM of [0, 4, -1]) {
          const all = castShadowLayer(town, sun, planeM);
          for (const area of receptors) {
            const standing = blocksTowardSun(blocks, sun, area.box, planeM);
            leftOut += town.length - standing.blocks.length;
            const some = createShadowCaster(standing, sun)(planeM);
            const pruned = measures.light(area, some);
            const whole = measures.light(area, all);
            expect(Math.abs(pruned.sunBeforeM2 - whole.sunBeforeM2)).toBeLessThan(1e-9);
            expect(Math.abs(pruned.sunAfterM2 - whole.sunAfterM2)).toBeLessThan(1e-9);
            expect(Math.abs(pruned.netNewM2 - whole.netNewM2)).toBeLessThan(1e-9);
          }
        }
      }
    }
    expect(leftOut).toBeGreaterThan(10_000);
  });

  it('agree with rays shot from single points to the sun on every plane', () => {
    const random = createSeededRandom(11);
    const [town = []] = towns;
    for (const sun of hardSuns) {
      for (const planeM of [0, 5]) {
        const along = alongOf(sun);
        const layer = castShadowLayer(town, sun, planeM);
        // Cells so small that each is all in sun or all in shade, but for those on an edge.
        const cellM = 0.002;
        let edges = 0;
        for (let sample = 0; sample < 60; sample += 1) {
          const x = random() * 260 - 130;
          const y = random() * 260 - 130;
          const cell = makeLitArea([makeRectangle(x, y, cellM, cellM)], []);
          const litShare = measures.light(cell, layer).sunBeforeM2 / cellM ** 2;
          if (litShare > 0.001 && litShare < 0.999) {
            edges += 1;
            continue;
          }
          const middle = [x + cellM / 2, y + cellM / 2] as const;
          const isShaded = town.some(
            (block) => block.role !== 'proposed' && isShadedByRay(middle, planeM, block, along),
          );
          expect(litShare < 0.5, `${x}, ${y} with the sun at ${sun.azimuthDeg}°`).toBe(isShaded);
        }
        expect(edges).toBeLessThan(10);
      }
    }
  });
});
