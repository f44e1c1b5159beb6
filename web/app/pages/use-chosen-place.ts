import { useState } from 'react';
import type { LngLat } from '../../../shared/geometry/geojson-schema.ts';
import { useParcels } from '../../features/places/api/list-parcels.ts';
import { boxMiddle } from '../../lib/distance.ts';
import { useSearchState } from '../../lib/use-search-state.ts';

export interface ChosenPlace {
  /** The receptor in the address; a parcel's number is its receptor. */
  receptor: string | null;
  /** Its parcel, where it is one, once loaded. */
  parcel: { number: string; address: string } | null;
  /** Where the person pointed, else the middle of the parcel; null where nothing is chosen. */
  lngLat: LngLat | null;
  /** The person chose it on this visit, so the answer may take the focus. */
  isFresh: boolean;
  choose: (receptor: string | null, lngLat?: LngLat) => void;
}

/** The neighbour's own place on a case's page: kept in the address, so that the link can be passed on. */
export function useChosenPlace(): ChosenPlace {
  const [receptor, setReceptor] = useSearchState('receptor');
  const [pointed, setPointed] = useState<{ receptor: string; lngLat: LngLat | null } | null>(null);
  const parcels = useParcels(
    { numbers: receptor === null ? [] : [receptor], pageSize: 1 },
    { enabled: receptor !== null },
  );
  const parcel = parcels.data?.rows.find(({ number }) => number === receptor) ?? null;
  const isFresh = pointed !== null && pointed.receptor === receptor;
  return {
    receptor,
    parcel,
    lngLat:
      (isFresh ? pointed.lngLat : null) ?? (parcel === null ? null : boxMiddle(parcel.geometry)),
    isFresh,
    choose: (chosen, lngLat) => {
      setReceptor(chosen);
      setPointed(chosen === null ? null : { receptor: chosen, lngLat: lngLat ?? null });
    },
  };
}
