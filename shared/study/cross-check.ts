import type { Clipper } from '../shadow/clipper.ts';
import { overlapAreaM2, type ShadowPolygons } from '../shadow/shadow-polygons.ts';
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
  for (const receptor of scene.receptors) {
    if (receptor.planeM !== 0) continue;
    const { netNewM2 } = instant.lightOn(receptor, 0);
    if (netNewM2 < leastNetNewM2) continue;
    const drawnM2 = overlapAreaM2(clipper, polygons.netNew, receptor.area.rings);
    const differenceM2 = roundMeasure(Math.abs(drawnM2 - netNewM2));
    if (differenceM2 > check.largestDifferenceM2) {
      Object.assign(check, { largestDifferenceM2: differenceM2, at, receptor: receptor.id });
    }
  }
}
