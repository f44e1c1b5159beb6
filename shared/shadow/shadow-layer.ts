import Flatbush from 'flatbush';
import { boxesOverlap, type Box, type Ring } from '../geometry/ring.ts';
import type { PlaneBlock } from './plane-block.ts';
import { contoursAlong, shadowBox, type ShadowVector } from './shadow-contours.ts';

/** What a block does to the light: it stands before and after, before only, or after only. */
export type ShadowRole = 'context' | 'existing' | 'proposed';

/** A block of a scene, with the state in which it stands. */
export interface SceneBlock extends PlaneBlock {
  role: ShadowRole;
}

/** One block's shadow on the layer's plane. */
export interface BlockShadow {
  role: ShadowRole;
  contours: readonly Ring[];
  box: Box;
}

/** All shadows on one horizontal plane at one instant, with a way to find those near a place. */
export interface ShadowLayer {
  shadows: readonly BlockShadow[];
  near: (box: Box) => readonly BlockShadow[];
}

/**
 * The shadows of a scene on one plane at one instant, indexed by an R-tree (flatbush).
 *
 * @param within only shadows that reach this box are wanted; all when absent
 */
export function castShadowLayer(
  blocks: readonly SceneBlock[],
  along: ShadowVector,
  planeM: number,
  within?: Box,
): ShadowLayer {
  const shadows: BlockShadow[] = [];
  for (const block of blocks) {
    const box = shadowBox(block, along, planeM);
    if (box === null || (within !== undefined && !boxesOverlap(box, within))) continue;
    shadows.push({ role: block.role, contours: contoursAlong(block, along, planeM), box });
  }
  if (shadows.length === 0) return { shadows, near: () => [] };
  const index = new Flatbush(shadows.length);
  for (const { box } of shadows) index.add(box.minX, box.minY, box.maxX, box.maxY);
  index.finish();
  return {
    shadows,
    near: (box) =>
      index.search(box.minX, box.minY, box.maxX, box.maxY).flatMap((at) => shadows[at] ?? []),
  };
}
