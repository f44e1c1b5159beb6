import type { PathsD, PolyPathD } from 'clipper2-wasm/dist/clipper2z';
import type { Clipper } from './clipper.ts';
import type { FrameRing } from './shadow-contours.ts';

/** A shell followed by its holes. */
export type FramePolygon = FrameRing[];

/** The grid on which Clipper2 works, and the area below which a polygon or a hole is rounding. */
export interface ClipperGrid {
  decimals: number;
  leastArea: number;
}

/** Metres; coarser decimals cost visible area (0.04 m² at 3). */
export const metreGrid: ClipperGrid = { decimals: 5, leastArea: 1e-3 };

/** Rings as paths of Clipper2, which the caller deletes. */
export function makePaths(clipper: Clipper, rings: Iterable<FrameRing>): PathsD {
  const paths = new clipper.PathsD();
  const path = new clipper.PathD();
  let triples = new Float64Array(192);
  for (const ring of rings) {
    const count = ring.length / 2;
    if (triples.length < count * 3) triples = new Float64Array(count * 6);
    for (let index = 0; index < count; index += 1) {
      triples[index * 3] = ring[index * 2] ?? NaN;
      triples[index * 3 + 1] = ring[index * 2 + 1] ?? NaN;
    }
    path.assign(triples.subarray(0, count * 3));
    paths.push_back(path);
  }
  path.delete();
  return paths;
}

/**
 * The union or difference of rings with the NonZero fill, as polygons valid by OGC's rules.
 *
 * @throws when Clipper2 reports a failure
 */
export function combineRings(
  clipper: Clipper,
  operation: 'Union' | 'Difference',
  subjects: Iterable<FrameRing>,
  clips: Iterable<FrameRing> = [],
  grid = metreGrid,
): FramePolygon[] {
  const engine = new clipper.ClipperD(grid.decimals);
  const subjectPaths = makePaths(clipper, subjects);
  const clipPaths = makePaths(clipper, clips);
  const tree = new clipper.PolyPathD();
  try {
    engine.AddSubject(subjectPaths);
    engine.AddClip(clipPaths);
    if (!engine.ExecutePoly(clipper.ClipType[operation], clipper.FillRule.NonZero, tree)) {
      throw new Error(`Clipper2 could not compute the ${operation.toLowerCase()} of shadows.`);
    }
    const polygons: FramePolygon[] = [];
    takePolygons(tree, grid.leastArea, polygons);
    return polygons;
  } finally {
    [engine, subjectPaths, clipPaths, tree].forEach((object) => object.delete());
  }
}

/** Shells stand at even depths of the tree, each with its holes below it. The tree owns its nodes. */
function takePolygons(tree: PolyPathD, leastArea: number, polygons: FramePolygon[]): void {
  const count = tree.count();
  for (let index = 0; index < count; index += 1) {
    const shell = tree.child(index);
    const isDrawn = Math.abs(shell.area()) >= leastArea;
    const rings = isDrawn ? [ringOf(shell)] : [];
    const holeCount = shell.count();
    for (let hole = 0; hole < holeCount; hole += 1) {
      const holeNode = shell.child(hole);
      if (isDrawn && Math.abs(holeNode.area()) >= leastArea) rings.push(ringOf(holeNode));
      takePolygons(holeNode, leastArea, polygons);
    }
    if (isDrawn) polygons.push(rings);
  }
}

function ringOf(node: PolyPathD): FrameRing {
  const path = node.polygon();
  const triples = path.view();
  const count = triples.length / 3;
  const ring: number[] = [];
  for (let index = 0; index < count; index += 1) {
    ring.push(triples[index * 3] ?? NaN, triples[index * 3 + 1] ?? NaN);
  }
  path.delete();
  return ring;
}
