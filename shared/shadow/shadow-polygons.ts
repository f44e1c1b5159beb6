import type { PathsD, PolyPathD } from 'clipper2-wasm/dist/clipper2z';
import { boxesOverlap, joinBoxes, type Box, type PlanePoint, type Ring } from '../geometry/ring.ts';
import type { Clipper } from './clipper.ts';
import type { BlockShadow, ShadowLayer, ShadowRole } from './shadow-layer.ts';

/** Polygons on the local plane: each a shell followed by its holes. */
export type PlanePolygons = Ring[][];

/** What is drawn at one instant. */
export interface ShadowPolygons {
  before: PlanePolygons;
  after: PlanePolygons;
  /** In shade after, in sun before. */
  netNew: PlanePolygons;
}

/** Decimal places of a metre that Clipper2 keeps: coarser ones cost visible area (0.04 m² at 3). */
const decimals = 5;

/** Holes and slivers below this area (m²) are rounding and are not drawn. */
const leastAreaM2 = 1e-3;

/**
 * The shadows of a layer as polygons valid by OGC's rules, by Clipper2 with the NonZero fill: the
 * union before, the union after, and what the proposal adds.
 *
 * @throws when Clipper2 reports a failure
 */
export function drawShadowPolygons(clipper: Clipper, layer: ShadowLayer): ShadowPolygons {
  const context = contoursOf(layer.shadows, 'context');
  const existing = contoursOf(layer.shadows, 'existing');
  const proposed = layer.shadows.filter(({ role }) => role === 'proposed');
  const proposedContours = proposed.flatMap(({ contours }) => contours);
  const reach = proposed
    .map(({ box }) => box)
    .reduce<Box | null>((joined, box) => (joined === null ? box : joinBoxes(joined, box)), null);
  // Only what overlaps the proposal's shadow can take from the net new shadow.
  const standing = layer.shadows
    .filter(({ role, box }) => role !== 'proposed' && reach !== null && boxesOverlap(box, reach))
    .flatMap(({ contours }) => contours);
  return {
    before: combine(clipper, 'Union', [...context, ...existing], []),
    after: combine(clipper, 'Union', [...context, ...proposedContours], []),
    netNew: combine(clipper, 'Difference', proposedContours, standing),
  };
}

/** The part of polygons that lies in an area, in m²; the second way to a receptor's figures. */
export function overlapAreaM2(
  clipper: Clipper,
  polygons: PlanePolygons,
  areaRings: readonly Ring[],
): number {
  const subjects = pathsOf(clipper, polygons.flat());
  const clips = pathsOf(clipper, areaRings);
  const overlap = clipper.IntersectD(subjects, clips, clipper.FillRule.Positive, decimals);
  const areaM2 = clipper.AreaPathsD(overlap);
  [subjects, clips, overlap].forEach((paths) => paths.delete());
  return areaM2;
}

/** The union of polygons that may touch or overlap, as valid rings. */
export function uniteRings(clipper: Clipper, rings: readonly Ring[]): Ring[] {
  return combine(clipper, 'Union', rings, []).flat();
}

function contoursOf(shadows: readonly BlockShadow[], role: ShadowRole): Ring[] {
  return shadows.filter((one) => one.role === role).flatMap(({ contours }) => contours);
}

function combine(
  clipper: Clipper,
  operation: 'Union' | 'Difference',
  subjects: readonly Ring[],
  clips: readonly Ring[],
): PlanePolygons {
  if (subjects.length === 0) return [];
  const engine = new clipper.ClipperD(decimals);
  const subjectPaths = pathsOf(clipper, subjects);
  const clipPaths = pathsOf(clipper, clips);
  const tree = new clipper.PolyPathD();
  try {
    engine.AddSubject(subjectPaths);
    engine.AddClip(clipPaths);
    if (!engine.ExecutePoly(clipper.ClipType[operation], clipper.FillRule.NonZero, tree)) {
      throw new Error(`Clipper2 could not compute the ${operation.toLowerCase()} of shadows.`);
    }
    return polygonsOfTree(tree);
  } finally {
    [engine, subjectPaths, clipPaths, tree].forEach((object) => object.delete());
  }
}

function pathsOf(clipper: Clipper, rings: readonly Ring[]): PathsD {
  const paths = new clipper.PathsD();
  for (const ring of rings) {
    const path = new clipper.PathD();
    const coordinates = new Float64Array(ring.length * 3);
    ring.forEach(([x, y], index) => {
      coordinates[index * 3] = x;
      coordinates[index * 3 + 1] = y;
    });
    path.assign(coordinates);
    paths.push_back(path);
    path.delete();
  }
  return paths;
}

/** Shells stand at even depths of the tree, each with its holes below it. */
function polygonsOfTree(tree: PolyPathD): PlanePolygons {
  const polygons: PlanePolygons = [];
  for (let index = 0; index < tree.count(); index += 1) {
    const shell = tree.child(index);
    const rings = [ringOf(shell)];
    for (let hole = 0; hole < shell.count(); hole += 1) {
      const holeNode = shell.child(hole);
      if (Math.abs(holeNode.area()) >= leastAreaM2) rings.push(ringOf(holeNode));
      polygons.push(...polygonsOfTree(holeNode));
    }
    if (Math.abs(shell.area()) >= leastAreaM2) polygons.push(rings);
  }
  return polygons;
}

function ringOf(node: PolyPathD): Ring {
  const path = node.polygon();
  const coordinates = path.view();
  const ring: PlanePoint[] = [];
  for (let index = 0; index + 1 < coordinates.length; index += 3) {
    ring.push([coordinates[index] ?? 0, coordinates[index + 1] ?? 0]);
  }
  path.delete();
  return ring;
}
