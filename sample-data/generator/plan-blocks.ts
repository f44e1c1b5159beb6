import type { Point } from './shape.ts';

export type LotKind =
  'house' | 'waterfront' | 'shop' | 'apartments' | 'warehouse' | 'civic-hall' | 'school';

/** A row of lots along a street. */
export interface RowPlan {
  front: string;
  /** The street that carries on the front street under another name. */
  alsoAlong?: string;
  kind: LotKind;
  /** How deep the row is; the last one or two rows of a block share what is left. */
  depthM?: number;
  /** Frontage of a lot, from and to; without it the row is one lot. */
  lotWidthM?: readonly [number, number];
}

export interface BlockPlan {
  /** A point inside the block. */
  at: Point;
  rows: readonly RowPlan[];
  /** What is left after the rows is open ground, not lots. */
  keepsRest?: true;
}

const houses = (front: string, depthM?: number): RowPlan => ({
  front,
  kind: 'house',
  lotWidthM: [16, 21],
  ...(depthM === undefined ? {} : { depthM }),
});
const denseHouses = (front: string, depthM?: number): RowPlan => ({
  ...houses(front, depthM),
  lotWidthM: [13, 16.5],
});
const villas = (front: string): RowPlan => ({ front, kind: 'waterfront', lotWidthM: [23, 31] });
const shops = (front: string, depthM?: number): RowPlan => ({
  front,
  kind: 'shop',
  lotWidthM: [7.5, 11],
  ...(depthM === undefined ? {} : { depthM }),
});
const sheds = (front: string, lotWidthM: readonly [number, number]): RowPlan => ({
  front,
  kind: 'warehouse',
  lotWidthM,
});

