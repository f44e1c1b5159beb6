import { sunPositionAt } from '../../../shared/solar/sun-position.ts';

/**
 * The sun ledger and the shadows of any instant are computed from a study's input too, so the reach
 * is that of a sun at 1° even where every judged instant has a higher one. A window that begins at
 * sunrise has no lowest sun; for it the reach ends with a sun at 0.1°, 573 times the height.
 */
const altitudeRangeDeg = { lowest: 0.1, highest: 1 } as const;

interface Heights {
  /** Top of the tallest block of the site, proposed or existing, metres above the datum. */
  siteTopM: number;
  /** Top of the tallest building around. */
  contextTopM: number;
  /** The lowest plane on which shadows are taken. */
  lowestPlaneM: number;
}

/** How far from the site base data enters a study, in metres. */
export interface StudyReach {
  /** As far as the site's blocks can shade: what lies within may be affected. */
  receptorsM: number;
  /** As far as a building can stand that shades what may be affected. */
  contextM: number;
}

/**
 * The reach of shadows at the lowest sun of a study: height / tan(altitude).
 *
 * @param instants the study's instants, and the first and last of each judged window; RFC 3339
 */
export function computeStudyReach(
  instants: readonly string[],
  place: { longitude: number; latitude: number },
  { siteTopM, contextTopM, lowestPlaneM }: Heights,
): StudyReach {
  const altitudes = instants
    .map((at) => sunPositionAt(Date.parse(at), place.longitude, place.latitude).altitudeDeg)
    .filter((altitudeDeg) => altitudeDeg > 0);
  const lowestDeg = Math.max(
    altitudeRangeDeg.lowest,
    Math.min(altitudeRangeDeg.highest, ...altitudes),
  );
  const lengthOfShadowM = (topM: number) =>
    Math.max(0, topM - lowestPlaneM) / Math.tan((lowestDeg * Math.PI) / 180);
  const receptorsM = lengthOfShadowM(siteTopM);
  return { receptorsM, contextM: receptorsM + lengthOfShadowM(contextTopM) };
}
