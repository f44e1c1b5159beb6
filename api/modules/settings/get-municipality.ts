import type { EntityManager } from '@mikro-orm/postgresql';
import { AppError } from '../../errors.ts';
import { Municipality } from './municipality.entity.ts';

/** The place that this server serves. Throws UNAVAILABLE before it is set up. */
export async function getMunicipality(em: EntityManager): Promise<Municipality> {
  const [municipality] = await em.findAll(Municipality, { limit: 1 });
  if (municipality === undefined) {
    throw new AppError('UNAVAILABLE', { title: 'The municipality has not been set up yet.' });
  }
  return municipality;
}

/** The civil day in the municipality at this instant: `2026-12-21`. */
export function civilDateIn(municipality: Pick<Municipality, 'timeZone'>, at: Date): string {
  // The Swedish form is ISO 8601.
  return new Intl.DateTimeFormat('sv-SE', { timeZone: municipality.timeZone }).format(at);
}
