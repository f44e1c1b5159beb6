import Flatbush from 'flatbush';
import { boxOfFlatRings, flattenRings, type RingRange } from '../geometry/flat-rings.ts';
import type { Box } from '../geometry/ring.ts';
import type { PlaneBlock } from './plane-block.ts';
import { shadowReach } from './shadow-contours.ts';
import { makeSunFrame, turnIntoFrame, type SunDirection, type SunFrame } from './sun-frame.ts';

/** What a block does to the light: it stands before and after, before only, or after only. */
export type ShadowRole = 'context' | 'existing' | 'proposed';

/** A block of a scene, with the state in which it stands. */
export interface SceneBlock extends PlaneBlock {
  role: ShadowRole;
}

/** One block's shadow on the layer's plane, in the sun's frame. */
export interface BlockShadow {
  role: ShadowRole;
  /** The footprint's rings in the layer's points: edges that run up move by `farShiftM`, the others by `nearShiftM`. */
  rings: readonly RingRange[];
  /** How far the shadow of the block's base lies from it along x, in metres. */
  nearShiftM: number;
  /** The same of its top. */
  farShiftM: number;
  box: Box;
}

/** All shadows on one horizontal plane at one instant, with a way to find those near a place. */
export interface ShadowLayer {
  frame: SunFrame;
  /** The footprints' points in the sun's frame, x and y one after the other. */
  points: Float64Array;
  shadows: readonly BlockShadow[];
  /** The indices in `shadows` of those whose boxes meet a box of the sun's frame. */
  near: (box: Box) => readonly number[];
}

/** Blocks with the points of all their rings in one array. */
export interface FlatBlocks {
  points: Float64Array;
  blocks: readonly { block: SceneBlock; rings: readonly RingRange[] }[];
}

/** The blocks of a scene with an index of where they stand. */
export interface IndexedBlocks extends FlatBlocks {
  /** The boxes of their footprints on the local plane; null where there are none. */
  index: Flatbush | null;
  highestTopM: number;
}

/** Flattens and indexes the blocks of a scene, once for all its instants. */
export function indexBlocks(blocks: readonly SceneBlock[]): IndexedBlocks {
  return {
    ...flattenBlocks(blocks),
    index: indexBoxes(blocks),
    highestTopM: blocks.reduce((highest, { topM }) => Math.max(highest, topM), -Infinity),
  };
}

/** The same blocks with all their points in one array. */
export function flattenBlocks(blocks: readonly SceneBlock[]): FlatBlocks {
  const { points, rings } = flattenRings(blocks.flatMap((block) => block.rings));
  let end = 0;
  return {
    points,
    blocks: blocks.map((block) => {
      const start = end;
      end += block.rings.length;
      return { block, rings: rings.slice(start, end) };
    }),
  };
}

/** The shadows of blocks on one plane at one instant; see `createShadowCaster`. */
export function castShadowLayer(
  blocks: readonly SceneBlock[],
  sun: SunDirection,
  planeM: number,
): ShadowLayer {
  return createShadowCaster(flattenBlocks(blocks), sun)(planeM);
}

/**
 * Turns blocks into a sun's frame once, so that the shadows on each plane are quick to cast. Those
 * of one plane are indexed by an R-tree (flatbush).
 *
 * @throws RangeError when the sun is not above the horizon
 */
export function createShadowCaster(
  { points: planePoints, blocks }: FlatBlocks,
  sun: SunDirection,
): (planeM: number) => ShadowLayer {
  const frame = makeSunFrame(sun);
  const points = turnIntoFrame(planePoints, frame);
  return (planeM) => {
    const shadows: BlockShadow[] = [];
    for (const { block, rings } of blocks) {
      const reach = shadowReach(block, planeM);
      if (reach === null) continue;
      const nearShiftM = reach.nearM * frame.cotangent;
      const farShiftM = reach.farM * frame.cotangent;
      const box = boxOfFlatRings(points, rings);
      box.minX += nearShiftM;
      box.maxX += farShiftM;
      shadows.push({ role: block.role, rings, nearShiftM, farShiftM, box });
    }
    const index = indexBoxes(shadows);
    return {
      frame,
      points,
      shadows,
      near: ({ minX, minY, maxX, maxY }) => index?.search(minX, minY, maxX, maxY) ?? [],
    };
  };
}

function indexBoxes(boxed: readonly { box: Box }[]): Flatbush | null {
  if (boxed.length === 0) return null;
  const index = new Flatbush(boxed.length);
  for (const { box } of boxed) index.add(box.minX, box.minY, box.maxX, box.maxY);
  index.finish();
  return index;
}
