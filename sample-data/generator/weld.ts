import {
  add,
  distance,
  nearestOnStretch,
  sidesOf,
  times,
  minus,
  type Point,
  type Ring,
  type Shape,
} from './shape.ts';

/** Corners nearer than this are one corner. */
const REACH_M = 0.03;
const CELL_M = 2;

const cellOf = (x: number, y: number): string =>
  `${Math.floor(x / CELL_M)},${Math.floor(y / CELL_M)}`;

/**
 * Makes neighbours share their borders exactly: corners that all but coincide become one, and a corner
 * that lies on another's side becomes a corner of that one too. Rounding to degrees then moves both alike,
 * and neither a gap nor an overlap opens between them.
 */
export function weld(shapes: readonly Shape[]): Shape[] {
  const cells = new Map<string, Point[]>();
  const near = (point: Point): Point[] =>
    [-1, 0, 1].flatMap((dx) =>
      [-1, 0, 1].flatMap(
        (dy) => cells.get(cellOf(point[0] + dx * CELL_M, point[1] + dy * CELL_M)) ?? [],
      ),
    );
  const findCorner = (point: Point): Point => {
    const known = near(point).find((other) => distance(point, other) < REACH_M);
    if (known) return known;
    const key = cellOf(...point);
    cells.set(key, [...(cells.get(key) ?? []), point]);
    return point;
  };

  const cornersOnSide = (a: Point, b: Point): Point[] => {
    const steps = Math.ceil(distance(a, b) / CELL_M);
    const found = new Set<Point>();
    for (let step = 0; step <= steps; step++) {
      for (const corner of near(add(a, times(minus(b, a), step / Math.max(1, steps))))) {
        if (corner !== a && corner !== b && nearestOnStretch(corner, a, b).gapM < REACH_M) {
          found.add(corner);
        }
      }
    }
    return [...found].sort((one, other) => distance(a, one) - distance(a, other));
  };

  const merged = shapes.map((shape) =>
    [shape.outer, ...shape.holes].map((ring) =>
      ring.map(findCorner).filter((corner, index, all) => corner !== all[(index + 1) % all.length]),
    ),
  );
  const noded = (ring: Ring): Ring =>
    sidesOf(ring).flatMap(([a, b]) => [a, ...cornersOnSide(a, b)]);
  return merged.map(([outer = [], ...holes]) => ({
    outer: noded(outer),
    holes: holes.map(noded),
  }));
}
