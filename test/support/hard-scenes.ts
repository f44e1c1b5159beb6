import type { Ring } from '../../shared/geometry/ring.ts';
import type { SceneBlock } from '../../shared/shadow/shadow-layer.ts';
import { makeBlock, makeRectangle } from './plane-scenes.ts';

/** Suns that stand along walls, across corners, near the horizon and near the zenith. */
export const hardSuns = [0, 45, 90, 135, 180, 225, 270, 315, 17, 197, 163.3].flatMap((azimuthDeg) =>
  [0.5, 3, 11.25, 26.565051177077994, 45, 71, 89].map((altitudeDeg) => ({
    azimuthDeg,
    altitudeDeg,
  })),
);

/** A rectangle with every side cut into pieces by points that lie on it, and each point twice. */
function fussyRectangle(x: number, y: number, widthM: number, depthM: number): Ring {
  return [
    [x, y],
    [x, y],
    [x + widthM / 3, y],
    [x + widthM, y],
    [x + widthM, y + depthM / 7],
    [x + widthM, y + depthM / 7],
    [x + widthM, y + depthM],
    [x + widthM / 2, y + depthM],
    [x, y + depthM],
    [x, y + depthM / 2],
  ];
}

/** Massings that break polygon code, by what is hard about them. */
export const hardScenes: Record<string, SceneBlock[]> = {
  'houses in a row that share their walls': Array.from({ length: 6 }, (_, index) =>
    makeBlock(
      [makeRectangle(index * 7, 0, 7, 11)],
      0,
      6 + (index % 3),
      index % 2 === 0 ? 'context' : 'proposed',
    ),
  ),
  'a row whose shared walls are turned to the sun': Array.from({ length: 6 }, (_, index) =>
    makeBlock(
      [
        makeRectangle(
          index * 7 * Math.cos(0.3),
          index * 7 * Math.sin(0.3),
          7,
          11,
          (0.3 * 180) / Math.PI,
        ),
      ],
      0,
      6 + index / 7,
    ),
  ),
  'the same block three times': [0, 1, 2].map(() => makeBlock([makeRectangle(2, 3, 10, 8)], 0, 12)),
  'a wall a millimetre thick': [makeBlock([makeRectangle(0, 0, 30, 0.001)], 0, 3)],
  'a splinter a tenth of a millimetre thick across a block': [
    makeBlock([makeRectangle(-5, 4, 40, 0.0001, 3)], 0, 9),
    makeBlock([makeRectangle(0, 0, 12, 9)], 0, 4, 'context'),
  ],
  'points on a straight wall, and points given twice': [
    makeBlock([fussyRectangle(0, 0, 14, 21)], 0, 8),
    makeBlock([fussyRectangle(14, 0, 14, 21)], 0, 8, 'context'),
  ],
  'a courtyard that touches its outer wall in a point': [
    makeBlock(
      [
        makeRectangle(0, 0, 20, 20),
        [
          [0, 10],
          [10, 5],
          [15, 10],
          [10, 15],
        ],
      ],
      0,
      7,
    ),
  ],
  'a courtyard along its outer wall': [
    makeBlock([makeRectangle(0, 0, 20, 20), makeRectangle(0, 5, 8, 10)], 0, 7),
  ],
  'two courtyards that meet in a corner': [
    makeBlock(
      [makeRectangle(0, 0, 30, 30), makeRectangle(5, 5, 10, 10), makeRectangle(15, 15, 10, 10)],
      0,
      5,
    ),
  ],
  'a house in a courtyard in a courtyard': [
    makeBlock([makeRectangle(0, 0, 60, 60), makeRectangle(6, 6, 48, 48)], 0, 14, 'context'),
    makeBlock([makeRectangle(12, 12, 36, 36), makeRectangle(18, 18, 24, 24)], 0, 9),
    makeBlock([makeRectangle(24, 24, 12, 12)], 0, 22),
  ],
  'a courtyard that its own shadow closes': [
    makeBlock([makeRectangle(0, 0, 16, 16), makeRectangle(6, 6, 4, 4)], 0, 60),
  ],
  'a tower on a podium of the same outline, and one set back': [
    makeBlock([makeRectangle(0, 0, 20, 20)], 0, 10),
    makeBlock([makeRectangle(0, 0, 20, 20)], 10, 30),
    makeBlock([makeRectangle(5, 5, 10, 10)], 30, 80),
  ],
  'a slab in the air over a lower one': [
    makeBlock([makeRectangle(0, 0, 20, 10)], 20, 20.3),
    makeBlock([makeRectangle(0, 0, 20, 10)], 4, 4.3, 'context'),
  ],
  'a flat sheet without height beside a house': [
    makeBlock([makeRectangle(0, 0, 20, 10)], 6, 6.0000001),
    makeBlock([makeRectangle(20, 0, 9, 10)], 0, 6, 'context'),
  ],
  'houses that overlap by a hair and stand apart by one': [
    makeBlock([makeRectangle(0, 0, 10, 10)], 0, 8),
    makeBlock([makeRectangle(9.99999, 0, 10, 10)], 0, 8, 'context'),
    makeBlock([makeRectangle(20.00001, 0, 10, 10)], 0, 8),
  ],
  'a proposal that is just what stands there': [
    makeBlock([makeRectangle(0, 0, 10, 10)], 0, 8, 'existing'),
    makeBlock([makeRectangle(0, 0, 10, 10)], 0, 8, 'proposed'),
  ],
  'a star of thin wings': [
    makeBlock(
      [
        Array.from({ length: 24 }, (_, index): [number, number] => {
          const angle = (index / 24) * 2 * Math.PI;
          const reachM = index % 2 === 0 ? 20 : 3;
          return [reachM * Math.cos(angle), reachM * Math.sin(angle)];
        }),
      ],
      0,
      10,
    ),
  ],
};

/** The same scene elsewhere on the plane. */
export function moveScene(blocks: readonly SceneBlock[], byX: number, byY: number): SceneBlock[] {
  return blocks.map((block) =>
    makeBlock(
      block.rings.map((ring) => ring.map(([x, y]): [number, number] => [x + byX, y + byY])),
      block.baseM,
      block.topM,
      block.role,
    ),
  );
}