/** What stands where: the blocks of the town, from the harbour outwards. */
export const blockPlans: readonly BlockPlan[] = [
  // The harbour and the wharf.
  { at: [175, -145], rows: [sheds('Oarlock Shore', [34, 44])] },
  { at: [70, -188], rows: [{ front: 'Saltpan Quay', kind: 'apartments', lotWidthM: [32, 40] }] },
  { at: [-90, -222], rows: [sheds('Saltpan Quay', [26, 36])] },
  { at: [-186, -263], rows: [sheds('Osierbend Lane', [40, 60])] },
  // The centre, on both sides of Candlegate Street.
  { at: [-139, -164], rows: [shops('Saltpan Quay', 33), denseHouses('Ropelight Street')] },
  { at: [-58, -143], rows: [shops('Candlegate Street', 33), denseHouses('Smeltgate Street')] },
  {
    at: [25, -121],
    rows: [shops('Candlegate Street', 31), { front: 'Lanternyard Street', kind: 'apartments' }],
  },
  {
    at: [104, -103],
    rows: [
      denseHouses('Tallowreed Row', 34),
      { ...denseHouses('Oarlock Shore'), alsoAlong: 'Saltpan Quay' },
    ],
  },
  { at: [-158, -82], rows: [denseHouses('Brinewell Street'), denseHouses('Ropelight Street')] },
  { at: [-79, -61], rows: [shops('Candlegate Street', 33), denseHouses('Smeltgate Street')] },
  {
    at: [4, -40],
    rows: [shops('Candlegate Street', 29), { front: 'Lanternyard Street', kind: 'civic-hall' }],
  },
  {
    at: [-139, 18],
    rows: [
      shops('Candlegate Street', 31),
      { front: 'Osierbend Lane', kind: 'school', depthM: 84 },
      houses('Netloft Street'),
      houses('Brinewell Street'),
    ],
  },
  {
    at: [9, 45],
    rows: [
      { ...shops('Candlegate Street', 31), lotWidthM: [9, 13] },
      houses('Netloft Street'),
      houses('Brinewell Street'),
    ],
  },
  // Tallowreed Row and the curved streets along the eastern shore.
  { at: [141, 37], rows: [houses('Tallowreed Row', 34), houses('Brinewell Street')] },
  { at: [183, -51], rows: [houses('Tallowreed Row'), houses('Oarlock Shore')] },
  { at: [226, 50], rows: [houses('Tallowreed Row'), houses('Oarlock Shore')] },
  { at: [161, 140], rows: [houses('Gullfeather Street'), houses('Tallowreed Row')] },
  { at: [244, 141], rows: [houses('Tallowreed Row'), houses('Oarlock Shore')] },
  { at: [180, 215], rows: [houses('Gullfeather Street'), houses('Tallowreed Row')] },
  { at: [264, 214], rows: [houses('Tallowreed Row'), houses('Oarlock Shore')] },
  { at: [202, 287], rows: [houses('Gullfeather Street'), houses('Tallowreed Row')] },
  { at: [287, 285], rows: [houses('Tallowreed Row'), houses('Oarlock Shore')] },
  { at: [283, -3], rows: [villas('Oarlock Shore')] },
  { at: [341, 210], rows: [villas('Oarlock Shore')] },
  { at: [386, 344], rows: [{ front: 'Oarlock Shore', kind: 'waterfront' }] },
  // The hill north of Netloft Street.
  { at: [-190, 109], rows: [houses('Netloft Street'), houses('Kelpstone Street')] },
  { at: [-107, 116], rows: [houses('Netloft Street'), houses('Kelpstone Street')] },
  {
    at: [-1, 127],
    rows: [houses('Candlegate Street', 31), houses('Netloft Street'), houses('Kelpstone Street')],
  },
  { at: [89, 138], rows: [houses('Ferrylamp Street', 29), houses('Gullfeather Street')] },
  { at: [-203, 193], rows: [houses('Kelpstone Street'), houses('Thrumhill Street')] },
  {
    at: [-110, 200],
    rows: [houses('Candlegate Street', 31), houses('Kelpstone Street'), houses('Thrumhill Street')],
  },
  { at: [-3, 208], rows: [houses('Kelpstone Street'), houses('Thrumhill Street')] },
  { at: [97, 215], rows: [houses('Kelpstone Street'), houses('Thrumhill Street')] },
  { at: [-219, 274], rows: [houses('Thrumhill Street'), houses('Larkwicket Street')] },
  { at: [-111, 281], rows: [houses('Thrumhill Street'), houses('Larkwicket Street')] },
  {
    at: [1, 286],
    rows: [
      houses('Candlegate Street', 31),
      houses('Thrumhill Street'),
      houses('Larkwicket Street'),
    ],
  },
  { at: [111, 290], rows: [houses('Thrumhill Street'), houses('Larkwicket Street')] },
  { at: [-180, 341], rows: [{ ...houses('Larkwicket Street'), lotWidthM: [18, 25] }] },
  { at: [145, 347], rows: [{ ...houses('Larkwicket Street'), lotWidthM: [18, 25] }] },
  // West of the creek.
  {
    at: [-424, 72],
    rows: [houses('Marlgate Street', 30), houses('Netloft Street'), houses('Hollowreed Street')],
  },
  { at: [-421, -13], rows: [houses('Hollowreed Street'), houses('Brinewell Street')] },
  {
    at: [-417, -98],
    rows: [houses('Marlgate Street', 30), houses('Brinewell Street'), houses('Hempwright Street')],
  },
  { at: [-413, -180], rows: [houses('Hempwright Street'), houses('Wickmoor Road')] },
  { at: [-316, 16], rows: [houses('Marlgate Street', 36)], keepsRest: true },
  { at: [-298, -107], rows: [houses('Brinewell Street'), houses('Hempwright Street')] },
  { at: [-286, -190], rows: [houses('Hempwright Street'), houses('Wickmoor Road')] },
  { at: [-352, 135], rows: [{ ...houses('Netloft Street'), lotWidthM: [17, 22] }] },
  { at: [-334, -265], rows: [villas('Wickmoor Road')] },
];

/** A point in each lot that stands empty. */
export const emptyLotsAt: readonly Point[] = [
  [-173, 100],
  [-246, -206],
  [-344, -118],
  [275, 198],
  [-455, 10],
  [-212, 342],
  [197, 218],
  [180, 160],
];
