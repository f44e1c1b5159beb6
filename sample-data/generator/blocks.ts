import { common, joined, without } from './overlay.ts';
import { streets } from './plan-streets.ts';
import { creek, promenade, sheetShape, townGround } from './plan-water.ts';
import {
  add,
  dot,
  minus,
  shapeOf,
  tidied,
  times,
  unit,
  distance,
  type Point,
  type Ring,
  type Shape,
} from './shape.ts';

export interface StreetSurface {
  name: string;
  pieces: Shape[];
}

/** The surface of each street; where two cross, the ground belongs to the one that is drawn first. */
export function paveStreets(): StreetSurface[] {
  let paved: Shape[] = [];
  return streets.map(({ name, strip }) => {
    const [onSheet] = common(strip, [sheetShape]);
    const pieces = onSheet ? without(onSheet, paved) : [];
    paved = joined([...paved, ...pieces]);
    return { name, pieces };
  });
}

/** Cuts the corners of a block where two streets meet, as a city does for the view of drivers. */
function cutCorners(ring: Ring, legM: number): Ring {
  return ring.flatMap((corner, index): Point[] => {
    const before = ring[(index + ring.length - 1) % ring.length] ?? corner;
    const after = ring[(index + 1) % ring.length] ?? corner;
    const toBefore = unit(minus(before, corner));
    const toAfter = unit(minus(after, corner));
    const isSharp = dot(toBefore, toAfter) > -0.64;
    const isRoomy = Math.min(distance(before, corner), distance(after, corner)) > 2.2 * legM;
    return isSharp && isRoomy
      ? [add(corner, times(toBefore, legM)), add(corner, times(toAfter, legM))]
      : [corner];
  });
}

/** The blocks of town ground between the streets, the creek, the promenade and the shore. */
export function findBlocks(): Shape[] {
  const strips = streets.map(({ strip }) => strip);
  return without(townGround, [...strips, creek, promenade]).flatMap((block) => {
    // A dropped corner must not push the block out over a street.
    const neat = shapeOf(cutCorners(tidied(block.outer, 1.2, 0.02), 3));
    return common(neat, [block]).slice(0, 1);
  });
}
