import type { City } from './city.ts';
import {
  acrossTwo,
  existingBlocks,
  halfFront,
  onParcel,
  siteAt,
  type Block,
  type Massing,
  type Site,
} from './massing.ts';
import type { Point, Shape } from './shape.ts';

export interface Proposal {
  site: Site;
  massings: Massing[];
}

const proposed = (
  id: string,
  name: string,
  [baseM, topM]: readonly [number, number],
  storeys: number,
  shape: Shape,
): Block => ({ id, name, role: 'proposed', baseM, topM, storeys, shape });

/** A podium over both wharf lots, bent as the street is, and a tower on it. */
function tallowWharf(city: City): Proposal {
  const points: Point[] = [
    [148, -172],
    [186, -148],
  ];
  const site = siteAt(city, points);
  const podium = acrossTwo(site, [14, -13], [6, 34]);
  const tower = acrossTwo(site, [3, -12], [8, 27]);
  const blocks = [
    proposed('podium', 'Podium', [0, 14], 4, podium),
    proposed('tower', 'Tower', [14, 44], 14, tower),
  ];
  return {
    site,
    massings: [
      { fileName: 'tallow-wharf.geojson', blocks: [...blocks, ...existingBlocks(city, site)] },
    ],
  };
}

/** Three storeys on an empty corner. */
function netloftCorner(city: City): Proposal {
  const site = siteAt(city, [[-173, 100]]);
  const shape = onParcel(site, 0, [-7, 7], [4.5, 16.5]);
  return {
    site,
    massings: [
      {
        fileName: 'netloft-corner.geojson',
        blocks: [proposed('house', 'House of three homes', [0, 9.6], 3, shape)],
      },
    ],
  };
}

/** Apartments in the place of two houses: too high at first, then lower and stepped. */
function larkwicketCourt(city: City): Proposal {
  const points: Point[] = [
    [13, 303],
    [28, 303],
  ];
  const site = siteAt(city, points);
  const ends = [halfFront(site, 0) - 2, 2 - halfFront(site, 1)] as const;
  const bar = (inM: readonly [number, number]): Shape => acrossTwo(site, ends, inM);
  const existing = existingBlocks(city, site);
  return {
    site,
    massings: [
      {
        fileName: 'larkwicket-court-1.geojson',
        blocks: [proposed('bar', 'Apartments', [0, 19.2], 6, bar([4, 19])), ...existing],
      },
      {
        fileName: 'larkwicket-court-2.geojson',
        blocks: [
          proposed('street', 'Apartments on the street', [0, 6.6], 2, bar([5, 10])),
          proposed('rear', 'Apartments at the back', [0, 9.6], 3, bar([10, 19])),
          ...existing,
        ],
      },
    ],
  };
}

/** Two small houses on an empty lot by the creek. */
function wickmoorPair(city: City): Proposal {
  const site = siteAt(city, [[-246, -206]]);
  return {
    site,
    massings: [
      {
        fileName: 'wickmoor-pair.geojson',
        blocks: [
          proposed('front', 'Front house', [0, 7.4], 2, onParcel(site, 0, [-6, 5], [5, 14])),
          proposed('back', 'Back house', [0, 5.2], 1, onParcel(site, 0, [-5, 5], [21, 29])),
        ],
      },
    ],
  };
}

/** Three row houses that share their walls. */
function hempwrightCottages(city: City): Proposal {
  const site = siteAt(city, [[-344, -118]]);
  const homes = [0, 1, 2].map((index) =>
    proposed(
      `cottage-${index + 1}`,
      `Cottage ${index + 1}`,
      [0, index === 1 ? 8.1 : 7.5],
      2,
      onParcel(site, 0, [-9 + index * 6, -3 + index * 6], [5, 15]),
    ),
  );
  return { site, massings: [{ fileName: 'hempwright-cottages.geojson', blocks: homes }] };
}

/** Homes over shops at the foot of the main street, in the place of two old shops. */
function candlegateFoot(city: City): Proposal {
  const points: Point[] = [
    [10, -155],
    [8, -146],
  ];
  const site = siteAt(city, points);
  return {
    site,
    massings: [
      {
        fileName: 'candlegate-foot.geojson',
        blocks: [
          proposed('shops', 'Shops and homes', [0, 13.8], 4, acrossTwo(site, [60, -60], [-5, 17])),
          proposed('annexe', 'Store', [0, 4.2], 1, acrossTwo(site, [60, -60], [17, 23])),
          ...existingBlocks(city, site),
        ],
      },
    ],
  };
}

/** A block of two heights that belongs to no case: to try an upload with. */
export function twoTierBlock(city: City): Proposal {
  const site = siteAt(city, [[275, 198]]);
  return {
    site,
    massings: [
      {
        fileName: 'two-tier-block.geojson',
        blocks: [
          proposed('lower', 'Lower tier', [0, 7], 2, onParcel(site, 0, [-9, 9], [5, 21])),
          proposed('upper', 'Upper tier', [7, 13.5], 4, onParcel(site, 0, [-6, 6], [8, 18])),
        ],
      },
    ],
  };
}

/** The proposals of the demo's cases, by the key of the case. */
export const proposalsByCase = {
  'tallow-wharf-lofts': tallowWharf,
  'netloft-corner': netloftCorner,
  'larkwicket-court': larkwicketCourt,
  'wickmoor-pair': wickmoorPair,
  'hempwright-cottages': hempwrightCottages,
  'candlegate-foot': candlegateFoot,
} as const satisfies Record<string, (city: City) => Proposal>;

export type CaseKey = keyof typeof proposalsByCase;
