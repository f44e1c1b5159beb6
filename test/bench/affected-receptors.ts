import { boxOfFlatRings } from '../../shared/geometry/flat-rings.ts';
import { boxesOverlap, joinBoxes, type Box } from '../../shared/geometry/ring.ts';
import type { ShadowLayer } from '../../shared/shadow/shadow-layer.ts';
import { turnIntoFrame } from '../../shared/shadow/sun-frame.ts';
import type { Scene, SceneReceptor } from '../../shared/study/scene.ts';

/** A receptor that the proposal's or the existing building's shadow can reach, and what else can shade it. */
export interface AffectedReceptor {
  receptor: SceneReceptor;
  /** Indices into the layer's shadows. */
  shadows: readonly number[];
}

/** The receptors on which before and after can differ at one sun. */
export function affectedReceptors({ receptors }: Scene, layer: ShadowLayer): AffectedReceptor[] {
  const changing = layer.shadows.filter(({ role }) => role !== 'context');
  return receptors.flatMap((receptor) => {
    const { points, rings } = receptor.area.flat;
    const box = boxOfFlatRings(turnIntoFrame(points, layer.frame), rings);
    if (!changing.some((shadow) => boxesOverlap(shadow.box, box))) return [];
    return [{ receptor, shadows: layer.near(box) }];
  });
}

/** The box on the local plane around all of them. */
export function boxOfReceptors(affected: readonly AffectedReceptor[]): Box {
  return affected
    .map(({ receptor }) => receptor.area.box)
    .reduce(joinBoxes, { minX: Infinity, minY: Infinity, maxX: -Infinity, maxY: -Infinity });
}
