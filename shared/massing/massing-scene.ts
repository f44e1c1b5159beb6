import type { MultiPolygon, Polygon } from 'geojson';
import { createLocalPlane } from '../geometry/local-plane.ts';
import { boxesOverlap, type PlanePoint, type Ring } from '../geometry/ring.ts';
import {
  countCorners,
  listRings,
  measureOverlap,
  mostComparedEdges,
  toBlockFootprint,
  toPlaneOutlines,
  type BlockFootprint,
} from './block-footprint.ts';
import type { MassingBlock } from './massing-block.ts';
import type { MassingIssue } from './massing-issue.ts';

/** Where a massing is meant to stand. */
export interface MassingSite {
  /** The site's parcels; with none, nothing is checked against the site. */
  parcels: (Polygon | MultiPolygon)[];
  /** The municipality: west, south, east, north in degrees. */
  extent: [number, number, number, number];
  /** The municipality's place, around which lengths and areas are measured. */
  longitude: number;
  latitude: number;
}

/** Two blocks whose footprints lie over one another. */
export interface FootprintOverlap {
  a: BlockFootprint;
  b: BlockFootprint;
  areaM2: number;
  at: PlanePoint;
}

/** What every check looks at, prepared once. */
export interface MassingScene {
  site: MassingSite;
  blocks: readonly MassingBlock[];
  /** The footprints within the municipality: the local plane is true for these alone. */
  located: BlockFootprint[];
  /** The rings of the site's parcels on the plane. */
  siteRings: Ring[];
  overlaps: FootprintOverlap[];
  /** False when there were too many pairs of blocks to compare all. */
  isEveryPairCompared: boolean;
  toLngLat: (at: PlanePoint) => [number, number];
}

export type MassingCheck = (scene: MassingScene) => MassingIssue[];

/** Areas below this are drawing noise: m². */
export const leastAreaM2 = 0.5;

export function createMassingScene(
  blocks: readonly MassingBlock[],
  site: MassingSite,
): MassingScene {
  const plane = createLocalPlane(site.longitude, site.latitude);
  const located = blocks
    .filter((block) => findPositionOutside(block, site.extent) === null)
    .map((block) => toBlockFootprint(block, plane));
  return {
    site,
    blocks,
    located,
    siteRings: site.parcels.flatMap((parcel) => toPlaneOutlines(parcel, plane).flat()),
    ...listOverlaps(located),
    toLngLat: (at) => {
      const [lng, lat] = plane.toLngLat(at);
      return [roundDegrees(lng), roundDegrees(lat)];
    },
  };
}

/** The first corner of a block's footprint that lies outside of west, south, east, north. */
export function findPositionOutside(
  { geometry }: MassingBlock,
  [west, south, east, north]: MassingSite['extent'],
): [number, number] | null {
  for (const [lng = NaN, lat = NaN] of listRings(geometry).flat()) {
    if (!(lng >= west && lng <= east && lat >= south && lat <= north)) return [lng, lat];
  }
  return null;
}

function listOverlaps(
  footprints: readonly BlockFootprint[],
): Pick<MassingScene, 'overlaps' | 'isEveryPairCompared'> {
  const overlaps: FootprintOverlap[] = [];
  const byWest = footprints.toSorted((a, b) => a.box.minX - b.box.minX);
  let edges = 0;
  for (const [index, a] of byWest.entries()) {
    for (const b of byWest.slice(index + 1)) {
      if (b.box.minX >= a.box.maxX) break;
      edges += 1;
      if (!boxesOverlap(a.box, b.box)) continue;
      edges += countCorners(a) + countCorners(b);
      if (edges > mostComparedEdges) return { overlaps, isEveryPairCompared: false };
      const overlap = measureOverlap(a, b);
      if (overlap === null) return { overlaps, isEveryPairCompared: false };
      const { areaM2, at } = overlap;
      if (areaM2 >= leastAreaM2 && at !== null) overlaps.push({ a, b, areaM2, at });
    }
  }
  return { overlaps, isEveryPairCompared: true };
}

/** 7 decimals are about a centimetre. */
function roundDegrees(degrees: number): number {
  return Math.round(degrees * 1e7) / 1e7;
}

/** A block's first corner, to point at it. */
export function findFirstCorner({ geometry }: MassingBlock): [number, number] | null {
  const [lng, lat] = listRings(geometry)[0]?.[0] ?? [];
  return lng === undefined || lat === undefined ? null : [lng, lat];
}
