import { useMemo } from 'react';
import { Button } from '../../../components/button.tsx';
import { QueryView } from '../../../components/query-view.tsx';
import { useFormats } from '../../../lib/place-context.ts';
import { ParcelPickerMap } from '../../../map/parcel-picker-map.tsx';
import { useParcels } from '../api/list-parcels.ts';
import { ParcelSearch } from './parcel-search.tsx';

export interface SiteParcelPickerProps {
  picked: readonly string[];
  onChange: (numbers: string[]) => void;
}

/** Picks parcels by address search or by pointing at them; the list below says which. */
export function SiteParcelPicker({ picked, onChange }: SiteParcelPickerProps) {
  const formats = useFormats();
  const parcels = useParcels({ numbers: picked, pageSize: 50 }, { enabled: picked.length > 0 });
  const rows = useMemo(
    () => (parcels.data?.rows ?? []).filter((parcel) => picked.includes(parcel.number)),
    [parcels.data, picked],
  );
  const geometries = useMemo(() => rows.map((parcel) => parcel.geometry), [rows]);
  const add = (number: string) => {
    if (!picked.includes(number)) onChange([...picked, number]);
  };
  const remove = (number: string) => onChange(picked.filter((one) => one !== number));

  return (
    <div className="grid gap-x-8 gap-y-4 lg:grid-cols-[minmax(0,2fr)_minmax(0,3fr)]">
      <div className="grid content-start gap-4">
        <ParcelSearch
          label="Add a parcel by address or number"
          onPick={(parcel) => add(parcel.number)}
          clearOnPick
        />
        {picked.length === 0 ? (
          <p className="text-small text-ink-soft">
            No parcel is picked yet. Type an address, or point at the parcels on the map.
          </p>
        ) : (
          <QueryView query={parcels} what="the parcels">
            {() => (
              <ul aria-label="Picked parcels" className="border-t border-hairline text-small">
                {picked.map((number) => {
                  const parcel = rows.find((row) => row.number === number);
                  return (
                    <li
                      key={number}
                      className="flex flex-wrap items-baseline justify-between gap-x-4 border-b border-hairline py-1.5"
                    >
                      <span>
                        {parcel?.address ?? 'Parcel'}{' '}
                        <span className="text-ink-soft">
                          {number}
                          {parcel === undefined
                            ? ''
                            : ` · zone ${parcel.zone} · ${formats.area(parcel.areaM2)}`}
                        </span>
                      </span>
                      <Button
                        kind="plain"
                        aria-label={`Remove ${parcel?.address ?? number}`}
                        onPress={() => remove(number)}
                      >
                        Remove
                      </Button>
                    </li>
                  );
                })}
              </ul>
            )}
          </QueryView>
        )}
      </div>
      <ParcelPickerMap
        label="Point at the parcels of the site"
        picked={picked}
        focus={geometries}
        onPickParcel={(parcel) => {
          if (parcel === null) return;
          if (picked.includes(parcel.number)) remove(parcel.number);
          else add(parcel.number);
        }}
      />
    </div>
  );
}
