import type { Building } from './building.ts';
import type { City } from './city.ts';
import { collectionBytes, polygonFeature } from './geojson.ts';
import { frameOf, frameRectangle, type LotFrame } from './lots.ts';
import { common, joined } from './overlay.ts';
import type { Parcel } from './parcels.ts';
import { between, isInside, shapeOf, tidied, type Point, type Shape } from './shape.ts';

/** A block of a massing, heights in metres above ground. */
export interface Block {
  id: string;
  name: string;
  role: 'proposed' | 'existing';
  baseM: number;
  topM: number;
  /** Counted from the ground to the top of the block. */
  storeys: number;
  shape: Shape;
}

/** One revision of a proposal as a file of its own. */
export interface Massing {
  fileName: string;
  blocks: Block[];
}

/** The parcels that a proposal stands on, in the order of the points by which they were found. */
export interface Site {
  parcels: Parcel[];
  frames: LotFrame[];
}

export function siteAt(city: City, points: readonly Point[]): Site {
  const parcels = points.map((point) => {
    const parcel = city.parcels.find((one) => isInside(point, one.shape));
    if (!parcel) throw new Error(`There is no parcel at ${point.join(', ')}.`);
    return parcel;
  });
  return { parcels, frames: parcels.map(frameOf) };
}

type Span = readonly [number, number];

/** A rectangle in the frame of the site's parcel number `index`, cut to that parcel. */
export function onParcel(site: Site, index: number, alongM: Span, inM: Span): Shape {
  const parcel = site.parcels[index];
  const frame = site.frames[index];
  const [shape] = parcel && frame ? common(parcel.shape, [frameRectangle(frame, alongM, inM)]) : [];
  if (!shape) throw new Error(`Nothing of the block lies on site parcel ${index}.`);
  return shapeOf(tidied(shape.outer, 0.05, 0.001));
}

/**
 * A strip over the site's first two parcels, cut to them: from `ends[0]` along the first one's front, to the
 * line between them, where it may bend as the street does, to `ends[1]` along the second one's.
 */
export function acrossTwo(site: Site, ends: Span, [nearM, farM]: Span): Shape {
  const [first, second] = site.frames;
  if (!first || !second) throw new Error('The site has no two parcels.');
  const middle = (inM: number): Point =>
    between(first.at(-first.widthM / 2, inM), second.at(second.widthM / 2, inM), 0.5);
  const strip = shapeOf([
    first.at(ends[0], nearM),
    middle(nearM),
    second.at(ends[1], nearM),
    second.at(ends[1], farM),
    middle(farM),
    first.at(ends[0], farM),
  ]);
  const [ground] = joined(site.parcels.map((parcel) => parcel.shape));
  const [shape] = ground ? common(strip, [ground]) : [];
  if (!shape) throw new Error('Nothing of the block lies on the site.');
  return shapeOf(tidied(shape.outer, 0.05, 0.001));
}

/** Half the front of the site's parcel number `index`. */
export const halfFront = (site: Site, index: number): number =>
  (site.frames[index]?.widthM ?? 0) / 2;

const names: Record<Building['kind'], string> = {
  house: 'House',
  garage: 'Garage',
  shop: 'Shop',
  apartment: 'Apartment house',
  civic: 'Public building',
  warehouse: 'Shed',
};

/** What stands on the site now and comes down; each block keeps its number in the register of buildings. */
export const existingBlocks = (city: City, site: Site): Block[] =>
  city.buildings
    .filter((building) => site.parcels.some((parcel) => parcel.number === building.parcel))
    .map((building) => ({
      id: building.id,
      name: `${names[building.kind]} to be removed`,
      role: 'existing',
      baseM: building.baseM,
      topM: building.topM,
      storeys: building.storeys,
      shape: building.shape,
    }));

export const massingBytes = (blocks: readonly Block[]): Uint8Array =>
  collectionBytes(
    blocks.map(({ id, role, baseM, topM, storeys, name, shape }) =>
      polygonFeature(shape, { id, role, base: baseM, top: topM, storeys, name }),
    ),
  );
