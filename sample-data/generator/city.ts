import { findBlocks, paveStreets, type StreetSurface } from './blocks.ts';
import type { Building, BuildingDraft } from './building.ts';
import { placeCollectors, type Collector } from './collectors.ts';
import { buildHouse } from './houses.ts';
import { buildApartments, buildCivicHall, buildSchool, buildWarehouse } from './landmarks.ts';
import { divideBlock, type Lot } from './lots.ts';
import { registerParcels, type Parcel } from './parcels.ts';
import { blockPlans } from './plan-blocks.ts';
import { promenade } from './plan-water.ts';
import { createRandom, type Random } from './random.ts';
import { reshapeLots } from './reshape-lots.ts';
import { isInside, type Point, type Shape } from './shape.ts';
import { buildShop } from './shops.ts';
import { weld } from './weld.ts';

export interface Yard {
  id: string;
  parcel: string;
  label: string;
  shape: Shape;
}

export interface OpenSpace {
  id: string;
  class: 'open-space' | 'walk';
  name: string;
  shape: Shape;
}

export interface City {
  parcels: Parcel[];
  buildings: Building[];
  yards: Yard[];
  openSpaces: OpenSpace[];
  collectors: Collector[];
  streetSurfaces: StreetSurface[];
}

/** Larkhaven as it is in the sample. Another seed gives other houses on the same streets. */
export const LARKHAVEN_SEED = 4675;

/** Whole blocks that are open ground, by a point in them. */
const green: { at: Point; name: string } = { at: [74, -23], name: 'Lanternyard Green' };
const garden: { at: Point; name: string } = { at: [90, 71], name: 'Gullfeather Community Garden' };
const parkName = 'Osierbend Park';

function blockAt(blocks: readonly Shape[], at: Point): Shape {
  const block = blocks.find((one) => isInside(at, one));
  if (!block) throw new Error(`There is no block at ${at.join(', ')}.`);
  return block;
}

interface Ground {
  lots: Lot[];
  park: Shape;
  green: Shape;
  garden: Shape;
}

function divideGround(random: Random): Ground {
  const blocks = findBlocks();
  const lots: Lot[] = [];
  let park: Shape | null = null;
  for (const plan of blockPlans) {
    const divided = divideBlock(blockAt(blocks, plan.at), plan, random);
    lots.push(...reshapeLots(divided.lots, random));
    if (plan.keepsRest) park = divided.rest;
  }
  if (!park) throw new Error('The plan leaves no ground for the park.');
  return { lots, park, green: blockAt(blocks, green.at), garden: blockAt(blocks, garden.at) };
}

interface Built {
  drafts: BuildingDraft[];
  yard?: Shape | null;
  isCourtyard?: boolean;
  schoolYard?: Shape | null;
}

function buildOn(parcel: Parcel, random: Random): Built {
  if (parcel.use === 'vacant') return { drafts: [] };
  switch (parcel.kind) {
    case 'house':
    case 'waterfront': {
      const { buildings, rearYard } = buildHouse(parcel, random);
      return { drafts: buildings, yard: rearYard };
    }
    case 'shop':
      return { drafts: buildShop(parcel, random) };
    case 'apartments': {
      const { buildings, courtyard } = buildApartments(parcel, random);
      return { drafts: buildings, yard: courtyard, isCourtyard: true };
    }
    case 'warehouse':
      return { drafts: buildWarehouse(parcel, random) };
    case 'civic-hall':
      return { drafts: buildCivicHall(parcel) };
    case 'school': {
      const { buildings, yard } = buildSchool(parcel);
      return { drafts: buildings, schoolYard: yard };
    }
  }
}

/** Builds the whole city from its seed, in metres of the local plane. */
export function buildCity(seed: number): City {
  const random = createRandom(seed);
  const ground = divideGround(random);
  const parcels = registerParcels(ground.lots, random);
  const buildings: Building[] = [];
  const yards: Yard[] = [];
  let schoolYard: Shape | null = null;
  for (const parcel of parcels) {
    const built = buildOn(parcel, random);
    // A lot too small or too odd for a house stays vacant.
    if (built.drafts.length === 0) parcel.use = 'vacant';
    for (const draft of built.drafts) {
      const id = `B-${String(buildings.length + 1).padStart(4, '0')}`;
      buildings.push({ id, parcel: parcel.number, ...draft });
    }
    if (built.yard) {
      yards.push({
        id: `Y-${String(yards.length + 1).padStart(4, '0')}`,
        parcel: parcel.number,
        label: `${built.isCourtyard ? 'Courtyard' : 'Rear yard'}, ${parcel.address}`,
        shape: built.yard,
      });
    }
    schoolYard ??= built.schoolYard ?? null;
  }
  if (!schoolYard) throw new Error('The plan has no school.');

  const welded = weld([...parcels, ...buildings].map((one) => one.shape));
  const weldedParcels = parcels.map((parcel, index) => ({
    ...parcel,
    shape: welded[index] ?? parcel.shape,
  }));
  const weldedBuildings = buildings.map((building, index) => ({
    ...building,
    shape: welded[parcels.length + index] ?? building.shape,
  }));
  return {
    parcels: weldedParcels,
    buildings: weldedBuildings,
    yards,
    openSpaces: [
      { id: 'O-1', class: 'open-space', name: green.name, shape: ground.green },
      { id: 'O-2', class: 'open-space', name: parkName, shape: ground.park },
      { id: 'O-3', class: 'open-space', name: 'Netloft School Yard', shape: schoolYard },
      { id: 'O-4', class: 'open-space', name: garden.name, shape: ground.garden },
      { id: 'O-5', class: 'walk', name: 'Saltpan Promenade', shape: promenade },
    ],
    collectors: placeCollectors(weldedBuildings, random),
    streetSurfaces: paveStreets(),
  };
}
