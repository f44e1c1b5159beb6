import { createLocalPlane } from '../../shared/geometry/local-plane.ts';
import type { PlanePoint, Ring } from '../../shared/geometry/ring.ts';
import type { EvidenceBlock, StudyInput } from '../../shared/study/evidence-schema.ts';
import { readStudyInput } from '../../shared/study/read-study-input.ts';
import { createSeededRandom } from '../support/seeded-random.ts';

type BlockRole = EvidenceBlock['properties']['role'];

interface DrawnBlock {
  role: BlockRole;
  rings: Ring[];
  baseM: number;
  topM: number;
}

/** An invented place at 44° N. */
const place = {
  name: 'Quernby',
  timezone: 'Etc/GMT+5',
  longitude: -75,
  latitude: 44,
  elevation: 100,
};

// A street block with its street: eight parcels in two rows back to back.
const pitchX = 100;
const pitchY = 76;
const parcelWidthM = 21;
const parcelDepthM = 31;

/** The hours with the sun up at the four key dates of 2026: 45 to 47 of them at 44° N. */
function listInstants(): string[] {
  const hoursOfDay: [string, number, number][] = [
    ['03-20', 7, 17],
    ['06-21', 5, 19],
    ['09-23', 7, 17],
    ['12-21', 8, 15],
  ];
  return hoursOfDay.flatMap(([day, first, last]) =>
    Array.from(
      { length: last - first + 1 },
      (_, index) => `2026-${day}T${String(first + index).padStart(2, '0')}:00:00-05:00`,
    ),
  );
}

/**
 * A seeded town of even density: houses with wings, courtyards, party walls, set-back tiers and
 * overhangs, one to a parcel, and in its middle five new blocks to 80 m in the place of six.
 *
 * @param sideM length of the town's side; 1,200 m gives some 2,000 blocks
 */
export function makeTown(sideM: number): StudyInput {
  const random = createSeededRandom(44);
  const plane = createLocalPlane(place.longitude, place.latitude);
  const columns = Math.round(sideM / pitchX);
  const rows = Math.round(sideM / pitchY);
  const blocks: DrawnBlock[] = [];
  const parcels: Ring[] = [];
  const middle = { column: Math.floor(columns / 2), row: Math.floor(rows / 2) };
  for (let column = 0; column < columns; column += 1) {
    for (let row = 0; row < rows; row += 1) {
      const isSite = column === middle.column && row === middle.row;
      const place = placeOn(
        (column - columns / 2) * pitchX + pitchX / 2,
        (row - rows / 2) * pitchY + pitchY / 2,
        random() < 0.5 ? 0 : random() * 6 - 3,
      );
      for (let parcel = 0; parcel < 8; parcel += 1) {
        const x = ((parcel % 4) - 2) * parcelWidthM;
        const y = parcel < 4 ? -parcelDepthM : 0;
        const drawn = drawHouse(random, x, y, isSite && parcel < 6 ? 'existing' : 'context');
        blocks.push(...drawn.map((block) => ({ ...block, rings: block.rings.map(place) })));
        if (!isSite || parcel >= 6) {
          parcels.push(place(rectangle(x, y, parcelWidthM, parcelDepthM)));
        }
      }
      if (isSite) {
        blocks.push(...drawProposal().map((one) => ({ ...one, rings: one.rings.map(place) })));
      }
    }
  }
  const polygon = (rings: readonly Ring[]) => ({
    type: 'Polygon' as const,
    coordinates: rings.map((ring) => {
      const points = ring.map((point) => plane.toLngLat(point));
      return [...points, ...points.slice(0, 1)];
    }),
  });
  const result = readStudyInput({
    format: 'noonmark-study/1',
    place,
    year: 2026,
    instants: listInstants(),
    blocks: {
      features: blocks.map(({ role, rings, baseM, topM }, index) => ({
        properties: { id: `b${index}`, role, base: baseM, top: topM },
        geometry: polygon(rings),
      })),
    },
    receptors: {
      features: parcels.map((ring, index) => ({
        properties: { id: `r${index}`, class: 'parcel', label: '' },
        geometry: polygon([ring]),
      })),
    },
    rule: {
      id: 'bench',
      version: 1,
      title: 'Hours at midwinter',
      clauses: [
        {
          id: 'midwinter',
          title: 'Two hours at midwinter',
          receptors: { classes: ['parcel'] },
          days: [{ date: '12-21' }],
          // On the listed hours, so that no instant comes on top of them.
          window: { basis: 'civil', from: '09:00', to: '15:00' },
          step: 60,
          measure: { kind: 'sun-hours' },
          limit: { anyOf: [{ atLeast: 2 }, { losesAtMost: 0.5 }] },
        },
      ],
    },
  });
  if (!result.ok) throw new Error(JSON.stringify(result.issues.slice(0, 3)));
  return result.input;
}

