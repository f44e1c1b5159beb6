import type { Box } from '../geometry/ring.ts';

/**
 * Points at which light is sampled, in runs along x: rows of a grid, or single points. The winding
 * number of all of them under a set of rings is counted in one pass over the rings' edges.
 */
export interface SamplePoints {
  count: number;
  /** The first so many stand for equal parts of the receptor; the others lie along its border. */
  partCount: number;
  /** Metres between neighbours; null for a single point. */
  spacingM: number | null;
  /** Which of the `gridCount` grids of twice the spacing each point belongs to. */
  grid: Uint8Array;
  gridCount: number;
  /** The neighbours of each point one spacing along x and along y; −1 where there is none. */
  right: Int32Array;
  up: Int32Array;
  box: Box;
  runs: SampleRuns;
}

/** Points of one y after the other, by rising y. */
export interface SampleRuns {
  y: Float64Array;
  startX: Float64Array;
  stepX: Float64Array;
  /** The number of a run's first point; the others follow. */
  first: Int32Array;
  length: Int32Array;
}

/** Points by rising y as runs of one each; `first` keeps their numbers. */
export interface PlacedRun {
  y: number;
  startX: number;
  stepX: number;
  first: number;
  length: number;
}

/** Puts runs in the order of their y. */
export function packRuns(placed: readonly PlacedRun[]): SampleRuns {
  const sorted = [...placed].sort((a, b) => a.y - b.y);
  return {
    y: Float64Array.from(sorted, (run) => run.y),
    startX: Float64Array.from(sorted, (run) => run.startX),
    stepX: Float64Array.from(sorted, (run) => run.stepX),
    first: Int32Array.from(sorted, (run) => run.first),
    length: Int32Array.from(sorted, (run) => run.length),
  };
}

/**
 * Adds what an edge of a ring does to the winding numbers: every point right of it and between its
 * two heights counts it once. `changes` holds the differences along each run; `sumAlongRuns` adds
 * them up.
 */
export function addEdgeToRuns(
  runs: SampleRuns,
  changes: Int32Array,
  fromX: number,
  fromY: number,
  toX: number,
  toY: number,
): void {
  if (fromY === toY) return;
  const isRising = fromY < toY;
  const lowX = isRising ? fromX : toX;
  const lowY = isRising ? fromY : toY;
  const highY = isRising ? toY : fromY;
  const slope = (toX - fromX) / (toY - fromY);
  const winding = isRising ? -1 : 1;
  const { y, startX, stepX, first, length } = runs;
  for (let run = firstRunFrom(y, lowY); run < y.length; run += 1) {
    const runY = y[run] ?? NaN;
    if (runY >= highY) return;
    const crossingX = lowX + (runY - lowY) * slope;
    const beyond = Math.floor((crossingX - (startX[run] ?? NaN)) / (stepX[run] ?? NaN)) + 1;
    const offset = beyond > 0 ? beyond : 0;
    if (offset >= (length[run] ?? 0)) continue;
    const point = (first[run] ?? 0) + offset;
    changes[point] = (changes[point] ?? 0) + winding;
  }
}

/** Turns the differences along each run into the points' winding numbers, in place. */
export function sumAlongRuns({ first, length }: SampleRuns, changes: Int32Array): void {
  for (let run = 0; run < first.length; run += 1) {
    const start = first[run] ?? 0;
    const end = start + (length[run] ?? 0);
    let winding = 0;
    for (let point = start; point < end; point += 1) {
      winding += changes[point] ?? 0;
      changes[point] = winding;
    }
  }
}

/** The first run at or above a height. */
function firstRunFrom(y: Float64Array, lowY: number): number {
  let low = 0;
  let high = y.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((y[middle] ?? NaN) < lowY) low = middle + 1;
    else high = middle;
  }
  return low;
}
