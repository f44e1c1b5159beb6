import { boxOfRings, type PlanePoint } from '../geometry/ring.ts';
import { packRuns, type SamplePoints } from './sample-points.ts';

/** Where a window's light is taken: points in front of its wall, and the side on which sun counts. */
export interface WindowFront {
  points: SamplePoints;
  /** Degrees clockwise from true north. */
  facingDeg: number;
}

/** How far in front of its wall a window lies, metres. */
const inFrontM = 0.01;
/** A window along a line is taken at so many points or more. */
const leastPoints = 32;

/**
 * A window's points: one for a point, a row of them for a line, moved off the wall. Every second
 * point of a row is a row of twice the spacing.
 *
 * @param line one point, or the points of a line, on the local plane
 * @param gridM the widest grid; halved once, as for areas
 */
export function makeWindowFront(
  line: readonly PlanePoint[],
  facingDeg: number,
  gridM: number,
): WindowFront {
  const facing = (facingDeg * Math.PI) / 180;
  const { places, spacingM } = placesAlong(line, gridM);
  const moved = places.map(([x, y]): PlanePoint => [
    x + inFrontM * Math.sin(facing),
    y + inFrontM * Math.cos(facing),
  ]);
  const count = moved.length;
  return {
    facingDeg,
    points: {
      count,
      partCount: count,
      spacingM,
      grid: Uint8Array.from(moved, (_, index) => index & 1),
      gridCount: count > 1 ? 2 : 0,
      right: Int32Array.from(moved, (_, index) => (index + 1 < count ? index + 1 : -1)),
      up: new Int32Array(count).fill(-1),
      box: boxOfRings([moved]),
      runs: packRuns(moved.map(([x, y], first) => ({ y, startX: x, stepX: 1, first, length: 1 }))),
    },
  };
}

/** Whether the sun stands in front of a window's wall. */
export function isInFront(front: WindowFront, sun: { azimuthDeg: number }): boolean {
  return Math.cos(((sun.azimuthDeg - front.facingDeg) * Math.PI) / 180) > 1e-9;
}

function placesAlong(
  line: readonly PlanePoint[],
  gridM: number,
): { places: readonly PlanePoint[]; spacingM: number | null } {
  const lengths = line.slice(1).map((to, index) => {
    const from = line[index] ?? to;
    return Math.hypot(to[0] - from[0], to[1] - from[1]);
  });
  const wholeM = lengths.reduce((sum, lengthM) => sum + lengthM, 0);
  if (wholeM === 0) return { places: line.slice(0, 1), spacingM: null };
  const count = Math.max(leastPoints, Math.ceil((2 * wholeM) / gridM));
  const spacingM = wholeM / count;
  const places: PlanePoint[] = [];
  let segment = 0;
  let passedM = 0;
  for (let index = 0; index < count; index += 1) {
    const atM = (index + 0.5) * spacingM;
    while (segment < lengths.length - 1 && atM > passedM + (lengths[segment] ?? 0)) {
      passedM += lengths[segment] ?? 0;
      segment += 1;
    }
    const from = line[segment] ?? [NaN, NaN];
    const to = line[segment + 1] ?? from;
    const share = (atM - passedM) / (lengths[segment] ?? NaN);
    places.push([from[0] + (to[0] - from[0]) * share, from[1] + (to[1] - from[1]) * share]);
  }
  return { places, spacingM };
}