function placeOn(centreX: number, centreY: number, turnDeg: number): (ring: Ring) => Ring {
  const turn = (turnDeg * Math.PI) / 180;
  return (ring) =>
    ring.map(([x, y]): PlanePoint => [
      centreX + x * Math.cos(turn) - y * Math.sin(turn),
      centreY + x * Math.sin(turn) + y * Math.cos(turn),
    ]);
}

function rectangle(x: number, y: number, widthM: number, depthM: number): Ring {
  return [
    [x, y],
    [x + widthM, y],
    [x + widthM, y + depthM],
    [x, y + depthM],
  ];
}

/** One house on a parcel: up to three blocks. */
function drawHouse(random: () => number, x: number, y: number, role: BlockRole): DrawnBlock[] {
  // A third fill their parcel's width and so share walls with the houses beside them.
  const gapM = random() < 0.33 ? 0 : 1 + random() * 3;
  const widthM = parcelWidthM - 2 * gapM;
  const depthM = 12 + random() * 8;
  const left = x + gapM;
  const front = y < 0 ? y + 3 : y + parcelDepthM - 3 - depthM;
  const topM = 5 + random() * random() * 20;
  const kind = random();
  const footprint: Ring[] =
    kind < 0.25
      ? [
          // A wing on one side.
          [
            [left, front],
            [left + widthM, front],
            [left + widthM, front + depthM * 0.6],
            [left + widthM * 0.5, front + depthM * 0.6],
            [left + widthM * 0.5, front + depthM],
            [left, front + depthM],
          ],
        ]
      : kind < 0.5
        ? [
            rectangle(left, front, widthM, depthM),
            rectangle(left + 4, front + 4, widthM - 8, depthM - 8).toReversed(),
          ]
        : kind < 0.7
          ? [
              // A bay in the front.
              [
                [left, front],
                [left + 3, front],
                [left + 4, front - 1.5],
                [left + 7, front - 1.5],
                [left + 8, front],
                [left + widthM, front],
                [left + widthM, front + depthM],
                [left + widthM / 2, front + depthM + 2],
                [left, front + depthM],
              ],
            ]
          : [rectangle(left, front, widthM, depthM)];
  const blocks: DrawnBlock[] = [{ role, rings: footprint, baseM: 0, topM }];
  if (random() < 0.17) {
    const tier = rectangle(left + 1, front + 1, 3 + random() * (widthM - 6), 2.5);
    blocks.push({ role, rings: [tier], baseM: topM, topM: topM + 3 });
  }
  if (random() < 0.15) {
    const bridge = rectangle(left + 1, front + depthM, 4, 3);
    blocks.push({ role, rings: [bridge], baseM: 2.5, topM: Math.max(topM - 1, 3.5) });
  }
  return blocks;
}

function drawProposal(): DrawnBlock[] {
  const tier = (ring: Ring, baseM: number, topM: number): DrawnBlock => ({
    role: 'proposed',
    rings: [ring],
    baseM,
    topM,
  });
  return [
    tier(rectangle(-40, -29, 60, 27), 0, 14),
    tier(rectangle(-40, 2, 38, 27), 0, 14),
    tier(rectangle(-36, -26, 20, 20), 14, 80),
    tier(rectangle(-6, -24, 18, 18), 14, 52),
    tier(rectangle(-30, 6, 22, 18), 14, 36),
  ];
}
