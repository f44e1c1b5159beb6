import { createContext, use } from 'react';
import type { Municipality } from '../../shared/contracts/base-data.ts';
import type { Formats } from './formats.ts';

export interface Place {
  municipality: Municipality;
  formats: Formats;
}

/** The place that this server serves, loaded before any page is shown. */
export const PlaceContext = createContext<Place | null>(null);

export function usePlace(): Place {
  const place = use(PlaceContext);
  if (place === null) throw new Error('usePlace is used outside the place provider');
  return place;
}

export function useFormats(): Formats {
  return usePlace().formats;
}
