import type { Box, Ring } from '../geometry/ring.ts';
import { addRing, createSweepEdges, type SweepEdges } from './sweep-edges.ts';

/** Rings whose winding number the sweep follows in one of its counters. */
export interface SweepLayer {
  counter: number;
  rings: readonly Ring[];
}

/** Given the winding number of each counter: the index of the area to which a region belongs, or −1. */
export type Classify = (windings: Int32Array) => number;

/**
 * Makes a measure of areas under winding numbers: a sweep over horizontal strips that never builds
 * a polygon, so that nothing can break; rounding moves an area by about 1e-11 m².
 *
 * Between two neighbouring heights at which edges begin, end or cross, the edges stand in a fixed
 * order from left to right, and between two of them each winding number is constant: the regions
 * are trapezoids, the last of them up to the box's right side. An upward edge of a counter-clockwise ring has the solid on its left, so a walk
 * from left to right loses one at it and gains one at a downward edge.
 *
 * The measure keeps its scratch memory from call to call: make one for each study.
 *
 * @param counterCount how many counters the layers use
 */
export function createWindingSweep(counterCount: number) {
  const edges = createSweepEdges();
  const windings = new Int32Array(counterCount);
  const strip = createStrip();

  /** Adds to `areas` (m²) the regions inside the box, told apart by `classify`. */
  return function measureAreas(
    layers: readonly SweepLayer[],
    box: Box,
    classify: Classify,
    areas: Float64Array,
  ): void {
    edges.count = 0;
    for (const { counter, rings } of layers) {
      for (const ring of rings) addRing(edges, ring, counter, box);
    }
    if (edges.count === 0) return;

    const heights = stripHeights(edges);
    const byLowEnd = Uint32Array.from({ length: edges.count }, (_, edge) => edge).sort(
      (a, b) => at(edges.lowY, a) - at(edges.lowY, b),
    );
    let waiting = 0;
    let active: number[] = [];
    for (let index = 0; index + 1 < heights.length; index += 1) {
      const bottomY = at(heights, index);
      const topY = at(heights, index + 1);
      active = active.filter((edge) => at(edges.highY, edge) > bottomY);
      while (waiting < byLowEnd.length && at(edges.lowY, at(byLowEnd, waiting)) <= bottomY) {
        active.push(at(byLowEnd, waiting));
        waiting += 1;
      }
      fillStrip(strip, edges, active, bottomY, topY);
      sweepStrip(strip, edges, box, topY - bottomY, windings, classify, areas);
    }
  };
}

export type MeasureAreas = ReturnType<typeof createWindingSweep>;

/** The edges of one strip, with the places at which they enter it below and leave it above. */
interface Strip {
  count: number;
  order: number[];
  edge: number[];
  bottomX: number[];
  topX: number[];
}

function createStrip(): Strip {
  return { count: 0, order: [], edge: [], bottomX: [], topX: [] };
}

function fillStrip(
  strip: Strip,
  edges: SweepEdges,
  active: readonly number[],
  bottomY: number,
  topY: number,
): void {
  strip.count = active.length;
  strip.order.length = active.length;
  active.forEach((edge, index) => {
    strip.order[index] = index;
    strip.edge[index] = edge;
    strip.bottomX[index] = xAt(edges, edge, bottomY);
    strip.topX[index] = xAt(edges, edge, topY);
  });
}

function sweepStrip(
  strip: Strip,
  edges: SweepEdges,
  box: Box,
  heightM: number,
  windings: Int32Array,
  classify: Classify,
  areas: Float64Array,
): void {
  const cuts = crossingShares(strip);
  let fromShare = 0;
  for (const toShare of cuts) {
    if (toShare <= fromShare) continue;
    addTrapezoids(strip, edges, box, heightM, fromShare, toShare, windings, classify, areas);
    fromShare = toShare;
  }
  addTrapezoids(strip, edges, box, heightM, fromShare, 1, windings, classify, areas);
}

/** The shares of the strip's height at which two of its edges cross, rising. Sorts `order` by the bottom. */
function crossingShares({ count, order, bottomX, topX }: Strip): number[] {
  order.sort((a, b) => at(bottomX, a) - at(bottomX, b) || at(topX, a) - at(topX, b));
  const shares: number[] = [];
  const byTop = order.slice();
  // An insertion sort by the top swaps exactly the pairs that cross within the strip.
  for (let index = 1; index < count; index += 1) {
    const moved = at(byTop, index);
    const movedTop = at(topX, moved);
    let place = index;
    for (; place > 0 && at(topX, at(byTop, place - 1)) > movedTop; place -= 1) {
      const passed = at(byTop, place - 1);
      const gapBottom = at(bottomX, moved) - at(bottomX, passed);
      const gapTop = at(topX, passed) - movedTop;
      if (gapBottom > 0) shares.push(gapBottom / (gapBottom + gapTop));
      byTop[place] = passed;
    }
    byTop[place] = moved;
  }
  return shares.sort((a, b) => a - b);
}

function addTrapezoids(
  strip: Strip,
  edges: SweepEdges,
  box: Box,
  heightM: number,
  fromShare: number,
  toShare: number,
  windings: Int32Array,
  classify: Classify,
  areas: Float64Array,
): void {
  const { order, edge, bottomX, topX, count } = strip;
  const middle = (fromShare + toShare) / 2;
  // The mean width of a trapezoid is its width half way up.
  const middleX = (index: number) => {
    const bottom = at(bottomX, index);
    return bottom + (at(topX, index) - bottom) * middle;
  };
  if (fromShare > 0 || toShare < 1) order.sort((a, b) => middleX(a) - middleX(b));
  windings.fill(0);
  const partM = heightM * (toShare - fromShare);
  let previousX = box.minX;
  const addUpTo = (x: number) => {
    if (x <= previousX) return;
    const area = classify(windings);
    if (area >= 0) areas[area] = at(areas, area) + (x - previousX) * partM;
    previousX = x;
  };
  for (let index = 0; index < count; index += 1) {
    const current = at(order, index);
    addUpTo(middleX(current));
    const edgeIndex = at(edge, current);
    const counter = at(edges.counter, edgeIndex);
    windings[counter] = at(windings, counter) - at(edges.winding, edgeIndex);
  }
  addUpTo(box.maxX);
}

/** The heights at which edges begin or end, rising, each once. */
function stripHeights(edges: SweepEdges): Float64Array {
  const heights = new Float64Array(edges.count * 2);
  heights.set(edges.lowY.subarray(0, edges.count));
  heights.set(edges.highY.subarray(0, edges.count), edges.count);
  heights.sort();
  let kept = 0;
  for (const height of heights) {
    if (kept === 0 || height > at(heights, kept - 1)) {
      heights[kept] = height;
      kept += 1;
    }
  }
  return heights.subarray(0, kept);
}

function xAt(edges: SweepEdges, edge: number, y: number): number {
  const lowY = at(edges.lowY, edge);
  const highY = at(edges.highY, edge);
  const lowX = at(edges.lowX, edge);
  const highX = at(edges.highX, edge);
  if (y <= lowY) return lowX;
  if (y >= highY) return highX;
  return lowX + ((highX - lowX) * (y - lowY)) / (highY - lowY);
}

/** An element that the sweep's own bookkeeping guarantees to exist. */
function at(numbers: ArrayLike<number>, index: number): number {
  const value = numbers[index];
  if (value === undefined)
    {throw new RangeError(`The sweep looked beyond its ${numbers.length} edges.`);}
  return value;
}
