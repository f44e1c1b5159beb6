import type { PlanePoint, Ring } from '../geometry/ring.ts';

/** A trapezoid between two neighbouring edges in which the winding numbers don't change. */
export interface SweepCell {
  areaM2: number;
  /** Mean width from edge to edge. */
  widthM: number;
  heightM: number;
  /** Its middle. */
  at: PlanePoint;
  corners: () => PlanePoint[];
}

interface SweepEdge {
  x1: number;
  y1: number;
  x2: number;
  y2: number;
  /** What crossing it from west to east adds to the winding number. */
  turn: 1 | -1;
  layer: number;
  /** Where it stands in the slab at hand. */
  x: number;
}

/** Edge visits after which a sweep gives up: about a second's work. */
const mostWork = 50_000_000;

/**
 * Cuts the plane into trapezoids along y at every vertex and crossing of all rings, and hands each one to `visit`
 * with the winding number of each layer in it. Shared and coincident edges, touching rings and rings that cross
 * themselves need no special care: nothing is built, only counted.
 * @param layers Each layer is a set of rings that are counted together.
 * @returns false when the rings cross so often that the work was given up; what was visited is then not complete.
 */
export function sweepFootprints(
  layers: readonly (readonly Ring[])[],
  visit: (windings: readonly number[], cell: SweepCell) => void,
): boolean {
  const edges = layers.flatMap((rings, layer) => rings.flatMap((ring) => listEdges(ring, layer)));
  edges.sort((a, b) => a.y1 - b.y1);
  const cuts = listCuts(edges);
  if (cuts === null) return false;

  let work = 0;
  let next = 0;
  let active: SweepEdge[] = [];
  for (let i = 0; i + 1 < cuts.length; i++) {
    const south = cuts[i] ?? NaN;
    const north = cuts[i + 1] ?? NaN;
    active = active.filter((edge) => edge.y2 > south);
    for (let edge = edges[next]; edge !== undefined && edge.y1 <= south; edge = edges[++next]) {
      active.push(edge);
    }
    work += active.length;
    if (work > mostWork) return false;
    visitSlab(active, south, north, layers.length, visit);
  }
  return true;
}

/**
 * The area in which `isCounted` holds for the layers' winding numbers, and the middle of its largest piece.
 * @returns null when the rings cross too often to be measured.
 */
export function measureWhere(
  layers: readonly (readonly Ring[])[],
  isCounted: (windings: readonly number[]) => boolean,
): { areaM2: number; at: PlanePoint | null } | null {
  let areaM2 = 0;
  let largest: SweepCell | null = null;
  const isComplete = sweepFootprints(layers, (windings, cell) => {
    if (!isCounted(windings)) return;
    areaM2 += cell.areaM2;
    if (largest === null || cell.areaM2 > largest.areaM2) largest = cell;
  });
  if (!isComplete) return null;
  return { areaM2, at: atOf(largest) };
}

function atOf(cell: SweepCell | null): PlanePoint | null {
  return cell === null ? null : cell.at;
}

function listEdges(ring: Ring, layer: number): SweepEdge[] {
  const edges: SweepEdge[] = [];
  let previous = ring.at(-1);
  for (const point of ring) {
    const [ax, ay] = previous ?? point;
    const [bx, by] = point;
    previous = point;
    // A level edge bounds no trapezoid on its west or east. (NaN falls out here as well.)
    if (ay < by) edges.push({ x1: ax, y1: ay, x2: bx, y2: by, turn: -1, layer, x: 0 });
    else if (ay > by) edges.push({ x1: bx, y1: by, x2: ax, y2: ay, turn: 1, layer, x: 0 });
  }
  return edges;
}

/** Every y at which the order of the edges can change, ascending; null when there are too many crossings. */
function listCuts(edges: readonly SweepEdge[]): number[] | null {
  const cuts: number[] = [];
  let work = 0;
  for (let i = 0; i < edges.length; i++) {
    const a = edges[i];
    if (a === undefined) break;
    cuts.push(a.y1, a.y2);
    for (let j = i + 1; j < edges.length; j++) {
      const b = edges[j];
      if (b === undefined || b.y1 >= a.y2) break;
      work++;
      const y = crossingY(a, b);
      if (y === null) continue;
      cuts.push(y);
      // A crossing costs a slab, and a slab costs a visit to every edge in it.
      work += 100;
    }
    if (work > mostWork) return null;
  }
  cuts.sort((a, b) => a - b);
  return cuts.filter((y, index) => index === 0 || y !== cuts[index - 1]);
}

/** Where two edges cross, if they do so strictly between the ends of both. */
function crossingY(a: SweepEdge, b: SweepEdge): number | null {
  if (Math.max(a.x1, a.x2) < Math.min(b.x1, b.x2)) return null;
  if (Math.max(b.x1, b.x2) < Math.min(a.x1, a.x2)) return null;
  const south = Math.max(a.y1, b.y1);
  const north = Math.min(a.y2, b.y2);
  const gapSouth = xAt(a, south) - xAt(b, south);
  const gapNorth = xAt(a, north) - xAt(b, north);
  if (!(gapSouth * gapNorth < 0)) return null;
  const y = south + ((north - south) * gapSouth) / (gapSouth - gapNorth);
  return y > south && y < north ? y : null;
}

function xAt(edge: SweepEdge, y: number): number {
  if (y === edge.y1) return edge.x1;
  if (y === edge.y2) return edge.x2;
  return edge.x1 + ((edge.x2 - edge.x1) * (y - edge.y1)) / (edge.y2 - edge.y1);
}

function visitSlab(
  active: SweepEdge[],
  south: number,
  north: number,
  layers: number,
  visit: (windings: readonly number[], cell: SweepCell) => void,
): void {
  const middle = (south + north) / 2;
  for (const edge of active) edge.x = xAt(edge, middle);
  active.sort((a, b) => a.x - b.x);
  const windings = new Array<number>(layers).fill(0);
  for (let i = 0; i + 1 < active.length; i++) {
    const west = active[i];
    const east = active[i + 1];
    if (west === undefined || east === undefined) break;
    windings[west.layer] = (windings[west.layer] ?? 0) + west.turn;
    const widthM = east.x - west.x;
    if (!(widthM > 0)) continue;
    visit(windings, {
      // Edges are straight and don't cross within the slab, so the width at its middle is the mean one.
      areaM2: widthM * (north - south),
      widthM,
      heightM: north - south,
      at: [(west.x + east.x) / 2, middle],
      corners: () =>
        [west, east].flatMap((edge): PlanePoint[] => [
          [xAt(edge, south), south],
          [xAt(edge, north), north],
        ]),
    });
  }
}
