import type { StudyInput } from '../../../shared/study/evidence-schema.ts';
import type { Municipality } from '../settings/municipality.entity.ts';

/** The municipality as a study's place. */
export function placeOf(municipality: Municipality): StudyInput['place'] {
  return {
    name: municipality.name,
    timezone: municipality.timeZone,
    longitude: municipality.longitude,
    latitude: municipality.latitude,
    elevation: municipality.elevationM,
  };
}
