import type { Box, Ring } from '../geometry/ring.ts';
import { addRing, createSweepEdges, type SweepEdges } from './sweep-edges.ts';

/** Rings whose winding number the sweep follows in one of its counters. */
export interface SweepLayer {
  counter: number;
  rings: readonly Ring[];
}

/** Given the winding number of each counter: the index of the area to which a region belongs, or −1. */
export type Classify = (windings: Int32Array) => number;

/** Adds to `areas` (m²) the regions inside the box, told apart by `classify`. */
export type MeasureAreas = (
  layers: readonly SweepLayer[],
  box: Box,
  classify: Classify,
  areas: Float64Array,
) => void;

/**
 * Makes a measure of areas under winding numbers: a sweep over horizontal strips that never builds
 * a polygon, so that nothing can break; rounding moves an area by about 1e-11 m².
 *
 * Between two neighbouring heights at which edges begin, end or cross, the edges stand in a fixed
 * order from left to right, and between two of them each winding number is constant: the regions
 * are trapezoids, the last of them up to the box's right side. An upward edge of a
 * counter-clockwise ring has the solid on its left, so a walk from left to right loses one at it
 * and gains one at a downward edge.
 *
 * The measure keeps its scratch memory from call to call: make one for each study.
 *
 * @param counterCount how many counters the layers use
 */
export function createWindingSweep(counterCount: number): MeasureAreas {
  const edges = createSweepEdges();
  const windings = new Int32Array(counterCount);
  let strip = createStrip(64);

  return (layers, box, classify, areas) => {
    edges.count = 0;
    for (const { counter, rings } of layers) {
      for (const ring of rings) addRing(edges, ring, counter, box);
    }
    if (edges.count === 0) return;
    if (strip.edge.length < edges.count) strip = createStrip(edges.count * 2);

    const heights = stripHeights(edges);
    const byLowEnd = edgesByLowEnd(edges);
    let waiting = 0;
    strip.count = 0;
    for (let index = 0; index + 1 < heights.length; index += 1) {
      const bottomY = real(heights, index);
      const topY = real(heights, index + 1);
      dropEnded(strip, edges, bottomY);
      while (waiting < byLowEnd.length) {
        const edge = whole(byLowEnd, waiting);
        if (real(edges.lowY, edge) > bottomY) break;
        strip.edge[strip.count] = edge;
        strip.count += 1;
        waiting += 1;
      }
      placeEdges(strip, edges, bottomY, topY);
      sweepStrip(strip, edges, box, topY - bottomY, windings, classify, areas);
    }
  };
}

/**
 * The edges of one strip from left to right at its lower side, with the places at which they enter
 * it below and leave it above. The next strip finds them nearly sorted.
 */
interface Strip {
  count: number;
  edge: Int32Array;
  bottomX: Float64Array;
  topX: Float64Array;
  /** Indices into the three above, in the order of a part of the strip. */
  order: Int32Array;
  middleX: Float64Array;
}

function createStrip(capacity: number): Strip {
  return {
    count: 0,
    edge: new Int32Array(capacity),
    bottomX: new Float64Array(capacity),
    topX: new Float64Array(capacity),
    order: new Int32Array(capacity),
    middleX: new Float64Array(capacity),
  };
}

function dropEnded(strip: Strip, edges: SweepEdges, bottomY: number): void {
  let kept = 0;
  for (let index = 0; index < strip.count; index += 1) {
    const edge = whole(strip.edge, index);
    if (real(edges.highY, edge) > bottomY) {
      strip.edge[kept] = edge;
      kept += 1;
    }
  }
  strip.count = kept;
}

/** Works out where each edge crosses the strip, and sorts them by insertion. */
function placeEdges(strip: Strip, edges: SweepEdges, bottomY: number, topY: number): void {
  const { edge, bottomX, topX } = strip;
  for (let index = 0; index < strip.count; index += 1) {
    const moved = whole(edge, index);
    const movedBottom = xAt(edges, moved, bottomY);
    const movedTop = xAt(edges, moved, topY);
    let place = index;
    while (place > 0) {
      const beforeBottom = real(bottomX, place - 1);
      if (beforeBottom < movedBottom) break;
      if (beforeBottom === movedBottom && real(topX, place - 1) <= movedTop) break;
      edge[place] = whole(edge, place - 1);
      bottomX[place] = beforeBottom;
      topX[place] = real(topX, place - 1);
      place -= 1;
    }
    edge[place] = moved;
    bottomX[place] = movedBottom;
    topX[place] = movedTop;
  }
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
  for (let index = 0; index < strip.count; index += 1) strip.order[index] = index;
  let fromShare = 0;
  for (const toShare of crossingShares(strip)) {
    if (toShare <= fromShare) continue;
    placeMiddles(strip, (fromShare + toShare) / 2);
    addTrapezoids(strip, edges, box, heightM * (toShare - fromShare), windings, classify, areas);
    fromShare = toShare;
  }
  placeMiddles(strip, (fromShare + 1) / 2);
  addTrapezoids(strip, edges, box, heightM * (1 - fromShare), windings, classify, areas);
}

