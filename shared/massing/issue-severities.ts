import type { IssueSeverity, MassingIssue } from './massing-issue.ts';

/** Every code that reading and checking can give, with what it means for submission. Codes are never renamed. */
export const issueSeverities = {
  // the file as a whole
  MASSING_FILE_EMPTY: 'error',
  MASSING_FILE_TOO_LARGE: 'error',
  MASSING_FORMAT_NOT_READ: 'error',
  MASSING_FORMAT_UNKNOWN: 'error',
  MASSING_ENCODING: 'error',
  MASSING_JSON_INVALID: 'error',
  MASSING_JSON_TOO_DEEP: 'error',
  MASSING_GEOJSON_TYPE: 'error',
  MASSING_NO_FEATURES: 'error',
  MASSING_CRS_NOT_READ: 'error',
  MASSING_TOO_MANY_FEATURES: 'error',
  MASSING_TOO_MANY_VERTICES: 'error',

  // one feature that could not be read as a block
  MASSING_FEATURE_INVALID: 'error',
  MASSING_GEOMETRY_MISSING: 'error',
  MASSING_GEOMETRY_NOT_A_FOOTPRINT: 'error',
  MASSING_GEOMETRY_COLLECTION: 'error',
  MASSING_COORDINATE_INVALID: 'error',
  MASSING_COORDINATES_PROJECTED: 'error',
  MASSING_COORDINATES_SWAPPED: 'error',
  MASSING_TOO_FEW_POINTS: 'error',
  MASSING_ROLE_UNKNOWN: 'error',
  MASSING_TOP_MISSING: 'error',
  MASSING_NUMBER_INVALID: 'error',
  MASSING_PROPERTIES_DISAGREE: 'error',

  // what was put right, or left out, in the reading
  MASSING_RING_OPEN: 'repaired',
  MASSING_POINTS_REPEATED: 'repaired',
  MASSING_RING_ORIENTATION: 'repaired',
  MASSING_BASE_MISSING: 'repaired',
  MASSING_ID_MISSING: 'repaired',
  MASSING_ID_REPEATED: 'repaired',
  MASSING_ID_TOO_LONG: 'repaired',
  MASSING_NAME_TOO_LONG: 'repaired',
  MASSING_TEXT_CLEANED: 'repaired',
  MASSING_NUMBER_AS_TEXT: 'repaired',
  MASSING_HEIGHTS_IN_COORDINATES: 'warning',
  MASSING_HEIGHT_READ_AS_TOP: 'warning',
  MASSING_STOREYS_NOT_READ: 'warning',

  // the blocks, each on its own
  MASSING_HEIGHT_NOT_A_NUMBER: 'error',
  MASSING_TOP_NOT_ABOVE_BASE: 'error',
  MASSING_HEIGHT_OVER_LIMIT: 'error',
  MASSING_BLOCK_BELOW_GROUND: 'warning',
  MASSING_RING_CROSSES_ITSELF: 'error',
  MASSING_HOLE_OUTSIDE: 'error',
  MASSING_HOLE_CROSSES_OUTLINE: 'error',
  MASSING_HOLES_OVERLAP: 'error',
  MASSING_PARTS_OVERLAP: 'warning',
  MASSING_FOOTPRINT_TOO_SMALL: 'error',

  // the blocks in their place
  MASSING_NOTHING_PROPOSED: 'error',
  MASSING_OUTSIDE_MUNICIPALITY: 'error',
  MASSING_OUTSIDE_SITE: 'error',
  MASSING_PARTLY_OUTSIDE_SITE: 'warning',
  MASSING_EXISTING_OUTSIDE_SITE: 'warning',

  // the blocks among each other
  MASSING_BLOCK_REPEATED: 'warning',
  MASSING_BLOCKS_OVERLAP: 'warning',
  MASSING_BLOCK_FLOATS: 'warning',
  MASSING_NOT_ALL_COMPARED: 'warning',
} as const satisfies Record<`MASSING_${string}`, IssueSeverity>;

export type IssueCode = keyof typeof issueSeverities;

/** The block and the place that an issue speaks of; null for the file as a whole. */
export interface IssuePlace {
  feature: string | null;
  lngLat: [number, number] | null;
}

export const wholeFile: IssuePlace = { feature: null, lngLat: null };

/** @param suggestion What to do, as a sentence; empty for a repair that needs nothing. */
export function createIssue(
  code: IssueCode,
  place: IssuePlace,
  message: string,
  suggestion = '',
): MassingIssue {
  return {
    code,
    severity: issueSeverities[code],
    feature: place.feature,
    lngLat: place.lngLat,
    message,
    suggestion,
  };
}

/**
 * Keeps a list of issues readable: of each code the first `most` are given, and one more that says how many
 * were left out.
 */
export function limitIssues(issues: MassingIssue[], most = 25): MassingIssue[] {
  const counts = new Map<string, number>();
  const kept = issues.filter(({ code }) => {
    const count = (counts.get(code) ?? 0) + 1;
    counts.set(code, count);
    return count <= most;
  });
  for (const [code, count] of counts) {
    const first = kept.find((issue) => issue.code === code);
    if (first === undefined || count <= most) continue;
    kept.push({
      ...first,
      ...wholeFile,
      message: `The same (“${first.message}”) was found ${count - most} more times, not listed here.`,
    });
  }
  return kept;
}
