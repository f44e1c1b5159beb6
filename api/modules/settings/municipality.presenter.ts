import type { Municipality as MunicipalityDetail } from '../../../shared/contracts/base-data.ts';
import type { Municipality } from './municipality.entity.ts';

export function presentMunicipality(municipality: Municipality): MunicipalityDetail {
  const { name, shortName, timeZone, locale, longitude, latitude, elevationM } = municipality;
  const { extent, studyYear } = municipality;
  return {
    name,
    shortName,
    timeZone,
    locale,
    longitude,
    latitude,
    elevationM,
    extent,
    studyYear,
  };
}