const noShares: readonly number[] = [];

/** The shares of the strip's height at which two of its edges cross, rising. */
function crossingShares({ count, topX, bottomX, order }: Strip): readonly number[] {
  let isSorted = true;
  for (let index = 1; index < count && isSorted; index += 1) {
    isSorted = real(topX, index - 1) <= real(topX, index);
  }
  if (isSorted) return noShares;
  const shares: number[] = [];
  // An insertion sort by the upper side swaps exactly the pairs that cross within the strip.
  for (let index = 1; index < count; index += 1) {
    const moved = whole(order, index);
    const movedTop = real(topX, moved);
    let place = index;
    while (place > 0) {
      const passed = whole(order, place - 1);
      const gapTop = real(topX, passed) - movedTop;
      if (gapTop <= 0) break;
      const gapBottom = real(bottomX, moved) - real(bottomX, passed);
      if (gapBottom > 0) shares.push(gapBottom / (gapBottom + gapTop));
      order[place] = passed;
      place -= 1;
    }
    order[place] = moved;
  }
  return shares.sort((a, b) => a - b);
}

/** Sorts `order` by the places at a share of the strip's height, in `middleX`. */
function placeMiddles({ count, order, bottomX, topX, middleX }: Strip, share: number): void {
  for (let index = 0; index < count; index += 1) {
    const bottom = real(bottomX, index);
    middleX[index] = bottom + (real(topX, index) - bottom) * share;
  }
  for (let index = 1; index < count; index += 1) {
    const moved = whole(order, index);
    const movedX = real(middleX, moved);
    let place = index;
    while (place > 0) {
      const passed = whole(order, place - 1);
      if (real(middleX, passed) <= movedX) break;
      order[place] = passed;
      place -= 1;
    }
    order[place] = moved;
  }
}

/** Adds a part of a strip in which no edges cross: a trapezoid's mean width is that half way up. */
function addTrapezoids(
  { count, edge, order, middleX }: Strip,
  edges: SweepEdges,
  box: Box,
  heightM: number,
  windings: Int32Array,
  classify: Classify,
  areas: Float64Array,
): void {
  windings.fill(0);
  let previousX = box.minX;
  for (let index = 0; index <= count; index += 1) {
    const x = index < count ? real(middleX, whole(order, index)) : box.maxX;
    if (x > previousX) {
      const area = classify(windings);
      if (area >= 0) areas[area] = real(areas, area) + (x - previousX) * heightM;
      previousX = x;
    }
    if (index < count) {
      const current = whole(edge, whole(order, index));
      const counter = whole(edges.counter, current);
      windings[counter] = whole(windings, counter) - whole(edges.winding, current);
    }
  }
}

/** The heights at which edges begin or end, rising, each once. */
function stripHeights(edges: SweepEdges): Float64Array {
  const heights = new Float64Array(edges.count * 2);
  heights.set(edges.lowY.subarray(0, edges.count));
  heights.set(edges.highY.subarray(0, edges.count), edges.count);
  heights.sort();
  let kept = 1;
  for (let index = 1; index < heights.length; index += 1) {
    const height = real(heights, index);
    if (height > real(heights, kept - 1)) {
      heights[kept] = height;
      kept += 1;
    }
  }
  return heights.subarray(0, kept);
}

function edgesByLowEnd(edges: SweepEdges): Int32Array {
  const sorted = new Int32Array(edges.count);
  for (let index = 0; index < sorted.length; index += 1) sorted[index] = index;
  return sorted.sort((a, b) => real(edges.lowY, a) - real(edges.lowY, b));
}

function xAt(edges: SweepEdges, edge: number, y: number): number {
  const lowY = real(edges.lowY, edge);
  const lowX = real(edges.lowX, edge);
  if (y <= lowY) return lowX;
  const highY = real(edges.highY, edge);
  const highX = real(edges.highX, edge);
  if (y >= highY) return highX;
  return lowX + ((highX - lowX) * (y - lowY)) / (highY - lowY);
}

// One reader for each kind of array keeps the hot loops on one type. The sweep's own counts keep
// every index inside its array.
const real = (numbers: Float64Array, index: number): number => numbers[index] ?? NaN;
const whole = (numbers: Int32Array, index: number): number => numbers[index] ?? 0;
