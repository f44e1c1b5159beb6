import type { PlanePoint, Ring } from '../geometry/ring.ts';

type Side = readonly [PlanePoint, PlanePoint];

/**
 * Where two sides of a ring meet that are no neighbours: a place where they cross if there is one, else one where
 * they touch; null when there is neither. Compares all pairs of sides.
 */
export function findRingCrossing(ring: Ring): PlanePoint | null {
  const sides: Side[] = ring.map((point, index) => [
    point,
    ring[(index + 1) % ring.length] ?? point,
  ]);
  let touch: PlanePoint | null = null;
  for (const [i, a] of sides.entries()) {
    for (let j = i + 2; j < sides.length; j++) {
      const b = sides[j];
      if (b === undefined || (i === 0 && j === sides.length - 1)) continue;
      const meeting = meetingOf(a, b);
      if (meeting === null) continue;
      if (meeting.isCrossing) return meeting.at;
      touch ??= meeting.at;
    }
  }
  return touch;
}

function meetingOf([a, b]: Side, [c, d]: Side): { at: PlanePoint; isCrossing: boolean } | null {
  if (Math.max(a[0], b[0]) < Math.min(c[0], d[0]) || Math.max(c[0], d[0]) < Math.min(a[0], b[0])) {
    return null;
  }
  const sideOfC = turn(a, b, c);
  const sideOfD = turn(a, b, d);
  const sideOfA = turn(c, d, a);
  const sideOfB = turn(c, d, b);
  if (sideOfC * sideOfD > 0 || sideOfA * sideOfB > 0 || sideOfC === sideOfD) return null;
  const share = sideOfC / (sideOfC - sideOfD);
  return {
    at: [c[0] + (d[0] - c[0]) * share, c[1] + (d[1] - c[1]) * share],
    isCrossing: sideOfC * sideOfD < 0 && sideOfA * sideOfB < 0,
  };
}

/** Twice the area of the triangle: positive when `c` lies to the left of the way from `a` to `b`. */
function turn(a: PlanePoint, b: PlanePoint, c: PlanePoint): number {
  return (b[0] - a[0]) * (c[1] - a[1]) - (b[1] - a[1]) * (c[0] - a[0]);
}
