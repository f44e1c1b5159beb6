import type { MultiPolygon, Polygon, Position } from 'geojson';
import type { LocalPlane } from '../geometry/local-plane.ts';
import {
  boxesOverlap,
  boxOfRings,
  orientRing,
  type Box,
  type PlanePoint,
  type Ring,
} from '../geometry/ring.ts';
import { measureWhere } from './footprint-sweep.ts';
import type { MassingBlock } from './massing-block.ts';

/** Outline first, then its holes; outline counter-clockwise, holes clockwise. */
export type PlaneOutline = readonly Ring[];

/** Edges looked at in comparing pairs of blocks, at most: about a second's work. */
export const mostComparedEdges = 500_000;

/** A block with its footprint on the local plane, in metres. */
export interface BlockFootprint {
  block: MassingBlock;
  /** One outline for a Polygon, any number for a MultiPolygon. */
  outlines: PlaneOutline[];
  /** All rings of all outlines. */
  rings: Ring[];
  box: Box;
  /** The NonZero fill of the rings; null where they cross too often to be measured. */
  areaM2: number | null;
}

export function toBlockFootprint(block: MassingBlock, plane: LocalPlane): BlockFootprint {
  const outlines = toPlaneOutlines(block.geometry, plane);
  const rings = outlines.flat();
  return {
    block,
    outlines,
    rings,
    box: boxOfRings(rings),
    areaM2: measureWhere([rings], ([winding]) => winding !== 0)?.areaM2 ?? null,
  };
}

/** Puts a footprint onto the plane with its rings turned as `PlaneOutline` says. */
export function toPlaneOutlines(
  geometry: Polygon | MultiPolygon,
  plane: LocalPlane,
): PlaneOutline[] {
  const parts = geometry.type === 'Polygon' ? [geometry.coordinates] : geometry.coordinates;
  return parts.map((rings) =>
    rings.map((ring, index) =>
      orientRing(toPlaneRing(ring, plane), index === 0 ? 'outer' : 'hole'),
    ),
  );
}

/** All rings of a footprint, in the file's order. */
export function listRings({ type, coordinates }: Polygon | MultiPolygon): Position[][] {
  return type === 'Polygon' ? coordinates : coordinates.flat();
}

/** The plan area that two footprints share, and the middle of its largest piece; null where it can't be measured. */
export function measureOverlap(
  a: BlockFootprint,
  b: BlockFootprint,
): { areaM2: number; at: PlanePoint | null } | null {
  if (!boxesOverlap(a.box, b.box)) return { areaM2: 0, at: null };
  return measureWhere([a.rings, b.rings], ([inA, inB]) => inA !== 0 && inB !== 0);
}

export function countCorners({ rings }: BlockFootprint): number {
  return rings.reduce((sum, ring) => sum + ring.length, 0);
}

/** How much of their heights two blocks share, in metres. */
export function sharedHeightM(a: MassingBlock, b: MassingBlock): number {
  return Math.max(0, Math.min(a.topM, b.topM) - Math.max(a.baseM, b.baseM));
}

function toPlaneRing(ring: readonly Position[], plane: LocalPlane): Ring {
  const points: PlanePoint[] = ring.map(([lng = NaN, lat = NaN]) => plane.toPlane([lng, lat]));
  const first = points[0];
  const last = points.at(-1);
  const isClosed = points.length > 1 && first?.[0] === last?.[0] && first?.[1] === last?.[1];
  return isClosed ? points.slice(0, -1) : points;
}
