import type { PlanePoint, Ring } from './ring.ts';

/**
 * Whether no two edges of the rings cross and no hole lies outside its shell's winding: the
 * footprints for which the winding number is 1 inside and 0 outside. Compares all pairs of edges,
 * which is quick for a building's few corners. Edges that merely touch or overlap do not count as
 * crossing: they leave the winding number as it is.
 */
export function haveCrossingEdges(rings: readonly Ring[]): boolean {
  const edges = rings.flatMap((ring) =>
    ring.map((from, index) => ({ from, to: ring[(index + 1) % ring.length] ?? from })),
  );
  return edges.some((a, index) =>
    edges.slice(index + 1).some((b) => crossProperly(a.from, a.to, b.from, b.to)),
  );
}

/** The winding number of the rings around a point that lies on none of their edges. */
export function windingNumber(rings: readonly Ring[], [x, y]: PlanePoint): number {
  let winding = 0;
  for (const ring of rings) {
    let previous = ring[ring.length - 1];
    for (const point of ring) {
      if (previous !== undefined) {
        const upward = previous[1] <= y && point[1] > y;
        const downward = previous[1] > y && point[1] <= y;
        if (upward || downward) {
          const side = turn(previous, point, [x, y]);
          if (upward && side > 0) winding += 1;
          if (downward && side < 0) winding -= 1;
        }
      }
      previous = point;
    }
  }
  return winding;
}

/** Twice the area of the triangle a, b, c: positive when c lies on the left of the line from a to b. */
function turn(a: PlanePoint, b: PlanePoint, c: PlanePoint): number {
  return (b[0] - a[0]) * (c[1] - a[1]) - (b[1] - a[1]) * (c[0] - a[0]);
}

function crossProperly(a: PlanePoint, b: PlanePoint, c: PlanePoint, d: PlanePoint): boolean {
  return (
    turn(a, b, c) * turn(a, b, d) < 0 && turn(c, d, a) * turn(c, d, b) < 0
  );
}
