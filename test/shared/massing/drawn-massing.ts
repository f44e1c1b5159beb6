import { createLocalPlane } from '../../../shared/geometry/local-plane.ts';
import type { MassingSite } from '../../../shared/massing/check-massing.ts';
import type { MassingBlock } from '../../../shared/massing/massing-block.ts';
import type { MassingIssue } from '../../../shared/massing/massing-issue.ts';
import { readMassing } from '../../../shared/massing/read-massing.ts';

/** Small scenes drawn in metres east and north of 46.75 N, 91.30 W. */

export type Point = [number, number];

const place = { longitude: -91.3, latitude: 46.75 };
const plane = createLocalPlane(place.longitude, place.latitude);

export function lngLatAt(x: number, y: number): Point {
  return plane.toLngLat([x, y]);
}

export function metresAt(lngLat: Point | null): Point {
  if (lngLat === null) throw new Error('The issue names no place.');
  return plane.toPlane(lngLat);
}

/** A closed ring of longitude and latitude through corners in metres. */
export function ring(...corners: Point[]): Point[] {
  const [first] = corners;
  if (first === undefined) return [];
  return [...corners, first].map(([x, y]) => lngLatAt(x, y));
}

/** The closed counter-clockwise ring of a rectangle by its south-west corner, width and depth in metres. */
export function rectangle(x: number, y: number, width: number, depth: number): Point[] {
  return ring([x, y], [x + width, y], [x + width, y + depth], [x, y + depth]);
}

/** A proposed block from the ground to 10 m, unless told otherwise. */
export function block(
  id: string,
  rings: Point[][],
  rest: Partial<Omit<MassingBlock, 'id'>> = {},
): MassingBlock {
  return {
    id,
    role: 'proposed',
    geometry: { type: 'Polygon', coordinates: rings },
    baseM: 0,
    topM: 10,
    storeys: null,
    name: null,
    ...rest,
  };
}

/** One parcel, 100 m east and 80 m north of the origin, in a municipality of some kilometres. */
export const site: MassingSite = {
  parcels: [{ type: 'Polygon', coordinates: [rectangle(0, 0, 100, 80)] }],
  extent: [-91.35, 46.72, -91.25, 46.78],
  ...place,
};

export function feature(
  properties: Record<string, unknown> | null,
  coordinates: unknown = [rectangle(10, 10, 20, 15)],
  type = 'Polygon',
) {
  return { type: 'Feature', properties, geometry: { type, coordinates } };
}

export function bytesOf(value: unknown): Uint8Array {
  return new TextEncoder().encode(typeof value === 'string' ? value : JSON.stringify(value));
}

export function read(value: unknown, fileName = 'tower.geojson') {
  const reading = readMassing(bytesOf(value), fileName);
  return { ...reading, blocks: reading.ok ? reading.blocks : [] };
}

export function readFeatures(...features: unknown[]) {
  return read({ type: 'FeatureCollection', features });
}

export function codesOf(issues: readonly MassingIssue[]): string[] {
  return issues.map(({ code }) => code);
}

/** The only issue of a code. */
export function issueOf(issues: readonly MassingIssue[], code: string): MassingIssue {
  const [issue, ...others] = issues.filter((candidate) => candidate.code === code);
  if (issue === undefined || others.length > 0) {
    throw new Error(`Expected ${code} once among: ${codesOf(issues).join(', ')}`);
  }
  return issue;
}
