import { heightSources, toDecimetre, type BuildingDraft } from './building.ts';
import { frameOf, frameRectangle, type LotFrame } from './lots.ts';
import { common, without } from './overlay.ts';
import type { Parcel } from './parcels.ts';
import type { Random } from './random.ts';
import { fitsInside, grown, shapeOf, type Shape } from './shape.ts';

interface HousePlace {
  shape: Shape;
  leftM: number;
  rightM: number;
  nearM: number;
  farM: number;
}

const MOST_TRIES = 14;
/** Clear ground between a wall and the lot line. */
const SIDE_YARD_M = 1.1;

/** A rectangle, or an L with a wing at the back. */
function houseShape(frame: LotFrame, place: Omit<HousePlace, 'shape'>, wingM: number): Shape {
  const { leftM, rightM, nearM, farM } = place;
  if (wingM === 0) return frameRectangle(frame, [leftM, rightM], [nearM, farM]);
  const middleM = leftM + (rightM - leftM) * 0.55;
  return shapeOf([
    frame.at(leftM, nearM),
    frame.at(rightM, nearM),
    frame.at(rightM, farM - wingM),
    frame.at(middleM, farM - wingM),
    frame.at(middleM, farM),
    frame.at(leftM, farM),
  ]);
}

/** Tries places for a house on its lot, smaller each time, until one fits. */
function placeHouse(parcel: Parcel, frame: LotFrame, random: Random): HousePlace | null {
  const isShore = parcel.kind === 'waterfront';
  const hasWing = random.chance(isShore ? 0.6 : 0.3);
  const setBackM = isShore ? random.between(15, 22) : random.between(3.8, 6);
  const fullWidthM = Math.min(frame.widthM - 4.2, isShore ? 17 : random.between(8.4, 11));
  const fullDepthM = isShore ? random.between(11, 15) : random.between(8.6, 11.4);
  for (let attempt = 0; attempt < MOST_TRIES; attempt++) {
    const size = 0.955 ** attempt;
    const widthM = Math.max(5.4, fullWidthM * size);
    const depthM = Math.max(7, fullDepthM * size);
    const spareM = Math.max(0, frame.widthM - widthM - 2.4) / 2;
    const middleM = random.between(-spareM, spareM);
    const nearM = Math.max(3.6, setBackM - attempt * (isShore ? 1.2 : 0.1));
    const place = {
      leftM: middleM - widthM / 2,
      rightM: middleM + widthM / 2,
      nearM,
      farM: nearM + depthM,
    };
    const shape = houseShape(frame, place, hasWing ? depthM * 0.32 : 0);
    if (fitsInside(shape, parcel.shape, SIDE_YARD_M)) return { ...place, shape };
  }
  return null;
}

/** A garage at the back of the lot, by one side line. */
function placeGarage(
  parcel: Parcel,
  frame: LotFrame,
  house: HousePlace,
  random: Random,
): Shape | null {
  const isDouble = frame.widthM > 16.5 && random.chance(0.3);
  const widthM = isDouble ? 6 : 3.8;
  const sides = random.chance(0.5) ? [-1, 1] : [1, -1];
  for (const side of sides) {
    for (const gapM of [7.5, 5.5, 4, 2.5]) {
      for (const inset of [0.9, 1.6, 2.6]) {
        const outerM = side * (frame.widthM / 2 - inset);
        const innerM = outerM - side * widthM;
        const nearM = house.farM + gapM;
        const shape = frameRectangle(
          frame,
          [Math.min(outerM, innerM), Math.max(outerM, innerM)],
          [nearM, nearM + 6.2],
        );
        if (fitsInside(shape, parcel.shape, 0.6)) return shape;
      }
    }
  }
  return null;
}

function houseHeight(isShore: boolean, random: Random): { storeys: number; topM: number } {
  const storeys = random.chance(isShore ? 0.8 : 0.55) ? 2 : 1;
  const topM = storeys === 2 ? random.between(6.9, 9) : random.between(5, 6.2);
  return { storeys, topM: toDecimetre(topM) };
}

export interface HouseLot {
  buildings: BuildingDraft[];
  /** The ground behind the house, less the garage: where people sit, play and grow things. */
  rearYard: Shape | null;
}

function rearYardOf(parcel: Parcel, frame: LotFrame, farM: number, garage: Shape | null) {
  const [ground] = common(parcel.shape, [frameRectangle(frame, [-300, 300], [farM + 0.3, 300])]);
  if (!ground || !garage) return ground ?? null;
  // Grown by more than its distance from the lot line, so that the yard has no hole and no strip behind it.
  const yards = [1.6, 3.6].flatMap((byM) => without(ground, [grown(garage, byM)]).slice(0, 1));
  return yards.find((yard) => yard.holes.length === 0) ?? null;
}

/** A house, often with a garage, on a lot of its own, and the yard behind it. */
export function buildHouse(parcel: Parcel, random: Random): HouseLot {
  const frame = frameOf(parcel);
  const isShore = parcel.kind === 'waterfront';
  const house = placeHouse(parcel, frame, random);
  if (!house) return { buildings: [], rearYard: null };
  const buildings: BuildingDraft[] = [
    {
      kind: 'house',
      ...houseHeight(isShore, random),
      baseM: 0,
      heightSource: random.pick([heightSources.lidar, heightSources.lidar, heightSources.permit]),
      shape: house.shape,
    },
  ];
  const garage = random.chance(0.46) ? placeGarage(parcel, frame, house, random) : null;
  if (garage) {
    buildings.push({
      kind: 'garage',
      storeys: 1,
      baseM: 0,
      topM: toDecimetre(random.between(2.8, 3.5)),
      heightSource: random.pick([heightSources.lidar, heightSources.storeys]),
      shape: garage,
    });
  }
  return { buildings, rearYard: rearYardOf(parcel, frame, house.farM, garage) };
}
