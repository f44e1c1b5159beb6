import type { Box, PlanePoint, Ring } from '../geometry/ring.ts';
import type { PlaneBlock, SunDirection } from './plane-block.ts';

/** How a height above a plane moves along it: metres of x and y for each metre of height. */
export interface ShadowVector {
  x: number;
  y: number;
}

/**
 * The way in which shadows fall on a horizontal plane: away from the sun, by the cotangent of its
 * altitude for each metre of height. The altitude must be above 0.
 */
export function shadowVector(sun: SunDirection): ShadowVector {
  if (!(sun.altitudeDeg > 0)) throw new RangeError('With the sun down there are no shadows.');
  const azimuth = (sun.azimuthDeg * Math.PI) / 180;
  const cotangent = 1 / Math.tan((sun.altitudeDeg * Math.PI) / 180);
  return { x: -Math.sin(azimuth) * cotangent, y: -Math.cos(azimuth) * cotangent };
}

/**
 * The outline of a block's shadow on a horizontal plane, one contour for each ring of its
 * footprint; none where the block does not rise above the plane. The contours may cross
 * themselves: the winding number of a point is the number of stretches in which its ray to the sun
 * meets the block, so the NonZero fill of all contours of all blocks is exactly the union of their
 * shadows, courtyards and overhangs included.
 *
 * Each vertex moves with the shadow by the block's base above the plane; chains of edges that face
 * away from the sun move by its top.
 *
 * @param planeM height of the plane in metres above the datum
 */
export function castBlockContours(block: PlaneBlock, sun: SunDirection, planeM: number): Ring[] {
  return contoursAlong(block, shadowVector(sun), planeM);
}

/** As `castBlockContours`, with the way of the shadows worked out beforehand. */
export function contoursAlong(block: PlaneBlock, along: ShadowVector, planeM: number): Ring[] {
  const topAboveM = block.topM - planeM;
  if (topAboveM <= 0) return [];
  const baseAboveM = Math.max(block.baseM - planeM, 0);
  return block.rings.map((ring) => sweepRing(ring, along, baseAboveM, topAboveM));
}

/** The box around a block's shadow on a plane; null where it casts none. */
export function shadowBox(block: PlaneBlock, along: ShadowVector, planeM: number): Box | null {
  const topAboveM = block.topM - planeM;
  if (topAboveM <= 0) return null;
  const baseAboveM = Math.max(block.baseM - planeM, 0);
  const { minX, minY, maxX, maxY } = block.box;
  return {
    minX: minX + Math.min(along.x * baseAboveM, along.x * topAboveM),
    maxX: maxX + Math.max(along.x * baseAboveM, along.x * topAboveM),
    minY: minY + Math.min(along.y * baseAboveM, along.y * topAboveM),
    maxY: maxY + Math.max(along.y * baseAboveM, along.y * topAboveM),
  };
}

function sweepRing(ring: Ring, along: ShadowVector, nearM: number, farM: number): Ring {
  const nearX = along.x * nearM;
  const nearY = along.y * nearM;
  const farX = along.x * farM;
  const farY = along.y * farM;
  const contour: PlanePoint[] = [];
  let previous = ring[ring.length - 1];
  if (previous === undefined) return contour;
  let wasFar = facesAway(ring[ring.length - 2] ?? previous, previous, along);
  for (const point of ring) {
    const isFar = facesAway(previous, point, along);
    // The vertex between two edges is drawn once for each offset that they have.
    contour.push(
      wasFar
        ? [previous[0] + farX, previous[1] + farY]
        : [previous[0] + nearX, previous[1] + nearY],
    );
    if (isFar !== wasFar) {
      contour.push(
        isFar
          ? [previous[0] + farX, previous[1] + farY]
          : [previous[0] + nearX, previous[1] + nearY],
      );
    }
    wasFar = isFar;
    previous = point;
  }
  return contour;
}

/** Whether an edge's outer side, on its right, looks the way the shadow falls. */
function facesAway(from: PlanePoint, to: PlanePoint, along: ShadowVector): boolean {
  return (to[1] - from[1]) * along.x - (to[0] - from[0]) * along.y > 0;
}
