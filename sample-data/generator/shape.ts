/** Metres in the local plane: x east, y true north. */
export type Point = readonly [number, number];

/** Corners in order, the first not repeated; outer rings counter-clockwise, holes clockwise. */
export type Ring = readonly Point[];

export interface Shape {
  outer: Ring;
  holes: readonly Ring[];
}

export const add = (a: Point, b: Point): Point => [a[0] + b[0], a[1] + b[1]];
export const minus = (a: Point, b: Point): Point => [a[0] - b[0], a[1] - b[1]];
export const times = (a: Point, factor: number): Point => [a[0] * factor, a[1] * factor];
export const dot = (a: Point, b: Point): number => a[0] * b[0] + a[1] * b[1];
export const cross = (a: Point, b: Point): number => a[0] * b[1] - a[1] * b[0];
const lengthOf = (a: Point): number => Math.hypot(a[0], a[1]);
export const distance = (a: Point, b: Point): number => lengthOf(minus(a, b));
/** A quarter turn counter-clockwise. */
export const leftOf = (a: Point): Point => [-a[1], a[0]];
export const between = (a: Point, b: Point, share: number): Point => [
  a[0] + (b[0] - a[0]) * share,
  a[1] + (b[1] - a[1]) * share,
];

export function unit(a: Point): Point {
  const length = lengthOf(a);
  return length === 0 ? [1, 0] : times(a, 1 / length);
}

/** Each side of a ring as a pair of corners, the closing side included. */
export function sidesOf(ring: Ring): [Point, Point][] {
  return ring.map((corner, index) => [corner, ring[(index + 1) % ring.length] ?? corner]);
}

/** Positive where the ring runs counter-clockwise, in m². */
function signedAreaOf(ring: Ring): number {
  return sidesOf(ring).reduce((sum, [a, b]) => sum + cross(a, b), 0) / 2;
}

export function areaOf(shape: Shape): number {
  return [shape.outer, ...shape.holes].reduce((sum, ring) => sum + signedAreaOf(ring), 0);
}

export const counterClockwise = (ring: Ring): Ring =>
  signedAreaOf(ring) < 0 ? [...ring].reverse() : ring;
export const clockwise = (ring: Ring): Ring =>
  signedAreaOf(ring) > 0 ? [...ring].reverse() : ring;

/** A shape without holes, turned the right way round. */
export const shapeOf = (outer: Ring): Shape => ({ outer: counterClockwise(outer), holes: [] });

/** The middle of the area within the outer ring. */
export function centroidOf(shape: Shape): Point {
  let x = 0;
  let y = 0;
  let area = 0;
  for (const [a, b] of sidesOf(shape.outer)) {
    const part = cross(a, b);
    x += (a[0] + b[0]) * part;
    y += (a[1] + b[1]) * part;
    area += part;
  }
  return [x / (3 * area), y / (3 * area)];
}

function isInRing(point: Point, ring: Ring): boolean {
  let inside = false;
  for (const [a, b] of sidesOf(ring)) {
    const crosses = a[1] > point[1] !== b[1] > point[1];
    if (crosses && point[0] < a[0] + ((point[1] - a[1]) / (b[1] - a[1])) * (b[0] - a[0])) {
      inside = !inside;
    }
  }
  return inside;
}

export const isInside = (point: Point, shape: Shape): boolean =>
  isInRing(point, shape.outer) && !shape.holes.some((hole) => isInRing(point, hole));

/** The distance from a point to a stretch, and where along the stretch (0 to 1) it is least. */
export function nearestOnStretch(point: Point, a: Point, b: Point): { gapM: number; at: number } {
  const along = minus(b, a);
  const squared = dot(along, along);
  const at = squared === 0 ? 0 : Math.min(1, Math.max(0, dot(minus(point, a), along) / squared));
  return { gapM: distance(point, between(a, b, at)), at };
}

/** The least distance from a point to the border of a shape, in metres. */
function gapToBorder(point: Point, shape: Shape): number {
  return Math.min(
    ...[shape.outer, ...shape.holes].flatMap((ring) =>
      sidesOf(ring).map(([a, b]) => nearestOnStretch(point, a, b).gapM),
    ),
  );
}

/** All corners of `inner` lie in `outer`, at least `clearM` from its border, and no corner of it pokes in. */
export function fitsInside(inner: Shape, outer: Shape, clearM: number): boolean {
  return (
    inner.outer.every(
      (corner) => isInside(corner, outer) && gapToBorder(corner, outer) >= clearM,
    ) && outer.outer.every((corner) => !isInside(corner, inner))
  );
}

/** A convex shape made larger by `byM` on every side (smaller where negative), its corners mitred. */
export function grown(shape: Shape, byM: number): Shape {
  const ring = shape.outer;
  return shapeOf(
    ring.map((corner, index): Point => {
      const before = ring[(index + ring.length - 1) % ring.length] ?? corner;
      const after = ring[(index + 1) % ring.length] ?? corner;
      const outOfFirst = times(leftOf(unit(minus(corner, before))), -1);
      const outOfSecond = times(leftOf(unit(minus(after, corner))), -1);
      const middle = unit(add(outOfFirst, outOfSecond));
      return add(corner, times(middle, byM / dot(middle, outOfFirst)));
    }),
  );
}

/** Drops corners that stand closer than `leastM` to the one before, and corners less than `offM` off a straight side. */
export function tidied(ring: Ring, leastM: number, offM: number): Ring {
  const spaced = ring.filter((corner, index) => {
    const before = ring[(index + ring.length - 1) % ring.length] ?? corner;
    return distance(before, corner) > leastM;
  });
  return spaced.filter((corner, index) => {
    const before = spaced[(index + spaced.length - 1) % spaced.length] ?? corner;
    const after = spaced[(index + 1) % spaced.length] ?? corner;
    return nearestOnStretch(corner, before, after).gapM > offM;
  });
}
