import type { RingRange } from '../geometry/flat-rings.ts';
import type { Box } from '../geometry/ring.ts';
import type { FlatBlocks, IndexedBlocks } from './shadow-layer.ts';
import { makeSunFrame, type SunDirection } from './sun-frame.ts';

/**
 * The blocks whose shadows can reach a part of the local plane, in their own order: those that
 * stand between it and the sun, no further off than their tops can throw. What is left out changes
 * no figure there, so that the cost of an instant hangs on the surroundings and not on the city.
 *
 * @param within the part, as a box in metres
 * @param lowestPlaneM the lowest plane that will be asked for, metres above the datum
 * @throws RangeError when the sun is not above the horizon
 */
export function blocksTowardSun(
  scene: IndexedBlocks,
  sun: SunDirection,
  within: Box,
  lowestPlaneM: number,
): FlatBlocks {
  const { awayX, awayY, cotangent } = makeSunFrame(sun);
  const reachM = Math.max(scene.highestTopM - lowestPlaneM, 0) * cotangent;
  const towardX = -awayX * reachM;
  const towardY = -awayY * reachM;
  const found =
    scene.index?.search(
      within.minX + Math.min(towardX, 0),
      within.minY + Math.min(towardY, 0),
      within.maxX + Math.max(towardX, 0),
      within.maxY + Math.max(towardY, 0),
    ) ?? [];
  // In the sun's frame: how far the middles lie apart, and how far the two boxes reach from theirs.
  const chosen = found.filter((at) => {
    const block = scene.blocks[at]?.block;
    if (block === undefined) return false;
    const farM = (block.topM - lowestPlaneM) * cotangent;
    if (farM <= 0) return false;
    const { minX, minY, maxX, maxY } = block.box;
    const eastM = (within.minX + within.maxX - minX - maxX) / 2;
    const northM = (within.minY + within.maxY - minY - maxY) / 2;
    const halfX = (within.maxX - within.minX + maxX - minX) / 2;
    const halfY = (within.maxY - within.minY + maxY - minY) / 2;
    const acrossM = Math.abs(northM * awayX - eastM * awayY);
    if (acrossM > halfY * Math.abs(awayX) + halfX * Math.abs(awayY)) return false;
    const alongM = eastM * awayX + northM * awayY;
    const reachesM = halfX * Math.abs(awayX) + halfY * Math.abs(awayY);
    return alongM >= -reachesM && alongM <= reachesM + farM;
  });
  return pickBlocks(
    scene,
    chosen.sort((a, b) => a - b),
  );
}

function pickBlocks({ points, blocks }: FlatBlocks, chosen: readonly number[]): FlatBlocks {
  let length = 0;
  const picked = chosen.flatMap((at) => {
    const one = blocks[at];
    if (one === undefined) return [];
    const rings = one.rings.map(({ start, end }): RingRange & { from: number } => {
      const placed = { from: start, start: length, end: length + end - start };
      length = placed.end;
      return placed;
    });
    return [{ block: one.block, rings }];
  });
  const pickedPoints = new Float64Array(length);
  for (const { rings } of picked) {
    for (const { from, start, end } of rings) {
      for (let index = start; index < end; index += 1) {
        pickedPoints[index] = points[from + index - start] ?? NaN;
      }
    }
  }
  return { points: pickedPoints, blocks: picked };
}
