import type { Clipper } from '../shadow/clipper.ts';
import { overlapAreasM2, type ShadowPolygons } from '../shadow/shadow-polygons.ts';
import type { StudyResults } from './evidence-schema.ts';
import type { InstantLight } from './instant-light.ts';
import { roundMeasure } from './rounding.ts';
import type { Scene } from './scene.ts';

export type CrossCheck = NonNullable<StudyResults['check']>;

/** Areas that change by less are not worth a second look, m². */
const leastNetNewM2 = 0.01;

/**
 * Measures the net new shadow on every ground receptor a second time, from the drawn polygons, and
 * keeps the largest difference from the sweep's figure in `check`.
 */
export function crossCheckReceptors(
  clipper: Clipper,
  scene: Scene,
  instant: InstantLight,
  at: string,
  polygons: ShadowPolygons,
  check: CrossCheck,
): void {
  const shaded = scene.receptors.filter(
    (receptor) =>
      receptor.front === null &&
      receptor.planeM === 0 &&
      instant.lightOn(receptor, 0).netNewM2 >= leastNetNewM2,
  );
  const drawnM2 = overlapAreasM2(
    clipper,
    polygons.netNew,
    shaded.map(({ area }) => area),
  );
  shaded.forEach((receptor, index) => {
    const { netNewM2 } = instant.lightOn(receptor, 0);
    const differenceM2 = roundMeasure(Math.abs((drawnM2[index] ?? NaN) - netNewM2));
    if (differenceM2 > check.largestDifferenceM2) {
      Object.assign(check, { largestDifferenceM2: differenceM2, at, receptor: receptor.id });
    }
  });
}
