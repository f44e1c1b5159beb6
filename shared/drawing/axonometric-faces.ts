import type { Ring } from '../geometry/ring.ts';
import type { SheetPoint, SheetRing } from './frame.ts';
import { orderWalls, splitAtCrossings, type WallInPlan } from './wall-order.ts';

/** A vertical prism on the local plane, in metres. */
export interface Prism {
  /** As `projectPolygon` gives them: outer rings counter-clockwise, holes clockwise. */
  rings: readonly Ring[];
  baseM: number;
  topM: number;
}

/** A direction of view with parallel rays. */
export interface View {
  /** Where the viewer stands, clockwise from true north: 180 looks from the south to the north. */
  fromDeg: number;
  /** How high the viewer looks down from, above the horizon: more than 0, less than 90. */
  altitudeDeg: number;
}

/** One face to paint; later ones hide earlier ones. */
export interface Face {
  /** Index of the prism. */
  prism: number;
  kind: 'wall' | 'roof';
  /** Metres as seen: x to the right, y downward. */
  rings: SheetRing[];
  /** Lines of the prism's own edges among the face's borders; borders that only part a wall for the order are left out. */
  edges: [SheetPoint, SheetPoint][];
  /** For walls, from −1 to 1: how much the wall faces the viewer's right. */
  facesRight: number;
}

/** Turns ground and height in metres into the picture's x and y, in metres. */
export function createPicture(view: View): (x: number, y: number, z: number) => SheetPoint {
  const { right, toward } = directions(view);
  const altitude = (view.altitudeDeg * Math.PI) / 180;
  return (x, y, z) => [
    x * right[0] + y * right[1],
    (x * toward[0] + y * toward[1]) * Math.sin(altitude) - z * Math.cos(altitude),
  ];
}

/**
 * The visible faces of prisms in the order in which they are painted.
 *
 * All prisms are cut at every height at which one begins or ends. From above, material can only
 * hide what is no higher than itself: so layers are painted from the lowest up, in each layer its
 * walls from far to near and then its roofs. That is right for prisms that stand on, in or beside
 * one another, with courtyards and overhangs.
 */
export function listFaces(prisms: readonly Prism[], view: View): Face[] {
  const heights = [...new Set(prisms.flatMap(({ baseM, topM }) => [baseM, topM]))].sort(
    (a, b) => a - b,
  );
  return heights.slice(1).flatMap((upperM, index) => {
    const lowerM = heights[index] ?? upperM;
    const here = prisms.flatMap((prism, number) =>
      prism.baseM <= lowerM && prism.topM >= upperM ? [{ prism, number }] : [],
    );
    const walls = splitAtCrossings(
      here.flatMap(({ prism, number }) => wallsTowardViewer(prism, number, view)),
    );
    const roofs = here.filter(({ prism }) => prism.topM === upperM);
    return [
      ...orderWalls(walls).flatMap((position) => {
        const wall = walls[position];
        return wall === undefined ? [] : [wallFace(wall, lowerM, upperM, view)];
      }),
      ...roofs.map(({ prism, number }) => roofFace(prism, number, view)),
    ];
  });
}

/** Metres by which a wall's layers overlap, because renderers leave a hair between areas that merely touch. */
const seamM = 0.1;

interface Wall extends WallInPlan {
  prism: number;
  baseM: number;
  topM: number;
  facesRight: number;
  /** The wall's ends in plan before it was split. */
  wholeFrom: { across: number; depth: number };
  wholeTo: { across: number; depth: number };
}

function directions({ fromDeg }: View): { right: [number, number]; toward: [number, number] } {
  const angle = (fromDeg * Math.PI) / 180;
  const toward: [number, number] = [Math.sin(angle), Math.cos(angle)];
  return { toward, right: [-toward[1], toward[0]] };
}

function wallsTowardViewer(prism: Prism, number: number, view: View): Wall[] {
  const { right, toward } = directions(view);
  const inPlan = (x: number, y: number) => ({
    across: x * right[0] + y * right[1],
    depth: -(x * toward[0] + y * toward[1]),
  });
  return prism.rings.flatMap((ring) =>
    ring.flatMap((a, index) => {
      const b = ring[(index + 1) % ring.length] ?? a;
      const length = Math.hypot(b[0] - a[0], b[1] - a[1]);
      // The solid lies on the left of every edge, so the wall faces its right.
      const normal = [(b[1] - a[1]) / length, (a[0] - b[0]) / length] as const;
      if (normal[0] * toward[0] + normal[1] * toward[1] < 1e-9) return [];
      const from = inPlan(a[0], a[1]);
      const to = inPlan(b[0], b[1]);
      return [
        {
          prism: number,
          baseM: prism.baseM,
          topM: prism.topM,
          facesRight: normal[0] * right[0] + normal[1] * right[1],
          from,
          to,
          wholeFrom: from,
          wholeTo: to,
        },
      ];
    }),
  );
}

function wallFace(wall: Wall, lowerM: number, upperM: number, view: View): Face {
  const altitude = (view.altitudeDeg * Math.PI) / 180;
  const seen = (at: { across: number; depth: number }, z: number): SheetPoint => [
    at.across,
    -at.depth * Math.sin(altitude) - z * Math.cos(altitude),
  ];
  const paintedFromM = lowerM === wall.baseM ? lowerM : lowerM - seamM;
  const corners: SheetRing = [
    seen(wall.from, paintedFromM),
    seen(wall.to, paintedFromM),
    seen(wall.to, upperM),
    seen(wall.from, upperM),
  ];
  const edges: [SheetPoint, SheetPoint][] = [];
  if (lowerM === wall.baseM) edges.push([seen(wall.from, lowerM), seen(wall.to, lowerM)]);
  if (upperM === wall.topM) edges.push([seen(wall.from, upperM), seen(wall.to, upperM)]);
  if (isSame(wall.from, wall.wholeFrom)) {
    edges.push([seen(wall.from, lowerM), seen(wall.from, upperM)]);
  }
  if (isSame(wall.to, wall.wholeTo)) edges.push([seen(wall.to, lowerM), seen(wall.to, upperM)]);
  return { prism: wall.prism, kind: 'wall', rings: [corners], edges, facesRight: wall.facesRight };
}

function roofFace(prism: Prism, number: number, view: View): Face {
  const picture = createPicture(view);
  const rings = prism.rings.map((ring) => ring.map(([x, y]) => picture(x, y, prism.topM)));
  const edges = rings.flatMap((ring) =>
    ring.map((from, index): [SheetPoint, SheetPoint] => [
      from,
      ring[(index + 1) % ring.length] ?? from,
    ]),
  );
  return { prism: number, kind: 'roof', rings, edges, facesRight: 0 };
}

function isSame(
  a: { across: number; depth: number },
  b: { across: number; depth: number },
): boolean {
  return a.across === b.across && a.depth === b.depth;
}
