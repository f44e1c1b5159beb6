import type { Box } from '../geometry/ring.ts';

/** The rising edges that a sweep meets inside its box: lower end, upper end, winding, counter. */
export interface SweepEdges {
  count: number;
  lowX: Float64Array;
  lowY: Float64Array;
  highX: Float64Array;
  highY: Float64Array;
  /** Metres of x for each metre of y. */
  slope: Float64Array;
  /** +1 where the ring runs upward, −1 where it runs downward. */
  winding: Int32Array;
  counter: Int32Array;
  /** The winding number of each counter on the box's left side, from what passes it at full height. */
  leftWindings: Int32Array;
}

export function createSweepEdges(counterCount: number, capacity = 256): SweepEdges {
  return {
    count: 0,
    lowX: new Float64Array(capacity),
    lowY: new Float64Array(capacity),
    highX: new Float64Array(capacity),
    highY: new Float64Array(capacity),
    slope: new Float64Array(capacity),
    winding: new Int32Array(capacity),
    counter: new Int32Array(capacity),
    leftWindings: new Int32Array(counterCount),
  };
}

/**
 * Adds an edge, cut to the box; a level one adds nothing to an area and is left out. What lies left
 * of the box is moved onto its left side, where it still counts for everything to its right; what
 * lies right of it counts for nothing.
 */
export function addEdge(
  edges: SweepEdges,
  fromX: number,
  fromY: number,
  toX: number,
  toY: number,
  counter: number,
  box: Box,
): void {
  if (fromY < toY) addRisingEdge(edges, fromX, fromY, toX, toY, 1, counter, box);
  else if (fromY > toY) addRisingEdge(edges, toX, toY, fromX, fromY, -1, counter, box);
}

function addRisingEdge(
  edges: SweepEdges,
  lowX: number,
  lowY: number,
  highX: number,
  highY: number,
  winding: number,
  counter: number,
  box: Box,
): void {
  if (highY <= box.minY || lowY >= box.maxY) return;
  if (lowX >= box.maxX && highX >= box.maxX) return;
  const bottomY = lowY > box.minY ? lowY : box.minY;
  const topY = highY < box.maxY ? highY : box.maxY;
  if (lowX <= box.minX && highX <= box.minX) {
    pushOnLeftSide(edges, bottomY, topY, winding, counter, box);
    return;
  }
  const slope = (highX - lowX) / (highY - lowY);
  const bottomX = bottomY === lowY ? lowX : lowX + (bottomY - lowY) * slope;
  const topX = topY === highY ? highX : lowX + (topY - lowY) * slope;
  let startX = bottomX;
  let startY = bottomY;
  let endX = topX;
  let endY = topY;
  if (bottomX < box.minX || topX < box.minX) {
    const crossingY = heightAt(box.minX, lowX, lowY, slope, bottomY, topY);
    if (bottomX < box.minX) {
      pushOnLeftSide(edges, bottomY, topX < box.minX ? topY : crossingY, winding, counter, box);
      if (topX < box.minX) return;
      startX = box.minX;
      startY = crossingY;
    } else {
      pushOnLeftSide(edges, crossingY, topY, winding, counter, box);
      endX = box.minX;
      endY = crossingY;
    }
  }
  if (bottomX > box.maxX && topX > box.maxX) return;
  if (bottomX > box.maxX) {
    startX = box.maxX;
    startY = heightAt(box.maxX, lowX, lowY, slope, bottomY, topY);
  } else if (topX > box.maxX) {
    endX = box.maxX;
    endY = heightAt(box.maxX, lowX, lowY, slope, bottomY, topY);
  }
  push(edges, startX, startY, endX, endY, winding, counter);
}

/** What passes the whole left side is only counted. */
function pushOnLeftSide(
  edges: SweepEdges,
  fromY: number,
  toY: number,
  winding: number,
  counter: number,
  box: Box,
): void {
  if (fromY === box.minY && toY === box.maxY) {
    edges.leftWindings[counter] = (edges.leftWindings[counter] ?? 0) - winding;
  } else {
    push(edges, box.minX, fromY, box.minX, toY, winding, counter);
  }
}

/** Where an edge crosses an upright line, kept between its two ends. */
function heightAt(
  x: number,
  lowX: number,
  lowY: number,
  slope: number,
  bottomY: number,
  topY: number,
): number {
  return Math.min(Math.max(lowY + (x - lowX) / slope, bottomY), topY);
}

function push(
  edges: SweepEdges,
  lowX: number,
  lowY: number,
  highX: number,
  highY: number,
  winding: number,
  counter: number,
): void {
  if (highY <= lowY) return;
  if (edges.count === edges.lowX.length) grow(edges);
  const index = edges.count;
  edges.lowX[index] = lowX;
  edges.lowY[index] = lowY;
  edges.highX[index] = highX;
  edges.highY[index] = highY;
  edges.slope[index] = (highX - lowX) / (highY - lowY);
  edges.winding[index] = winding;
  edges.counter[index] = counter;
  edges.count = index + 1;
}

function grow(edges: SweepEdges): void {
  const { leftWindings, count } = edges;
  const larger = createSweepEdges(leftWindings.length, edges.lowX.length * 2);
  larger.lowX.set(edges.lowX);
  larger.lowY.set(edges.lowY);
  larger.highX.set(edges.highX);
  larger.highY.set(edges.highY);
  larger.slope.set(edges.slope);
  larger.winding.set(edges.winding);
  larger.counter.set(edges.counter);
  Object.assign(edges, { ...larger, leftWindings, count });
}
