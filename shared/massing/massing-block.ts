import type { MultiPolygon, Polygon } from 'geojson';

/** What an applicant's block does to the site: it comes, or it is there now and is removed. */
export type MassingRole = 'proposed' | 'existing';

/** One vertical prism as an applicant sent it: footprint on WGS 84, heights in metres above the site's ground. */
export interface MassingBlock {
  /** Unique in its massing. */
  id: string;
  role: MassingRole;
  geometry: Polygon | MultiPolygon;
  baseM: number;
  topM: number;
  storeys: number | null;
  name: string | null;
}
