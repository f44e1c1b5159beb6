import type { PlanePoint } from '../geometry/ring.ts';

/** The direction of the sun. */
export interface SunDirection {
  /** Degrees clockwise from true north. */
  azimuthDeg: number;
  /** Apparent altitude in degrees, above 0. */
  altitudeDeg: number;
}

/**
 * The local plane turned so that shadows fall along +x. There the long sides of every shadow are
 * level, and a sweep from south to north need not look at them: a shadow is its footprint with the
 * edges that face the sun left where they are and the others moved along x.
 */
export interface SunFrame {
  /** The way of the shadows on the local plane: a unit vector. */
  awayX: number;
  awayY: number;
  /** Metres of shadow for each metre of height. */
  cotangent: number;
}

/** The frame of a sun. @throws RangeError when it is not above the horizon. */
export function makeSunFrame({ azimuthDeg, altitudeDeg }: SunDirection): SunFrame {
  if (!(altitudeDeg > 0)) throw new RangeError('With the sun down there are no shadows.');
  const azimuth = (azimuthDeg * Math.PI) / 180;
  return {
    awayX: -Math.sin(azimuth),
    awayY: -Math.cos(azimuth),
    cotangent: 1 / Math.tan((altitudeDeg * Math.PI) / 180),
  };
}

/**
 * Points of the local plane, x and y one after the other, in a sun's frame.
 *
 * @param into where to put them; at least as long
 */
export function turnIntoFrame(
  points: Float64Array,
  { awayX, awayY }: SunFrame,
  into = new Float64Array(points.length),
): Float64Array {
  for (let index = 0; index + 1 < points.length; index += 2) {
    const x = points[index] ?? NaN;
    const y = points[index + 1] ?? NaN;
    into[index] = x * awayX + y * awayY;
    into[index + 1] = y * awayX - x * awayY;
  }
  return into;
}

/** Points of a sun's frame, x and y one after the other, on the local plane. */
export function turnOutOfFrame(
  points: readonly number[],
  { awayX, awayY }: SunFrame,
): Float64Array {
  const turned = new Float64Array(points.length);
  for (let index = 0; index + 1 < points.length; index += 2) {
    const x = points[index] ?? NaN;
    const y = points[index + 1] ?? NaN;
    turned[index] = x * awayX - y * awayY;
    turned[index + 1] = x * awayY + y * awayX;
  }
  return turned;
}

/** A point of a sun's frame on the local plane. */
export function pointFromFrame(x: number, y: number, { awayX, awayY }: SunFrame): PlanePoint {
  return [x * awayX - y * awayY, x * awayY + y * awayX];
}
