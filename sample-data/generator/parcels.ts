import type { Lot } from './lots.ts';
import { nearestOnPath } from './path.ts';
import { emptyLotsAt, type LotKind } from './plan-blocks.ts';
import { streets } from './plan-streets.ts';
import type { Random } from './random.ts';
import { between, isInside } from './shape.ts';

export type ParcelUse = 'residential' | 'commercial' | 'civic' | 'vacant';

export interface Parcel extends Lot {
  number: string;
  address: string;
  zone: string;
  use: ParcelUse;
}

/** The first parcel number; the county's earlier ones lie outside the city. */
const FIRST_NUMBER = 101;

const zones: Record<LotKind, string> = {
  house: 'R-1 Town Residential',
  waterfront: 'R-2 Shore Residential',
  shop: 'C-1 Candlegate Centre',
  apartments: 'C-2 Centre Mixed',
  warehouse: 'W-1 Wharf',
  'civic-hall': 'P-1 Civic',
  school: 'P-1 Civic',
};

const uses: Record<LotKind, ParcelUse> = {
  house: 'residential',
  waterfront: 'residential',
  shop: 'commercial',
  apartments: 'residential',
  warehouse: 'commercial',
  'civic-hall': 'civic',
  school: 'civic',
};

/** House numbers: even on the right of the street, odd on its left, growing along it. */
function giveAddresses(lots: readonly Lot[], random: Random): Map<Lot, string> {
  const addresses = new Map<Lot, string>();
  for (const street of streets) {
    const placed = lots
      .filter((lot) => lot.street === street.name)
      .map((lot) => ({
        lot,
        place: nearestOnPath(between(...lot.front, 0.5), street.centreLine),
      }))
      .sort((a, b) => a.place.alongM - b.place.alongM);
    for (const isLeft of [true, false]) {
      let number = isLeft ? 1 : 2;
      for (const { lot, place } of placed) {
        if (place.isLeft !== isLeft) continue;
        addresses.set(lot, `${number} ${street.name}`);
        number += random.chance(0.08) ? 4 : 2;
      }
    }
  }
  return addresses;
}

/** Numbers, addresses, zones and uses for the lots; the empty ones stand vacant. */
export function registerParcels(lots: readonly Lot[], random: Random): Parcel[] {
  const addresses = giveAddresses(lots, random);
  return lots.map((lot, index) => {
    const isVacant = emptyLotsAt.some((point) => isInside(point, lot.shape));
    return {
      ...lot,
      number: `LH-${String(FIRST_NUMBER + index).padStart(4, '0')}`,
      address: addresses.get(lot) ?? '',
      zone: zones[lot.kind],
      use: isVacant ? 'vacant' : uses[lot.kind],
    };
  });
}
