import type { Clipper } from '../shadow/clipper.ts';
import {
  overlapAreasM2,
  type PlanePolygons,
  type ShadowPolygons,
} from '../shadow/shadow-polygons.ts';
import type { StudyResults } from './evidence-schema.ts';
import type { InstantLight } from './instant-light.ts';
import { roundMeasure } from './rounding.ts';
import type { Scene, SceneReceptor } from './scene.ts';

export type CrossCheck = NonNullable<StudyResults['check']>;

/** Areas that change by less are not worth a second look, m². */
const leastNetNewM2 = 0.01;

/**
 * Measures a second time, from the drawn polygons, the net new shadow on every ground receptor, and
 * on the one that it takes most from the shadow before and after as well. The largest difference
 * from the sweep's figures stays in `check`.
 */
export function crossCheckReceptors(
  clipper: Clipper,
  scene: Scene,
  instant: InstantLight,
  at: string,
  polygons: ShadowPolygons,
  check: CrossCheck,
): void {
  const netNewM2 = (receptor: SceneReceptor) => instant.lightOn(receptor, 0).netNewM2;
  const shaded = scene.receptors.filter(
    (receptor) =>
      receptor.front === null && receptor.planeM === 0 && netNewM2(receptor) >= leastNetNewM2,
  );
  const compare = (
    drawn: PlanePolygons,
    receptors: readonly SceneReceptor[],
    expectedM2: (receptor: SceneReceptor) => number,
  ) => {
    const areas = receptors.map(({ area }) => area);
    overlapAreasM2(clipper, drawn, areas).forEach((drawnM2, index) => {
      const receptor = receptors[index];
      if (receptor === undefined) return;
      const differenceM2 = roundMeasure(Math.abs(drawnM2 - expectedM2(receptor)));
      if (differenceM2 > check.largestDifferenceM2) {
        Object.assign(check, { largestDifferenceM2: differenceM2, at, receptor: receptor.id });
      }
    });
  };
  const most = shaded.toSorted((a, b) => netNewM2(b) - netNewM2(a)).slice(0, 1);
  compare(polygons.netNew, shaded, netNewM2);
  compare(
    polygons.before,
    most,
    (receptor) => receptor.wholeAreaM2 - instant.lightOn(receptor, 0).sunBeforeM2,
  );
  compare(
    polygons.after,
    most,
    (receptor) => receptor.wholeAreaM2 - instant.lightOn(receptor, 0).sunAfterM2,
  );
}
