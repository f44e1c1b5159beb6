import { useMemo } from 'react';
import type { CaseDetail } from '../../../shared/contracts/cases.ts';
import type { StudyDetail } from '../../../shared/contracts/studies.ts';
import { usePlace } from '../../lib/place-context.ts';
import { CaseMap } from '../../map/case-map.tsx';
import { boundsAround } from '../../map/map-features.ts';
import type { ChosenPlace } from './use-chosen-place.ts';

export interface CasePageMapProps {
  reviewCase: CaseDetail;
  study: StudyDetail;
  place: ChosenPlace;
}

const marginM = 150;

export function CasePageMap({ reviewCase, place }: CasePageMapProps) {
  const { municipality } = usePlace();
  const { site } = reviewCase;
  const bounds = useMemo(
    () => (site === null ? null : boundsAround([site], marginM)) ?? municipality.extent,
    [site, municipality.extent],
  );
  return (
    <CaseMap
      label="Map of the site and its neighbours"
      bounds={bounds}
      site={site}
      pickedParcels={place.receptor === null ? [] : [place.receptor]}
      mode="pick"
      onPick={({ parcel, lngLat }) => {
        if (parcel !== null) place.choose(parcel.number, lngLat);
      }}
    />
  );
}
