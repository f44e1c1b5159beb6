import type { Municipality } from '../../../shared/contracts/base-data.ts';
import type { Place } from '../../../shared/rules/place.ts';

/** The municipality as the place at which a rule is judged. */
export function placeOfMunicipality(municipality: Municipality): Place {
  return {
    longitude: municipality.longitude,
    latitude: municipality.latitude,
    timezone: municipality.timeZone,
    elevation: municipality.elevationM,
  };
}
