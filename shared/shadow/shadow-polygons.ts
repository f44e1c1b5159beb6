import { boxesOverlap, boxOfRings, joinBoxes, type Box, type Ring } from '../geometry/ring.ts';
import { metreGrid, combineRings, makePaths, type FramePolygon } from './clipper-paths.ts';
import type { Clipper } from './clipper.ts';
import type { LitArea } from './receptor-light.ts';
import { castContour, pointsOfRing, type FrameRing } from './shadow-contours.ts';
import type { BlockShadow, ShadowLayer, ShadowRole } from './shadow-layer.ts';
import { pointFromFrame, type SunFrame } from './sun-frame.ts';

/** Polygons on the local plane: each a shell followed by its holes. */
export type PlanePolygons = readonly Ring[][];

/** What is drawn at one instant. A polygon that is the same before and after is one object. */
export interface ShadowPolygons {
  before: PlanePolygons;
  after: PlanePolygons;
  /** In shade after, in sun before. */
  netNew: PlanePolygons;
}

/**
 * The shadows of a layer as polygons valid by OGC's rules, by Clipper2 with the NonZero fill: the
 * union before, the union after, and what the proposal adds. They are combined in the sun's frame,
 * where the long sides of shadows are level and Clipper2's own sweep meets few of them at a time.
 *
 * @throws when Clipper2 reports a failure
 */
export function drawShadowPolygons(clipper: Clipper, layer: ShadowLayer): ShadowPolygons {
  const ofRole = (role: ShadowRole) => layer.shadows.filter((shadow) => shadow.role === role);
  const existing = ofRole('existing');
  const proposed = ofRole('proposed');
  const context = combineRings(clipper, 'Union', contoursOf(layer, ofRole('context')));
  const toPlane = planePolygonsOf(layer.frame);
  const proposedBox = boxOfShadows(proposed);
  // Only what overlaps the proposal's shadow can take from the net new shadow.
  const standing = layer.shadows.filter(
    ({ role, box }) =>
      role !== 'proposed' && proposedBox !== null && boxesOverlap(box, proposedBox),
  );
  return {
    before: toPlane(addShadows(clipper, layer, context, existing)),
    after: toPlane(addShadows(clipper, layer, context, proposed)),
    netNew:
      proposed.length === 0
        ? []
        : toPlane(
            combineRings(
              clipper,
              'Difference',
              contoursOf(layer, proposed),
              contoursOf(layer, standing),
            ),
          ),
  };
}

/**
 * The part of polygons that lies in each of some areas, in m²; the second way to a receptor's
 * figures.
 */
export function overlapAreasM2(
  clipper: Clipper,
  polygons: PlanePolygons,
  areas: readonly LitArea[],
): number[] {
  // What lies apart from all areas need not be handed over.
  const reach = areas.map(({ box }) => box).reduce<Box | null>(joinOrTake, null);
  const near = polygons.filter(
    ([shell = []]) => reach !== null && boxesOverlap(boxOfRings([shell]), reach),
  );
  const subjects = makePaths(clipper, coordinatesOf(near.flat()));
  const overlaps = areas.map(({ rings, siteRings }) => {
    const outside = siteRings.map((ring) => ring.toReversed());
    const clips = makePaths(clipper, coordinatesOf([...rings, ...outside]));
    const overlap = clipper.IntersectD(
      subjects,
      clips,
      clipper.FillRule.Positive,
      metreGrid.decimals,
    );
    const areaM2 = clipper.AreaPathsD(overlap);
    [clips, overlap].forEach((paths) => paths.delete());
    return areaM2;
  });
  subjects.delete();
  return overlaps;
}

/** A union with more shadows: polygons that none of them can reach stay as they are. */
function addShadows(
  clipper: Clipper,
  layer: ShadowLayer,
  united: readonly FramePolygon[],
  more: readonly BlockShadow[],
): readonly FramePolygon[] {
  const box = boxOfShadows(more);
  if (box === null) return united;
  // A border shared with one of them counts as reached, so that the two become one.
  const reach = { minX: box.minX - 1, minY: box.minY - 1, maxX: box.maxX + 1, maxY: box.maxY + 1 };
  const reached = new Set(united.filter((polygon) => boxesOverlap(boxOfShell(polygon), reach)));
  const joined = combineRings(clipper, 'Union', [
    ...[...reached].flat(),
    ...contoursOf(layer, more),
  ]);
  return [...united.filter((polygon) => !reached.has(polygon)), ...joined];
}

function contoursOf({ points }: ShadowLayer, shadows: readonly BlockShadow[]): FrameRing[] {
  return shadows.flatMap(({ rings, nearShiftM, farShiftM }) =>
    rings.map((ring) => castContour(points, ring, nearShiftM, farShiftM)),
  );
}

function boxOfShell([shell = []]: FramePolygon): Box {
  const box = { minX: Infinity, minY: Infinity, maxX: -Infinity, maxY: -Infinity };
  for (let index = 0; index + 1 < shell.length; index += 2) {
    const x = shell[index] ?? NaN;
    const y = shell[index + 1] ?? NaN;
    box.minX = Math.min(box.minX, x);
    box.maxX = Math.max(box.maxX, x);
    box.minY = Math.min(box.minY, y);
    box.maxY = Math.max(box.maxY, y);
  }
  return box;
}

function boxOfShadows(shadows: readonly BlockShadow[]): Box | null {
  return shadows.map(({ box }) => box).reduce<Box | null>(joinOrTake, null);
}

function joinOrTake(joined: Box | null, box: Box): Box {
  return joined === null ? box : joinBoxes(joined, box);
}

/** Turns polygons back onto the local plane; the same polygon gives the same object. */
function planePolygonsOf(frame: SunFrame): (polygons: readonly FramePolygon[]) => PlanePolygons {
  const known = new Map<FramePolygon, Ring[]>();
  return (polygons) =>
    polygons.map((polygon) => {
      const rings =
        known.get(polygon) ??
        polygon.map((ring) => pointsOfRing(ring, (x, y) => pointFromFrame(x, y, frame)));
      known.set(polygon, rings);
      return rings;
    });
}

function coordinatesOf(rings: readonly Ring[]): FrameRing[] {
  return rings.map((ring) => ring.flat());
}
