import { heightSources, toDecimetre, type BuildingDraft } from './building.ts';
import { frameOf, frameRectangle, type LotFrame } from './lots.ts';
import { common } from './overlay.ts';
import type { Parcel } from './parcels.ts';
import type { Random } from './random.ts';
import { clockwise, fitsInside, shapeOf, type Shape } from './shape.ts';

type Span = readonly [number, number];

function checked(shape: Shape, parcel: Parcel): Shape {
  if (!fitsInside(shape, parcel.shape, 0.5)) {
    throw new Error(`A landmark does not fit on ${parcel.number}, ${parcel.address}.`);
  }
  return shape;
}

const rectangle = (frame: LotFrame, alongM: Span, inM: Span): Shape =>
  frameRectangle(frame, alongM, inM);

/** The civic hall with its tower: the tower stands on the hall's roof. */
export function buildCivicHall(parcel: Parcel): BuildingDraft[] {
  const frame = frameOf(parcel);
  const hall = checked(rectangle(frame, [-15, 15], [7, 25]), parcel);
  const tower = rectangle(frame, [-3.6, 3.6], [8, 15.2]);
  const details = { kind: 'civic', heightSource: heightSources.permit } as const;
  return [
    { ...details, storeys: 2, baseM: 0, topM: 13, shape: hall },
    { ...details, storeys: 5, baseM: 13, topM: 31, shape: tower },
  ];
}

/** An L-shaped school, and the yard in its angle. */
export function buildSchool(parcel: Parcel): { buildings: BuildingDraft[]; yard: Shape | null } {
  const frame = frameOf(parcel);
  const school = shapeOf([
    frame.at(-28, 12),
    frame.at(32, 12),
    frame.at(32, 56),
    frame.at(18, 56),
    frame.at(18, 27),
    frame.at(-28, 27),
  ]);
  const [yard] = common(parcel.shape, [rectangle(frame, [-60, 16], [30, 78])]);
  return {
    buildings: [
      {
        kind: 'civic',
        storeys: 2,
        baseM: 0,
        topM: 9.4,
        heightSource: heightSources.permit,
        shape: checked(school, parcel),
      },
    ],
    yard: yard ?? null,
  };
}

/** Apartments around a courtyard on a deep lot, a slab of eight storeys or so on a small one. */
export function buildApartments(
  parcel: Parcel,
  random: Random,
): { buildings: BuildingDraft[]; courtyard: Shape | null } {
  const frame = frameOf(parcel);
  if (frame.widthM > 50) {
    const outer = checked(rectangle(frame, [-27, 27], [3, 31]), parcel).outer;
    const court = rectangle(frame, [-17, 17], [12.5, 21.5]).outer;
    const shape: Shape = { outer, holes: [clockwise(court)] };
    return {
      buildings: [
        {
          kind: 'apartment',
          storeys: 5,
          baseM: 0,
          topM: 16.2,
          heightSource: heightSources.permit,
          shape,
        },
      ],
      courtyard: shapeOf(court),
    };
  }
  const halfM = frame.widthM / 2 - 4;
  const storeys = random.pick([5, 6, 8]);
  return {
    buildings: [
      {
        kind: 'apartment',
        storeys,
        baseM: 0,
        topM: Math.min(25, toDecimetre(storeys * 3.1 + 0.6)),
        heightSource: heightSources.permit,
        shape: checked(rectangle(frame, [-halfM, halfM], [5, 19]), parcel),
      },
    ],
    courtyard: null,
  };
}

/** A shed of the old harbour. */
export function buildWarehouse(parcel: Parcel, random: Random): BuildingDraft[] {
  const frame = frameOf(parcel);
  for (let cutM = 3; cutM < 14; cutM += 1) {
    const halfM = frame.widthM / 2 - cutM;
    const shape = rectangle(frame, [-halfM, halfM], [4 + cutM / 3, 28 - cutM]);
    if (fitsInside(shape, parcel.shape, 1)) {
      return [
        {
          kind: 'warehouse',
          storeys: 1,
          baseM: 0,
          topM: toDecimetre(random.between(7.5, 10.5)),
          heightSource: heightSources.lidarFlat,
          shape,
        },
      ];
    }
  }
  return [];
}
