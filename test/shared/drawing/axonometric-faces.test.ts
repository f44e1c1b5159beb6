import { describe, expect, it } from 'vitest';
import {
  createPicture,
  listFaces,
  type Face,
  type Prism,
  type View,
} from '../../../shared/drawing/axonometric-faces.ts';
import type { SheetPoint, SheetRing } from '../../../shared/drawing/frame.ts';

type Point = readonly [number, number];

function rectangle(x: number, y: number, width: number, depth: number, turnDeg = 0): Point[] {
  const turn = (turnDeg * Math.PI) / 180;
  return [
    [0, 0],
    [width, 0],
    [width, depth],
    [0, depth],
  ].map(([u = 0, v = 0]) => [
    x + u * Math.cos(turn) - v * Math.sin(turn),
    y + u * Math.sin(turn) + v * Math.cos(turn),
  ]);
}

function prism(outline: Point[], baseM: number, topM: number, courtyard?: Point[]): Prism {
  return {
    rings: courtyard === undefined ? [outline] : [outline, [...courtyard].reverse()],
    baseM,
    topM,
  };
}

function isInside([x, y]: Point, rings: readonly (readonly Point[])[]): boolean {
  let inside = false;
  for (const ring of rings) {
    ring.forEach((a, index) => {
      const b = ring[(index + 1) % ring.length] ?? a;
      if (a[1] > y !== b[1] > y && x < a[0] + ((y - a[1]) / (b[1] - a[1])) * (b[0] - a[0])) {
        inside = !inside;
      }
    });
  }
  return inside;
}

/** What the painter shows at a point of the picture: the prism of the last face over it. */
function paintedAt(point: SheetPoint, faces: readonly Face[]): number | null {
  const shown = faces.filter((face) => isInside(point, face.rings)).at(-1);
  return shown?.prism ?? null;
}

/**
 * What a viewer sees there, by marching down the line of sight: the prisms at the first place that
 * lies in any of them. Shares nothing with the code under test but the view's definition.
 */
function seenAt([pictureX, pictureY]: SheetPoint, prisms: readonly Prism[], view: View): number[] {
  const from = (view.fromDeg * Math.PI) / 180;
  const altitude = (view.altitudeDeg * Math.PI) / 180;
  const toward = [Math.sin(from), Math.cos(from)] as const;
  const right = [-Math.cos(from), Math.sin(from)] as const;
  const highest = Math.max(...prisms.map(({ topM }) => topM));
  for (let z = highest - 0.01; z > 0; z -= 0.04) {
    const along = (pictureY + z * Math.cos(altitude)) / Math.sin(altitude);
    const ground: Point = [
      pictureX * right[0] + along * toward[0],
      pictureX * right[1] + along * toward[1],
    ];
    const here = prisms.flatMap((one, index) =>
      one.baseM <= z && z <= one.topM && isInside(ground, one.rings) ? [index] : [],
    );
    if (here.length > 0) return here;
  }
  return [];
}

/** A repeatable stream of numbers from 0 to 1 (Lehmer's generator). */
function createRandom(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state * 48_271) % 2_147_483_647;
    return state / 2_147_483_647;
  };
}

/** Shares of points at which painter and line of sight agree; points near an edge of any face are left out. */
function agreement(prisms: readonly Prism[], view: View, seed: number) {
  const faces = listFaces(prisms, view);
  const random = createRandom(seed);
  const points = faces.flatMap(({ rings }) => rings.flat());
  const xs = points.map(([x]) => x);
  const ys = points.map(([, y]) => y);
  let agreed = 0;
  let compared = 0;
  for (let count = 0; count < 300; count += 1) {
    const point: SheetPoint = [
      Math.min(...xs) + random() * (Math.max(...xs) - Math.min(...xs)),
      Math.min(...ys) + random() * (Math.max(...ys) - Math.min(...ys)),
    ];
    if (isNearEdge(point, faces)) continue;
    const seen = seenAt(point, prisms, view);
    const painted = paintedAt(point, faces);
    compared += 1;
    if (painted === null ? seen.length === 0 : seen.includes(painted)) agreed += 1;
  }
  return { agreed, compared };
}

