import type { RingRange } from '../geometry/flat-rings.ts';
import type { Box } from '../geometry/ring.ts';
import { addEdge, createSweepEdges, type SweepEdges } from './sweep-edges.ts';
import { listHeights, sortByLowEnd } from './sweep-order.ts';

/**
 * A measure of areas under winding numbers: a sweep over level strips that never builds a polygon,
 * so that nothing can break; rounding moves an area by about 1e-11 m².
 *
 * Between two neighbouring heights at which edges begin, end or cross, the edges stand in a fixed
 * order from left to right, and between two of them each winding number is constant: the regions
 * are trapezoids, the last of them up to the box's right side. An upward edge of a
 * counter-clockwise ring has the solid on its left, so a walk from left to right loses one at it
 * and gains one at a downward edge.
 *
 * It keeps its scratch memory from box to box: make one for each study.
 */
export interface WindingSweep {
  /** Begins anew inside a box, with no ring. */
  start: (box: Box) => void;
  /**
   * Adds a ring of an array of points to a counter. Edges that run up are moved by `upShiftM` along
   * x, the others by `downShiftM`.
   */
  addRing: (
    points: Float64Array,
    ring: RingRange,
    counter: number,
    upShiftM?: number,
    downShiftM?: number,
  ) => void;
  /**
   * The regions inside the box, in m².
   *
   * @param outcomes for each set of counters whose winding number is above 0, as a number with one
   * bit for each counter: the index of the area that its regions add to, or −1
   */
  measure: (outcomes: Int8Array, areas: Float64Array) => void;
}

/** @param counterCount how many counters there are */
export function createWindingSweep(counterCount: number): WindingSweep {
  const edges = createSweepEdges(counterCount);
  const windings = new Int32Array(counterCount);
  let strip = createStrip(256);
  let box: Box = { minX: 0, minY: 0, maxX: 0, maxY: 0 };
  return {
    start: (next) => {
      box = next;
      edges.count = 0;
      edges.leftWindings.fill(0);
    },
    addRing: (points, { start, end }, counter, upShiftM = 0, downShiftM = 0) => {
      let fromX = real(points, end - 2);
      let fromY = real(points, end - 1);
      for (let index = start; index < end; index += 2) {
        const toX = real(points, index);
        const toY = real(points, index + 1);
        const shiftM = toY > fromY ? upShiftM : downShiftM;
        addEdge(edges, fromX + shiftM, fromY, toX + shiftM, toY, counter, box);
        fromX = toX;
        fromY = toY;
      }
    },
    measure: (outcomes, areas) => {
      if (strip.edge.length < edges.count) strip = createStrip(edges.count * 2);
      sweep(strip, edges, box, windings, outcomes, areas);
    },
  };
}

/**
 * The edges of one strip from left to right, with the places at which they enter it below and leave
 * it above. The next strip finds them nearly sorted.
 */
interface Strip {
  count: number;
  edge: Int32Array;
  bottomX: Float64Array;
  topX: Float64Array;
  /** All edges by their lower ends, and the heights at which strips meet. */
  byLowEnd: Int32Array;
  heights: Float64Array;
  /** The upper side's order, while crossings are sought. */
  order: Int32Array;
}

function createStrip(capacity: number): Strip {
  return {
    count: 0,
    edge: new Int32Array(capacity),
    bottomX: new Float64Array(capacity),
    topX: new Float64Array(capacity),
    byLowEnd: new Int32Array(capacity),
    heights: new Float64Array(capacity * 2 + 2),
    order: new Int32Array(capacity),
  };
}

function sweep(
  strip: Strip,
  edges: SweepEdges,
  box: Box,
  windings: Int32Array,
  outcomes: Int8Array,
  areas: Float64Array,
): void {
  const heightCount = listHeights(edges, box, strip.heights);
  sortByLowEnd(edges, strip.byLowEnd);
  let waiting = 0;
  strip.count = 0;
  for (let index = 0; index + 1 < heightCount; index += 1) {
    const bottomY = real(strip.heights, index);
    const topY = real(strip.heights, index + 1);
    rise(strip, edges, bottomY);
    while (waiting < edges.count) {
      const edge = whole(strip.byLowEnd, waiting);
      if (real(edges.lowY, edge) > bottomY) break;
      strip.edge[strip.count] = edge;
      strip.bottomX[strip.count] = real(edges.lowX, edge);
      strip.count += 1;
      waiting += 1;
    }
    const isCrossed = placeEdges(strip, edges, topY);
    let fromShare = 0;
    if (isCrossed) {
      for (const toShare of crossingShares(strip)) {
        if (toShare <= fromShare) continue;
        const share = (fromShare + toShare) / 2;
        sortAt(strip, share);
        const heightM = (topY - bottomY) * (toShare - fromShare);
        addTrapezoids(strip, edges, box, share, heightM, windings, outcomes, areas);
        fromShare = toShare;
      }
      sortAt(strip, (fromShare + 1) / 2);
    }
    const heightM = (topY - bottomY) * (1 - fromShare);
    addTrapezoids(strip, edges, box, (fromShare + 1) / 2, heightM, windings, outcomes, areas);
  }
}

