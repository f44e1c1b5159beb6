import { placeAt, type BlockLabel } from './block-label.ts';
import { createIssue, type IssueCode } from './issue-severities.ts';
import type { MassingIssue } from './massing-issue.ts';

export type LngLat = [number, number];

export interface RepairedFootprint {
  /** Rings closed, outlines counter-clockwise, holes clockwise; null when a ring encloses nothing. */
  polygons: LngLat[][][] | null;
  issues: MassingIssue[];
}

/** Points closer than this are one point: about 0.1 mm on the ground. */
const samePointDeg = 1e-9;

/**
 * Puts right what can be put right without changing the shape, and says so, one issue for each kind: rings are
 * closed, repeated points dropped, rings turned as RFC 7946 (section 3.1.6) has it. Whatever format the rings
 * came from, they leave here alike.
 * @param polygons Each: outline, then holes; longitude and latitude on WGS 84.
 */
export function repairFootprint(polygons: LngLat[][][], label: BlockLabel): RepairedFootprint {
  const repairs: RingRepair[] = [];
  const repaired: LngLat[][][] = [];
  for (const rings of polygons) {
    const parts: LngLat[][] = [];
    for (const [index, ring] of rings.entries()) {
      const repair = repairRing(ring, index === 0);
      if (repair === null) return refuseRing(ring, index === 0, label);
      repairs.push(repair);
      parts.push(repair.ring);
    }
    repaired.push(parts);
  }
  return { polygons: repaired, issues: describeRepairs(repairs, label) };
}

interface RingRepair {
  ring: LngLat[];
  wasOpen: boolean;
  repeatedPoints: number;
  wasTurned: boolean;
}

/** Null when the ring has fewer than three different corners in a row. */
function repairRing(points: readonly LngLat[], isOutline: boolean): RingRepair | null {
  const corners: LngLat[] = [];
  for (const point of points) {
    const previous = corners.at(-1);
    if (previous === undefined || !isSamePoint(previous, point)) corners.push(point);
  }
  const repeatedPoints = points.length - corners.length;
  const first = corners[0];
  const last = corners.at(-1);
  const isClosed = first !== undefined && last !== undefined && isSamePoint(first, last);
  if (isClosed) corners.pop();
  if (first === undefined || corners.length < 3) return null;

  const wasTurned = isCounterClockwise(corners) !== isOutline;
  // Turned or not, a ring begins and ends with the point that it began with.
  const ring = wasTurned ? [first, ...corners.toReversed()] : [...corners, first];
  return { ring, wasOpen: !isClosed, repeatedPoints, wasTurned };
}

function refuseRing(ring: LngLat[], isOutline: boolean, label: BlockLabel): RepairedFootprint {
  const issue = createIssue(
    'MASSING_TOO_FEW_POINTS',
    placeAt(label, ring[0] ?? null),
    `${label.text} has ${isOutline ? 'an outline' : 'a hole'} of fewer than 4 points (the first one repeated at the end), so it encloses nothing.`,
    isOutline
      ? 'Draw the footprint as a closed polygon.'
      : 'Draw the hole as a closed polygon, or leave it out.',
  );
  return { polygons: null, issues: [issue] };
}

function describeRepairs(repairs: readonly RingRepair[], label: BlockLabel): MassingIssue[] {
  const issues: MassingIssue[] = [];
  const say = (code: IssueCode, done: readonly RingRepair[], message: string) => {
    const [first] = done;
    if (first === undefined) return;
    const place = placeAt(label, first.ring[0] ?? null);
    issues.push(createIssue(code, place, `${label.text}: ${message}`));
  };

  const open = repairs.filter(({ wasOpen }) => wasOpen);
  say(
    'MASSING_RING_OPEN',
    open,
    `${count(open.length, 'ring was', 'rings were')} not closed; the first point was repeated at the end.`,
  );
  const repeated = repairs.filter(({ repeatedPoints }) => repeatedPoints > 0);
  const points = repeated.reduce((sum, { repeatedPoints }) => sum + repeatedPoints, 0);
  say(
    'MASSING_POINTS_REPEATED',
    repeated,
    `${count(points, 'point that repeats the one before was', 'points that repeat the one before were')} dropped.`,
  );
  const turned = repairs.filter(({ wasTurned }) => wasTurned);
  say(
    'MASSING_RING_ORIENTATION',
    turned,
    `${count(turned.length, 'ring was', 'rings were')} turned round (outlines run counter-clockwise, holes clockwise); the shape is the same.`,
  );
  return issues;
}

function isSamePoint(a: LngLat, b: LngLat): boolean {
  return Math.abs(a[0] - b[0]) < samePointDeg && Math.abs(a[1] - b[1]) < samePointDeg;
}

/** By the sign of the shoelace sum in degrees; only the sense of the ring is taken from it, no measure. */
function isCounterClockwise(corners: readonly LngLat[]): boolean {
  const [originX, originY] = corners[0] ?? [0, 0];
  let [previousX, previousY] = corners.at(-1) ?? [0, 0];
  let sum = 0;
  for (const [x, y] of corners) {
    sum += (previousX - originX) * (y - originY) - (x - originX) * (previousY - originY);
    [previousX, previousY] = [x, y];
  }
  return sum > 0;
}

function count(number: number, one: string, many: string): string {
  return `${number} ${number === 1 ? one : many}`;
}
