import type { Box, Ring } from './ring.ts';

/** A ring within an array of points: the index of its first coordinate, and that after its last. */
export interface RingRange {
  start: number;
  end: number;
}

/** Rings with all their points in one array, x and y one after the other: quick to turn and to walk. */
export interface FlatRings {
  points: Float64Array;
  rings: readonly RingRange[];
}

/** The same rings as one array of points. */
export function flattenRings(rings: readonly Ring[]): FlatRings {
  const points = new Float64Array(rings.reduce((sum, ring) => sum + ring.length * 2, 0));
  let end = 0;
  const ranges = rings.map((ring) => {
    const start = end;
    for (const [x, y] of ring) {
      points[end] = x;
      points[end + 1] = y;
      end += 2;
    }
    return { start, end };
  });
  return { points, rings: ranges };
}

/**
 * The box around rings of an array of points; none give a box that holds nothing.
 *
 * @param count how many of the rings, from the first
 */
export function boxOfFlatRings(
  points: Float64Array,
  rings: readonly RingRange[],
  count = rings.length,
): Box {
  const box = { minX: Infinity, minY: Infinity, maxX: -Infinity, maxY: -Infinity };
  for (let ring = 0; ring < count; ring += 1) {
    const { start, end } = rings[ring] ?? { start: 0, end: 0 };
    for (let index = start; index < end; index += 2) {
      const x = points[index] ?? NaN;
      const y = points[index + 1] ?? NaN;
      if (x < box.minX) box.minX = x;
      if (x > box.maxX) box.maxX = x;
      if (y < box.minY) box.minY = y;
      if (y > box.maxY) box.maxY = y;
    }
  }
  return box;
}