/** Drops the edges that end below, and takes the others' places at the last strip's upper side. */
function rise(strip: Strip, edges: SweepEdges, bottomY: number): void {
  let kept = 0;
  for (let index = 0; index < strip.count; index += 1) {
    const edge = whole(strip.edge, index);
    if (real(edges.highY, edge) > bottomY) {
      strip.edge[kept] = edge;
      strip.bottomX[kept] = real(strip.topX, index);
      kept += 1;
    }
  }
  strip.count = kept;
}

/**
 * Works out where each edge leaves the strip, and sorts them by insertion at its lower side.
 *
 * @returns whether some of them cross
 */
function placeEdges(strip: Strip, edges: SweepEdges, topY: number): boolean {
  const { edge, bottomX, topX } = strip;
  for (let index = 0; index < strip.count; index += 1) {
    const moved = whole(edge, index);
    const movedBottom = real(bottomX, index);
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
  for (let index = 1; index < strip.count; index += 1) {
    if (real(topX, index - 1) > real(topX, index)) return true;
  }
  return false;
}

/** The shares of the strip's height at which two of its edges cross, rising. */
function crossingShares({ count, topX, bottomX, order }: Strip): number[] {
  const shares: number[] = [];
  // An insertion sort by the upper side swaps exactly the pairs that cross within the strip.
  for (let index = 0; index < count; index += 1) {
    const movedTop = real(topX, index);
    let place = index;
    while (place > 0) {
      const passed = whole(order, place - 1);
      const gapTop = real(topX, passed) - movedTop;
      if (gapTop <= 0) break;
      const gapBottom = real(bottomX, index) - real(bottomX, passed);
      if (gapBottom > 0) shares.push(gapBottom / (gapBottom + gapTop));
      order[place] = passed;
      place -= 1;
    }
    order[place] = index;
  }
  return shares.sort((a, b) => a - b);
}

/** Sorts the edges by insertion at a share of the strip's height. */
function sortAt({ count, edge, bottomX, topX }: Strip, share: number): void {
  for (let index = 1; index < count; index += 1) {
    const moved = whole(edge, index);
    const movedBottom = real(bottomX, index);
    const movedTop = real(topX, index);
    const movedX = between(movedBottom, movedTop, share);
    let place = index;
    while (place > 0 && between(real(bottomX, place - 1), real(topX, place - 1), share) > movedX) {
      edge[place] = whole(edge, place - 1);
      bottomX[place] = real(bottomX, place - 1);
      topX[place] = real(topX, place - 1);
      place -= 1;
    }
    edge[place] = moved;
    bottomX[place] = movedBottom;
    topX[place] = movedTop;
  }
}

/** Adds a part of a strip in which no edges cross: a trapezoid's mean width is that half way up. */
function addTrapezoids(
  { count, edge, bottomX, topX }: Strip,
  edges: SweepEdges,
  box: Box,
  middleShare: number,
  heightM: number,
  windings: Int32Array,
  outcomes: Int8Array,
  areas: Float64Array,
): void {
  let inside = 0;
  for (let counter = 0; counter < windings.length; counter += 1) {
    const winding = whole(edges.leftWindings, counter);
    windings[counter] = winding;
    if (winding > 0) inside |= 1 << counter;
  }
  let previousX = box.minX;
  for (let index = 0; index <= count; index += 1) {
    const x =
      index < count ? between(real(bottomX, index), real(topX, index), middleShare) : box.maxX;
    if (x > previousX) {
      const area = outcomes[inside] ?? -1;
      if (area >= 0) areas[area] = real(areas, area) + (x - previousX) * heightM;
      previousX = x;
    }
    if (index < count) {
      const current = whole(edge, index);
      const counter = whole(edges.counter, current);
      const winding = whole(windings, counter) - whole(edges.winding, current);
      windings[counter] = winding;
      if (winding > 0) inside |= 1 << counter;
      else inside &= ~(1 << counter);
    }
  }
}

function xAt(edges: SweepEdges, edge: number, y: number): number {
  if (y >= real(edges.highY, edge)) return real(edges.highX, edge);
  return real(edges.lowX, edge) + (y - real(edges.lowY, edge)) * real(edges.slope, edge);
}

const between = (from: number, to: number, share: number): number => from + (to - from) * share;

// One reader for each kind of array keeps the hot loops on one type. The sweep's own counts keep
// every index inside its array.
const real = (numbers: Float64Array, index: number): number => numbers[index] ?? NaN;
const whole = (numbers: Int32Array, index: number): number => numbers[index] ?? 0;
