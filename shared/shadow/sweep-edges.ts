import type { Box, Ring } from '../geometry/ring.ts';

/** The upright edges that a sweep meets inside its box: lower end, upper end, winding, counter. */
export interface SweepEdges {
  count: number;
  lowX: Float64Array;
  lowY: Float64Array;
  highX: Float64Array;
  highY: Float64Array;
  /** +1 where the ring runs upward, −1 where it runs downward. */
  winding: Int32Array;
  counter: Int32Array;
}

export function createSweepEdges(capacity = 256): SweepEdges {
  return {
    count: 0,
    lowX: new Float64Array(capacity),
    lowY: new Float64Array(capacity),
    highX: new Float64Array(capacity),
    highY: new Float64Array(capacity),
    winding: new Int32Array(capacity),
    counter: new Int32Array(capacity),
  };
}

/** Adds a ring's edges, cut to the box; edges along x add nothing to an area and are left out. */
export function addRing(edges: SweepEdges, ring: Ring, counter: number, box: Box): void {
  let from = ring[ring.length - 1];
  if (from === undefined) return;
  for (const to of ring) {
    if (from[1] < to[1]) addEdge(edges, from[0], from[1], to[0], to[1], 1, counter, box);
    else if (from[1] > to[1]) addEdge(edges, to[0], to[1], from[0], from[1], -1, counter, box);
    from = to;
  }
}

/**
 * Keeps the part of an edge inside the box. What lies left of it is moved onto its left side, where
 * it still counts for everything to its right; what lies right of it counts for nothing.
 */
function addEdge(
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
  const slope = (highX - lowX) / (highY - lowY);
  const bottomY = Math.max(lowY, box.minY);
  const topY = Math.min(highY, box.maxY);
  const bottomX = bottomY === lowY ? lowX : lowX + (bottomY - lowY) * slope;
  const topX = topY === highY ? highX : lowX + (topY - lowY) * slope;
  if (bottomX >= box.maxX && topX >= box.maxX) return;
  if (bottomX <= box.minX && topX <= box.minX) {
    push(edges, box.minX, bottomY, box.minX, topY, winding, counter);
    return;
  }
  let fromX = bottomX;
  let fromY = bottomY;
  let toX = topX;
  let toY = topY;
  if (bottomX < box.minX) {
    fromX = box.minX;
    fromY = heightAt(box.minX, lowX, lowY, slope, bottomY, topY);
    push(edges, box.minX, bottomY, box.minX, fromY, winding, counter);
  } else if (topX < box.minX) {
    toX = box.minX;
    toY = heightAt(box.minX, lowX, lowY, slope, bottomY, topY);
    push(edges, box.minX, toY, box.minX, topY, winding, counter);
  }
  if (bottomX > box.maxX) {
    fromX = box.maxX;
    fromY = heightAt(box.maxX, lowX, lowY, slope, bottomY, topY);
  } else if (topX > box.maxX) {
    toX = box.maxX;
    toY = heightAt(box.maxX, lowX, lowY, slope, bottomY, topY);
  }
  push(edges, fromX, fromY, toX, toY, winding, counter);
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
  edges.winding[index] = winding;
  edges.counter[index] = counter;
  edges.count = index + 1;
}

function grow(edges: SweepEdges): void {
  const larger = createSweepEdges(edges.lowX.length * 2);
  larger.lowX.set(edges.lowX);
  larger.lowY.set(edges.lowY);
  larger.highX.set(edges.highX);
  larger.highY.set(edges.highY);
  larger.winding.set(edges.winding);
  larger.counter.set(edges.counter);
  Object.assign(edges, { ...larger, count: edges.count });
}
