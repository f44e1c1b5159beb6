import type { Box } from '../geometry/ring.ts';
import { flattenBlocks, type FlatBlocks, type IndexedBlocks } from './shadow-layer.ts';
import { makeSunFrame, type SunDirection, type SunFrame } from './sun-frame.ts';

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
  { blocks, index, highestTopM }: IndexedBlocks,
  sun: SunDirection,
  within: Box,
  lowestPlaneM: number,
): FlatBlocks {
  const frame = makeSunFrame(sun);
  const reachM = Math.max(highestTopM - lowestPlaneM, 0) * frame.cotangent;
  const towardX = -frame.awayX * reachM;
  const towardY = -frame.awayY * reachM;
  const found = index?.search(
    within.minX + Math.min(towardX, 0),
    within.minY + Math.min(towardY, 0),
    within.maxX + Math.max(towardX, 0),
    within.maxY + Math.max(towardY, 0),
  );
  const wanted = turnedBox(within, frame);
  const standing = (found ?? [])
    .sort((a, b) => a - b)
    .flatMap((at) => blocks[at]?.block ?? [])
    .filter((block) => {
      const shadow = turnedBox(block.box, frame);
      const farM = (block.topM - lowestPlaneM) * frame.cotangent;
      return (
        farM > 0 &&
        shadow.minY <= wanted.maxY &&
        shadow.maxY >= wanted.minY &&
        shadow.minX <= wanted.maxX &&
        shadow.maxX + farM >= wanted.minX
      );
    });
  return flattenBlocks(standing);
}

/** The box in a sun's frame around a box of the local plane. */
function turnedBox({ minX, minY, maxX, maxY }: Box, { awayX, awayY }: SunFrame): Box {
  const middleX = ((minX + maxX) * awayX + (minY + maxY) * awayY) / 2;
  const middleY = ((minY + maxY) * awayX - (minX + maxX) * awayY) / 2;
  const alongM = ((maxX - minX) * Math.abs(awayX) + (maxY - minY) * Math.abs(awayY)) / 2;
  const acrossM = ((maxY - minY) * Math.abs(awayX) + (maxX - minX) * Math.abs(awayY)) / 2;
  return {
    minX: middleX - alongM,
    minY: middleY - acrossM,
    maxX: middleX + alongM,
    maxY: middleY + acrossM,
  };
}
