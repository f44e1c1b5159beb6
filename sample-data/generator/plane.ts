import { createLocalPlane } from '../../shared/geometry/local-plane.ts';
import type { Point, Ring, Shape } from './shape.ts';

/** Where Larkhaven would lie, in degrees on WGS 84. */
export const place = { longitude: -91.3, latitude: 46.75 } as const;

const plane = createLocalPlane(place.longitude, place.latitude);

/** Seven decimals of a degree: about a centimetre. */
const rounded = (degrees: number): number => Math.round(degrees * 1e7) / 1e7;

export function toLngLat(point: Point): [number, number] {
  const [longitude, latitude] = plane.toLngLat(point);
  return [rounded(longitude), rounded(latitude)];
}

/** A closed ring as RFC 7946 wants it. */
export function toClosedRing(ring: Ring): [number, number][] {
  const corners = ring.map(toLngLat);
  const first = corners[0];
  return first ? [...corners, first] : [];
}

export const toPolygonCoordinates = (shape: Shape): [number, number][][] =>
  [shape.outer, ...shape.holes].map(toClosedRing);
