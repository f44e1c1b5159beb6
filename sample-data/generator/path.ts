import {
  add,
  between,
  cross,
  distance,
  dot,
  leftOf,
  minus,
  nearestOnStretch,
  shapeOf,
  times,
  unit,
  type Point,
  type Shape,
} from './shape.ts';

/** A line through points, in order. */
export type Path = readonly Point[];

const stretchesOf = (path: Path): [Point, Point][] =>
  path.slice(1).map((end, index) => [path[index] ?? end, end]);

export const pathLength = (path: Path): number =>
  stretchesOf(path).reduce((sum, [a, b]) => sum + distance(a, b), 0);

/** A smooth line through the points: a uniform Catmull-Rom curve, `steps` stretches from point to point. */
export function smooth(points: Path, steps: number): Path {
  const at = (index: number): Point => {
    const last = points.length - 1;
    const inRange = points[Math.min(last, Math.max(0, index))] ?? [0, 0];
    return inRange;
  };
  const line: Point[] = [];
  for (let index = 0; index < points.length - 1; index++) {
    const [before, from, to, after] = [at(index - 1), at(index), at(index + 1), at(index + 2)];
    for (let step = 0; step < steps; step++) {
      const t = step / steps;
      const blend = (axis: 0 | 1): number =>
        0.5 *
        (2 * from[axis] +
          (to[axis] - before[axis]) * t +
          (2 * before[axis] - 5 * from[axis] + 4 * to[axis] - after[axis]) * t ** 2 +
          (3 * from[axis] - before[axis] - 3 * to[axis] + after[axis]) * t ** 3);
      line.push([blend(0), blend(1)]);
    }
  }
  line.push(at(points.length - 1));
  return line;
}

/** The point and the direction at a distance along the path; beyond its ends the path goes on straight. */
export function placeAlong(path: Path, atM: number): { point: Point; direction: Point } {
  let rest = atM;
  const stretches = stretchesOf(path);
  for (const [index, [a, b]] of stretches.entries()) {
    const length = distance(a, b);
    if (rest <= length || index === stretches.length - 1) {
      const direction = unit(minus(b, a));
      return { point: add(a, times(direction, rest)), direction };
    }
    rest -= length;
  }
  throw new Error('A path needs at least two points.');
}

/** The direction at a distance along the path, evened out over `overM` metres. */
export function evenDirection(path: Path, atM: number, overM: number): Point {
  const length = pathLength(path);
  const from = placeAlong(path, Math.max(0, atM - overM / 2)).point;
  const to = placeAlong(path, Math.min(length, atM + overM / 2)).point;
  return unit(minus(to, from));
}

/** Where a point lies by a path: how far along, and how far off. */
export function nearestOnPath(
  point: Point,
  path: Path,
): { alongM: number; gapM: number; isLeft: boolean } {
  let best = { alongM: 0, gapM: Infinity, isLeft: false };
  let done = 0;
  for (const [a, b] of stretchesOf(path)) {
    const { gapM, at } = nearestOnStretch(point, a, b);
    const length = distance(a, b);
    if (gapM < best.gapM) {
      best = { alongM: done + at * length, gapM, isLeft: cross(minus(b, a), minus(point, a)) > 0 };
    }
    done += length;
  }
  return best;
}

/** The path moved to its left by `byM` metres (to its right where negative), with mitred corners. */
export function offsetPath(path: Path, byM: number): Path {
  return path.map((point, index) => {
    const before = path[index - 1];
    const after = path[index + 1];
    const arriving = before ? unit(minus(point, before)) : unit(minus(after ?? point, point));
    const leaving = after ? unit(minus(after, point)) : arriving;
    const normal = unit(add(leftOf(arriving), leftOf(leaving)));
    // At a mitre the move along the middle normal is longer than the offset itself.
    return add(point, times(normal, byM / Math.max(0.5, dot(normal, leftOf(arriving)))));
  });
}

/** The strip of ground within `halfWidthM` of a path. */
export const stripOf = (path: Path, halfWidthM: number): Shape =>
  shapeOf([...offsetPath(path, -halfWidthM), ...[...offsetPath(path, halfWidthM)].reverse()]);

/** The path made longer at both ends, straight on in the direction that it has over its last metres. */
export function extended(path: Path, byM: number): Path {
  const length = pathLength(path);
  const start = placeAlong(path, 0).point;
  const end = placeAlong(path, length).point;
  return [
    add(start, times(evenDirection(path, 0, 16), -byM)),
    ...path,
    add(end, times(evenDirection(path, length, 16), byM)),
  ];
}

/** `count` points evenly spaced along the path, both ends included. */
const evenPoints = (path: Path, count: number): Path =>
  Array.from(
    { length: count },
    (_, index) => placeAlong(path, (pathLength(path) * index) / (count - 1)).point,
  );

/** The line half-way between two paths that run the same way. */
export function midPath(a: Path, b: Path, count: number): Path {
  const other = evenPoints(b, count);
  return evenPoints(a, count).map((point, index) => between(point, other[index] ?? point, 0.5));
}
