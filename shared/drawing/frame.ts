import type { Polygonal } from '../geometry/geojson-schema.ts';
import type { LocalPlane } from '../geometry/local-plane.ts';
import { projectPolygon } from '../geometry/project-polygon.ts';

/** x to the right and y downward, in px or points. */
export type SheetPoint = readonly [number, number];
/** Closed; its first point isn't repeated. */
export type SheetRing = readonly SheetPoint[];

/** A rectangle of ground on the local plane, in metres. */
export interface PlaneExtent {
  westM: number;
  southM: number;
  eastM: number;
  northM: number;
}

/** A map's frame: ground drawn to scale on a sheet, true north upward. */
export interface Frame {
  width: number;
  height: number;
  /** px (or points) of the sheet to a metre of ground. */
  pxPerM: number;
  toSheet: (xy: SheetPoint) => SheetPoint;
  /** The rings of a polygon on the sheet, cut off at the frame; for filling by the even-odd rule. */
  cutRings: (geometry: Polygonal) => SheetRing[];
}

/**
 * The smallest extent on a local plane that holds a box of longitude and latitude.
 *
 * @param extent west, south, east, north in degrees
 */
export function extentOnPlane(
  extent: readonly [number, number, number, number],
  plane: LocalPlane,
): PlaneExtent {
  const [west, south, east, north] = extent;
  const corners = [
    [west, south] as const,
    [east, south] as const,
    [east, north] as const,
    [west, north] as const,
  ].map((corner) => plane.toPlane(corner));
  return {
    westM: Math.min(...corners.map(([x]) => x)),
    southM: Math.min(...corners.map(([, y]) => y)),
    eastM: Math.max(...corners.map(([x]) => x)),
    northM: Math.max(...corners.map(([, y]) => y)),
  };
}

/** A frame of a given width; its height follows from the extent, so that both directions have one scale. */
export function createFrame(plane: LocalPlane, extent: PlaneExtent, width: number): Frame {
  const pxPerM = width / (extent.eastM - extent.westM);
  const height = (extent.northM - extent.southM) * pxPerM;
  const toSheet = ([x, y]: SheetPoint): SheetPoint => [
    (x - extent.westM) * pxPerM,
    (extent.northM - y) * pxPerM,
  ];
  return {
    width,
    height,
    pxPerM,
    toSheet,
    cutRings: (geometry) =>
      projectPolygon(geometry, plane)
        .map((ring) => cutRing(ring.map(toSheet), width, height))
        .filter((ring) => ring.length >= 3),
  };
}

/**
 * Cuts a ring to the rectangle from 0,0 to width,height (Sutherland and Hodgman 1974). A ring that
 * leaves the frame and comes back is joined along the frame's edge, which `outlinePath` leaves out.
 */
export function cutRing(ring: SheetRing, width: number, height: number): SheetRing {
  const sides: {
    inside: (p: SheetPoint) => boolean;
    cross: (a: SheetPoint, b: SheetPoint) => SheetPoint;
  }[] = [
    { inside: ([x]) => x >= 0, cross: (a, b) => crossAtX(a, b, 0) },
    { inside: ([x]) => x <= width, cross: (a, b) => crossAtX(a, b, width) },
    { inside: ([, y]) => y >= 0, cross: (a, b) => crossAtY(a, b, 0) },
    { inside: ([, y]) => y <= height, cross: (a, b) => crossAtY(a, b, height) },
  ];
  let points: SheetPoint[] = [...ring];
  for (const { inside, cross } of sides) {
    const kept: SheetPoint[] = [];
    let previous = points[points.length - 1];
    for (const point of points) {
      if (previous !== undefined && inside(previous) !== inside(point)) {
        kept.push(cross(previous, point));
      }
      if (inside(point)) kept.push(point);
      previous = point;
    }
    points = kept;
  }
  return points;
}

function crossAtX(a: SheetPoint, b: SheetPoint, x: number): SheetPoint {
  return [x, a[1] + ((b[1] - a[1]) * (x - a[0])) / (b[0] - a[0])];
}

function crossAtY(a: SheetPoint, b: SheetPoint, y: number): SheetPoint {
  return [a[0] + ((b[0] - a[0]) * (y - a[1])) / (b[1] - a[1]), y];
}
