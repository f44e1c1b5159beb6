import { useMemo, type ReactNode } from 'react';
import type { Municipality } from '../../../../shared/contracts/base-data.ts';
import { QueryView } from '../../../components/query-view.tsx';
import { isApiError } from '../../../lib/api-error.ts';
import { createFormats } from '../../../lib/formats.ts';
import { PlaceContext } from '../../../lib/place-context.ts';
import { useMunicipality } from '../api/get-municipality.ts';

export interface PlaceProviderProps {
  children: ReactNode;
  /** What is shown where no place was ever set up. */
  whenNotSetUp: ReactNode;
}

/** Loads the place once; pages below may rely on it and on its formats. */
export function PlaceProvider({ children, whenNotSetUp }: PlaceProviderProps) {
  const municipality = useMunicipality();
  if (isApiError(municipality.error, 'UNAVAILABLE')) return whenNotSetUp;
  if (municipality.data !== undefined) {
    return <LoadedPlace municipality={municipality.data}>{children}</LoadedPlace>;
  }
  return (
    <main className="sheet-width py-10">
      <QueryView query={municipality}>{() => null}</QueryView>
    </main>
  );
}

interface LoadedPlaceProps {
  municipality: Municipality;
  children: ReactNode;
}

function LoadedPlace({ municipality, children }: LoadedPlaceProps) {
  const { locale, timeZone } = municipality;
  const place = useMemo(
    () => ({ municipality, formats: createFormats({ locale, timeZone }) }),
    [municipality, locale, timeZone],
  );
  return <PlaceContext value={place}>{children}</PlaceContext>;
}
