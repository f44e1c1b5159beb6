import type { LngLat } from '../../../../shared/geometry/geojson-schema.ts';
import { Button } from '../../../components/button.tsx';
import { DefinitionList } from '../../../components/definition-list.tsx';
import { FindingMark } from '../../../components/finding-mark.tsx';
import { useFormats } from '../../../lib/place-context.ts';
import type { MapPick } from '../../../map/case-map-props.ts';
import type { MapReceptor } from '../../../map/map-features.ts';
import { wordOfClass } from '../receptor-words.ts';

export interface PlaceFactsProps {
  /** Where the person pointed; null before. */
  pick: MapPick | null;
  receptors: readonly MapReceptor[];
  chosen: string | null;
  onChoose: (receptor: string, lngLat: LngLat) => void;
  onClose: () => void;
}

/** What lies at the place that a person pointed at: parcel, building, and the receptors to choose from. */
export function PlaceFacts({ pick, receptors, chosen, onChoose, onClose }: PlaceFactsProps) {
  const { length } = useFormats();
  if (pick === null) {
    return (
      <p className="text-ink-soft">
        Point at a place to read what is there. With the keyboard: arrows move the map, + and −
        zoom, Enter reads the place under the cross.
      </p>
    );
  }
  const { parcel, building, proposal } = pick;
  const heights = ({ topM, baseM }: NonNullable<MapPick['building']>) =>
    `top ${length(topM)} above the ground${baseM > 0 ? `, underside ${length(baseM)}` : ''}`;
  const found = receptors.filter(({ id }) => pick.receptors.includes(id));
  return (
    <section aria-label="At this place" className="grid gap-1 py-1">
      <DefinitionList
        entries={[
          {
            label: 'Parcel',
            value:
              parcel === null
                ? 'none: a street, water, or outside the base data'
                : [parcel.number, parcel.address, parcel.use].filter(Boolean).join(', '),
          },
          {
            label: 'Building',
            value: building === null ? 'none' : heights(building),
          },
          ...(proposal === null ? [] : [{ label: 'Proposal', value: heights(proposal) }]),
          {
            label: 'Receptors',
            value:
              found.length === 0 ? (
                'none that the study judges'
              ) : (
                <ul>
                  {found.map((one) => (
                    <li key={one.id} className="flex flex-wrap gap-x-3">
                      <button
                        type="button"
                        className="link min-h-6 text-start"
                        aria-pressed={one.id === chosen}
                        onClick={() => onChoose(one.id, pick.lngLat)}
                      >
                        {one.label}, {wordOfClass(one.class)}
                      </button>
                      {one.finding === null ? null : <FindingMark finding={one.finding} />}
                    </li>
                  ))}
                </ul>
              ),
          },
        ]}
      />
      <Button kind="plain" className="no-print justify-self-start" onPress={onClose}>
        Close
      </Button>
    </section>
  );
}