function isNearEdge([x, y]: SheetPoint, faces: readonly Face[]): boolean {
  const near = (ring: SheetRing) =>
    ring.some((a, index) => {
      const b = ring[(index + 1) % ring.length] ?? a;
      const lengthSquared = (b[0] - a[0]) ** 2 + (b[1] - a[1]) ** 2;
      const share =
        lengthSquared === 0
          ? 0
          : Math.min(
              Math.max(
                ((x - a[0]) * (b[0] - a[0]) + (y - a[1]) * (b[1] - a[1])) / lengthSquared,
                0,
              ),
              1,
            );
      return Math.hypot(x - a[0] - share * (b[0] - a[0]), y - a[1] - share * (b[1] - a[1])) < 0.15;
    });
  return faces.some((face) => face.rings.some(near));
}

const view: View = { fromDeg: 155, altitudeDeg: 38 };

describe('createPicture', () => {
  it('from the south shows east on the right, north farther up, and height upward', () => {
    const picture = createPicture({ fromDeg: 180, altitudeDeg: 30 });
    expect(picture(1, 0, 0)[0]).toBeCloseTo(1, 9);
    expect(picture(0, 1, 0)[1]).toBeCloseTo(-0.5, 9);
    expect(picture(0, 0, 1)[1]).toBeCloseTo(-Math.sqrt(3) / 2, 9);
  });
});

describe('listFaces', () => {
  it('paints of a box its roof and the two walls that are seen', () => {
    const faces = listFaces([prism(rectangle(0, 0, 20, 10), 0, 8)], view);
    expect(faces.map(({ kind }) => kind)).toEqual(['wall', 'wall', 'roof']);
  });

  it.each<[string, Prism[]]>([
    [
      'a tower on a podium',
      [prism(rectangle(0, 0, 60, 40), 0, 14), prism(rectangle(30, 10, 20, 20), 14, 44)],
    ],
    [
      'a tower that stands on the ground inside a podium',
      [prism(rectangle(0, 0, 60, 40), 0, 14), prism(rectangle(30, 10, 20, 20), 0, 44)],
    ],
    [
      'a courtyard with a pavilion in it',
      [
        prism(rectangle(0, 0, 60, 60), 0, 12, rectangle(15, 15, 30, 30)),
        prism(rectangle(25, 25, 8, 8), 0, 20),
      ],
    ],
    [
      'an overhang beside a low house',
      [
        prism(rectangle(0, 0, 20, 20), 0, 10),
        prism(rectangle(-10, -10, 40, 40), 10, 16),
        prism(rectangle(12, -25, 14, 14), 0, 6),
      ],
    ],
    [
      'two wings that cross',
      [prism(rectangle(0, 20, 60, 14), 0, 12), prism(rectangle(22, 0, 14, 60, 8), 0, 20)],
    ],
    [
      'a row of houses with party walls',
      [0, 1, 2, 3, 4].map((index) => prism(rectangle(index * 9, 0, 9, 14), 0, 7 + (index % 3) * 2)),
    ],
  ])('hides what is hidden: %s', (_, prisms) => {
    for (const fromDeg of [155, 20, 250, 315]) {
      const { agreed, compared } = agreement(prisms, { ...view, fromDeg }, fromDeg + 1);
      expect(compared).toBeGreaterThan(100);
      expect(agreed).toBe(compared);
    }
  });

  it.each([1, 2, 3, 4, 5, 6])('hides what is hidden among scattered houses, scene %i', (seed) => {
    const random = createRandom(seed * 7919);
    const prisms = Array.from({ length: 14 }, (_, index) =>
      prism(
        rectangle(
          (index % 4) * 30 + random() * 8,
          Math.floor(index / 4) * 30 + random() * 8,
          8 + random() * 12,
          8 + random() * 12,
          random() * 20 - 10,
        ),
        0,
        4 + random() * 30,
      ),
    );
    const { agreed, compared } = agreement(
      prisms,
      { fromDeg: random() * 360, altitudeDeg: 25 + random() * 40 },
      seed,
    );
    expect(compared).toBeGreaterThan(80);
    expect(agreed).toBe(compared);
  });
});
