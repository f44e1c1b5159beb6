import { flattenRings, type RingRange } from '../geometry/flat-rings.ts';
import type { PlanePoint, Ring } from '../geometry/ring.ts';
import type { PlaneBlock } from './plane-block.ts';
import { makeSunFrame, pointFromFrame, turnIntoFrame, type SunDirection } from './sun-frame.ts';

/** A ring in a sun's frame: x and y in metres, one after the other, the first point not repeated. */
export type FrameRing = readonly number[];

/**
 * The outline of a block's shadow on a horizontal plane, one contour for each ring of its
 * footprint; none where the block does not rise above the plane. The contours may cross
 * themselves: the winding number of a point is the number of stretches in which its ray to the sun
 * meets the block, so the NonZero fill of all contours of all blocks is exactly the union of their
 * shadows, courtyards and overhangs included.
 *
 * @param planeM height of the plane in metres above the datum
 * @throws RangeError when the sun is not above the horizon
 */
export function castBlockContours(block: PlaneBlock, sun: SunDirection, planeM: number): Ring[] {
  const reach = shadowReach(block, planeM);
  if (reach === null) return [];
  const frame = makeSunFrame(sun);
  const { points, rings } = flattenRings(block.rings);
  const turned = turnIntoFrame(points, frame);
  return rings.map((ring) =>
    pointsOfRing(
      castContour(turned, ring, reach.nearM * frame.cotangent, reach.farM * frame.cotangent),
      (x, y) => pointFromFrame(x, y, frame),
    ),
  );
}

/** The heights in metres above a plane between which a block throws shade on it; null where it throws none. */
export function shadowReach(
  { baseM, topM }: Pick<PlaneBlock, 'baseM' | 'topM'>,
  planeM: number,
): { nearM: number; farM: number } | null {
  const farM = topM - planeM;
  return farM > 0 ? { nearM: Math.max(baseM - planeM, 0), farM } : null;
}

/**
 * The contour that a ring of a footprint throws in its sun's frame: edges that run up have their
 * outer side away from the sun and move by the far shift, the others by the near one.
 *
 * @param nearShiftM how far the shadow of the block's base moves along x
 * @param farShiftM the same of its top
 */
export function castContour(
  points: Float64Array,
  { start, end }: RingRange,
  nearShiftM: number,
  farShiftM: number,
): FrameRing {
  const contour: number[] = [];
  let x = points[end - 2] ?? NaN;
  let y = points[end - 1] ?? NaN;
  let cameUp = y > (points[end - 3] ?? NaN);
  // A vertex between two edges is drawn once for each shift that they have.
  for (let index = start; index < end; index += 2) {
    const nextX = points[index] ?? NaN;
    const nextY = points[index + 1] ?? NaN;
    const goesUp = nextY > y;
    contour.push(x + (cameUp ? farShiftM : nearShiftM), y);
    if (goesUp !== cameUp) contour.push(x + (goesUp ? farShiftM : nearShiftM), y);
    x = nextX;
    y = nextY;
    cameUp = goesUp;
  }
  return contour;
}

/** A ring of a sun's frame as points, each made by `pointAt`. */
export function pointsOfRing(
  ring: FrameRing,
  pointAt: (x: number, y: number) => PlanePoint,
): PlanePoint[] {
  const points: PlanePoint[] = [];
  for (let index = 0; index + 1 < ring.length; index += 2) {
    points.push(pointAt(ring[index] ?? NaN, ring[index + 1] ?? NaN));
  }
  return points;
}
