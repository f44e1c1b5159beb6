import { beforeAll, describe, expect, it } from 'vitest';
import { loadClipper } from '../../../api/clipper.ts';
import { blocksTowardSun } from '../../../shared/shadow/blocks-toward-sun.ts';
import type { Clipper } from '../../../shared/shadow/clipper.ts';
import { createLightMeasures, makeLitArea } from '../../../shared/shadow/receptor-light.ts';
import {
  castShadowLayer,
  createShadowCaster,
  indexBlocks,
} from '../../../shared/shadow/shadow-layer.ts';
import { drawShadowPolygons, overlapAreasM2 } from '../../../shared/shadow/shadow-polygons.ts';
import { makeRandomTown, makeRectangle } from '../../support/plane-scenes.ts';
import {
  loadSecondOpinion,
  multiPolygonOf,
  type SecondOpinion,
} from '../../support/second-opinion.ts';
import { createSeededRandom } from '../../support/seeded-random.ts';
import { alongOf, shadowByQuads } from './independent-shadow.ts';

const towns = 2000;

let clipper: Clipper;
let geos: SecondOpinion;
beforeAll(async () => {
  clipper = await loadClipper();
  geos = await loadSecondOpinion();
});

describe('the shadows of towns drawn anew at every run', () => {
  it('have the areas of GEOS, of their drawn polygons, and of the blocks toward the sun alone', () => {
    const measures = createLightMeasures();
    const firstSeed = Math.floor(Math.random() * 1e9);
    let worstM2 = 0;
    for (let town = 0; town < towns; town += 1) {
      const seed = firstSeed + town;
      const random = createSeededRandom(seed);
      const blocks = makeRandomTown(random, 5 + Math.floor(random() * 60));
      const sun = {
        azimuthDeg: random() < 0.3 ? Math.floor(random() * 8) * 45 : random() * 360,
        altitudeDeg: random() < 0.3 ? 0.5 + random() * 4 : 5 + random() * 84,
      };
      const layer = castShadowLayer(blocks, sun, 0);
      const along = alongOf(sun);
      const area = makeLitArea(
        [
          makeRectangle(
            Math.round(random() * 200 - 150),
            Math.round(random() * 200 - 150),
            10 + random() * 120,
            10 + random() * 120,
            random() < 0.5 ? 0 : random() * 90,
          ),
        ],
        [],
      );
      const light = measures.light(area, layer);
      const where = `town ${seed}, sun at ${sun.azimuthDeg}°, ${sun.altitudeDeg}° high`;

      const shade = geos.union(
        blocks
          .filter(({ role }) => role !== 'proposed')
          .map((block) => shadowByQuads(geos, block, along)),
      );
      const litM2 = geos.areaM2(geos.difference(multiPolygonOf(area.rings), shade));
      worstM2 = Math.max(worstM2, Math.abs(light.sunBeforeM2 - litM2));
      expect(Math.abs(light.sunBeforeM2 - litM2), where).toBeLessThan(1e-6);

      const drawn = drawShadowPolygons(clipper, layer);
      const [netNewM2 = NaN] = overlapAreasM2(clipper, drawn.netNew, [area]);
      expect(Math.abs(light.netNewM2 - netNewM2), where).toBeLessThan(2e-3);

      const standing = blocksTowardSun(indexBlocks(blocks), sun, area.box, 0);
      const pruned = measures.light(area, createShadowCaster(standing, sun)(0));
      expect(Math.abs(pruned.sunAfterM2 - light.sunAfterM2), where).toBeLessThan(1e-9);
    }
    process.stdout.write(`${towns} towns from seed ${firstSeed}: at most ${worstM2} m² off GEOS\n`);
  });
});
