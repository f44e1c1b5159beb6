/** x and y in metres on the local plane. */
export type PlanePoint = readonly [number, number];

/**
 * A closed line on the local plane, its first point not repeated at the end. Outer rings run
 * counter-clockwise and holes clockwise, so that the solid lies on the left of every edge.
 */
export type Ring = readonly PlanePoint[];

/** A box with sides along x and y, in metres. */
export interface Box {
  minX: number;
  minY: number;
  maxX: number;
  maxY: number;
}

/** Area enclosed by a ring in m²: positive when it runs counter-clockwise (shoelace formula). */
export function signedRingArea(ring: Ring): number {
  const origin = ring[0];
  if (origin === undefined) return 0;
  let doubled = 0;
  let previous = ring[ring.length - 1] ?? origin;
  for (const point of ring) {
    // Measured from the ring's own first point, so that a far origin costs no digits.
    doubled +=
      (previous[0] - origin[0]) * (point[1] - origin[1]) -
      (point[0] - origin[0]) * (previous[1] - origin[1]);
    previous = point;
  }
  return doubled / 2;
}

/** The ring turned so that it runs counter-clockwise (`outer`) or clockwise (`hole`). */
export function orientRing(ring: Ring, as: 'outer' | 'hole'): Ring {
  const isCounterClockwise = signedRingArea(ring) > 0;
  return isCounterClockwise === (as === 'outer') ? ring : [...ring].reverse();
}

/** The smallest box around all points of the rings; empty rings give a box that holds nothing. */
export function boxOfRings(rings: readonly Ring[]): Box {
  const box = { minX: Infinity, minY: Infinity, maxX: -Infinity, maxY: -Infinity };
  for (const ring of rings) {
    for (const [x, y] of ring) {
      if (x < box.minX) box.minX = x;
      if (x > box.maxX) box.maxX = x;
      if (y < box.minY) box.minY = y;
      if (y > box.maxY) box.maxY = y;
    }
  }
  return box;
}

/** Whether two boxes share more than a border. */
export function boxesOverlap(a: Box, b: Box): boolean {
  return a.minX < b.maxX && a.maxX > b.minX && a.minY < b.maxY && a.maxY > b.minY;
}

/** The box around both. */
export function joinBoxes(a: Box, b: Box): Box {
  return {
    minX: Math.min(a.minX, b.minX),
    minY: Math.min(a.minY, b.minY),
    maxX: Math.max(a.maxX, b.maxX),
    maxY: Math.max(a.maxY, b.maxY),
  };
}
