import { Seasons } from 'astronomy-engine';
import { civilDateOf } from './civil-time.ts';

export const keyDateEvents = [
  'march-equinox',
  'june-solstice',
  'september-equinox',
  'december-solstice',
] as const;
export type KeyDateEvent = (typeof keyDateEvents)[number];

/** A day on which shadows are customarily shown. */
export interface KeyDate {
  event: KeyDateEvent;
  /** Civil date, `YYYY-MM-DD`. */
  date: string;
}

/**
 * The civil dates in a zone on which the equinoxes and solstices of a year fall: the instants at
 * which the sun's apparent ecliptic longitude is 0°, 90°, 180° and 270°, by astronomy-engine.
 */
export function keyDatesOfYear(year: number, timeZone: string): KeyDate[] {
  const seasons = Seasons(year);
  const instants = {
    'march-equinox': seasons.mar_equinox,
    'june-solstice': seasons.jun_solstice,
    'september-equinox': seasons.sep_equinox,
    'december-solstice': seasons.dec_solstice,
  };
  return keyDateEvents.map((event) => ({
    event,
    date: civilDateOf(instants[event].date.getTime(), timeZone),
  }));
}
