import { difference, intersection, union, type Geom } from 'polyclip-ts';
import { areaOf, clockwise, counterClockwise, type Point, type Ring, type Shape } from './shape.ts';

/** Slivers below this area are dropped, in m². */
const SLIVER_M2 = 0.5;

const toMillimetre = (value: number): number => Math.round(value * 1000) / 1000;

/** To whole millimetres, so that the same corner computed in two ways is the same corner. */
const snap = (point: Point): Point => [toMillimetre(point[0]), toMillimetre(point[1])];

const closed = (ring: Ring): [number, number][] => {
  const corners = ring.map((corner): [number, number] => [...snap(corner)]);
  const first = corners[0];
  return first ? [...corners, [...first]] : [];
};

const toGeom = (shapes: readonly Shape[]): Geom =>
  shapes.map((shape) => [closed(shape.outer), ...shape.holes.map(closed)]);

const open = (ring: readonly (readonly [number, number])[]): Ring => ring.slice(0, -1).map(snap);

const fromGeom = (polygons: ReturnType<typeof union>): Shape[] =>
  polygons
    .map(([outer = [], ...holes]) => ({
      outer: counterClockwise(open(outer)),
      holes: holes.map((hole) => clockwise(open(hole))),
    }))
    .filter((shape) => areaOf(shape) > SLIVER_M2)
    .sort((a, b) => areaOf(b) - areaOf(a));

/** The pieces of a shape that lie in any of the others, largest first. */
export const common = (shape: Shape, others: readonly Shape[]): Shape[] =>
  fromGeom(intersection(toGeom([shape]), toGeom(others)));

/** The pieces of a shape that lie in none of the others, largest first. */
export const without = (shape: Shape, others: readonly Shape[]): Shape[] =>
  others.length === 0 ? [shape] : fromGeom(difference(toGeom([shape]), toGeom(others)));

/** Shapes joined, largest piece first. */
export const joined = (shapes: readonly Shape[]): Shape[] =>
  shapes.length === 0 ? [] : fromGeom(union(toGeom(shapes.slice(0, 1)), toGeom(shapes.slice(1))));
