import { useMemo } from 'react';
import type { LngLat, Polygonal } from '../../shared/geometry/geojson-schema.ts';
import { usePlace } from '../lib/place-context.ts';
import { CaseMap } from './case-map.tsx';
import { boundsAround, type Bounds, type MapPin } from './map-features.ts';

export interface ParcelPickerMapProps {
  /** What the person shall point at: "Point at the parcels of the site". */
  label: string;
  /** Numbers of the parcels picked so far. */
  picked: readonly string[];
  /** What to show closely: the picked parcels or a found address; the whole municipality if absent. */
  focus?: readonly Polygonal[];
  site?: Polygonal | null;
  pin?: LngLat | null;
  /** The person pointed at a parcel; null where there is none under the place. */
  onPickParcel: (parcel: { number: string; address: string } | null, lngLat: LngLat) => void;
  className?: string;
}

const focusMarginM = 60;

/** A map to point at parcels on; a search by address beside it does the same without a map. */
export function ParcelPickerMap({
  label,
  picked,
  focus,
  site = null,
  pin = null,
  onPickParcel,
  className = 'h-[50vh] min-h-72',
}: ParcelPickerMapProps) {
  const { municipality } = usePlace();
  const bounds = useMemo<Bounds>(
    () => boundsAround(focus ?? [], focusMarginM) ?? municipality.extent,
    [focus, municipality.extent],
  );
  const pins = useMemo<MapPin[]>(
    () => (pin === null ? [] : [{ id: 'pin', lngLat: pin, isChosen: true }]),
    [pin],
  );
  return (
    <CaseMap
      label={label}
      bounds={bounds}
      site={site}
      pickedParcels={picked}
      pins={pins}
      mode="pick"
      onPick={({ parcel, lngLat }) => onPickParcel(parcel, lngLat)}
      className={className}
      alternative={
        <p className="text-ink-soft">
          With the keyboard: arrows move the map, + and − zoom, Enter takes the parcel under the
          cross.
        </p>
      }
    />
  );
}
