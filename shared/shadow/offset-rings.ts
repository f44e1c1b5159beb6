import type { Ring } from '../geometry/ring.ts';
import { makePaths, metreGrid } from './clipper-paths.ts';
import type { Clipper } from './clipper.ts';
import { pointsOfRing } from './shadow-contours.ts';

/** A round corner has so many segments a quarter. */
const segmentsPerQuarter = 32;

/**
 * The outline of everything within a distance of some rings, by Clipper2's round offset: outer rings
 * counter-clockwise, holes clockwise. Its corners are polygons inscribed in the true arcs, which
 * they cut by at most 0.03 % of the distance.
 *
 * @param distanceM above 0
 */
export function offsetRings(clipper: Clipper, rings: readonly Ring[], distanceM: number): Ring[] {
  const paths = makePaths(
    clipper,
    rings.map((ring) => ring.flat()),
  );
  // Clipper2 is told how far a segment may cut the arc.
  const arcToleranceM = distanceM * (1 - Math.cos(Math.PI / (4 * segmentsPerQuarter)));
  const offset = clipper.InflatePathsD(
    paths,
    distanceM,
    clipper.JoinType.Round,
    clipper.EndType.Polygon,
    2,
    metreGrid.decimals,
    arcToleranceM,
  );
  const outlines: Ring[] = [];
  for (let index = 0; index < offset.size(); index += 1) {
    const path = offset.get(index);
    const triples = path.view();
    const coordinates: number[] = [];
    for (let at = 0; at + 1 < triples.length; at += 3) {
      coordinates.push(triples[at] ?? NaN, triples[at + 1] ?? NaN);
    }
    outlines.push(pointsOfRing(coordinates, (x, y) => [x, y]));
    path.delete();
  }
  [paths, offset].forEach((object) => object.delete());
  return outlines;
}
