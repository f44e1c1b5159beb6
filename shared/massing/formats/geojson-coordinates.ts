import { placeAt, type BlockLabel } from '../block-label.ts';
import { createIssue } from '../issue-severities.ts';
import type { MassingIssue } from '../massing-issue.ts';
import { showValue } from '../plain-text.ts';
import type { LngLat } from '../repair-footprint.ts';
import { isRecord } from './json-document.ts';

export type ReadCoordinates =
  { ok: true; polygons: LngLat[][][]; hasHeights: boolean } | { ok: false; issue: MassingIssue };

/**
 * Reads the coordinates of a MultiPolygon: polygons of rings of positions, each position longitude and latitude in
 * degrees. Third coordinates are left out and reported by `hasHeights`.
 */
export function readCoordinates(
  coordinates: readonly unknown[],
  label: BlockLabel,
): ReadCoordinates {
  const polygons: LngLat[][][] = [];
  let hasHeights = false;
  for (const rings of coordinates) {
    if (!isFilledList(rings)) return { ok: false, issue: describeShape(rings, label) };
    const polygon: LngLat[][] = [];
    for (const ring of rings) {
      if (!isFilledList(ring)) return { ok: false, issue: describeShape(ring, label) };
      const points: LngLat[] = [];
      for (const value of ring) {
        const point = readPosition(value);
        if (point === null) return { ok: false, issue: describePoint(value, label) };
        hasHeights ||= Array.isArray(value) && value.length > 2;
        points.push(point);
      }
      polygon.push(points);
    }
    polygons.push(polygon);
  }
  const issue = checkOnGlobe(polygons.flat(2), label);
  return issue === null ? { ok: true, polygons, hasHeights } : { ok: false, issue };
}

/** How many positions stand in the features' coordinates, at whatever depth. */
export function countPositions(features: readonly unknown[]): number {
  let count = 0;
  const waiting: unknown[] = features.map((feature) =>
    isRecord(feature) ? feature.geometry : null,
  );
  while (waiting.length > 0) {
    const value = waiting.pop();
    if (Array.isArray(value)) {
      if (typeof value[0] === 'number') count++;
      else for (const part of value) waiting.push(part);
    } else if (isRecord(value)) waiting.push(value.coordinates, value.geometries);
  }
  return count;
}

/** The first position in a geometry's coordinates, to point at it; null where there is none on the globe. */
export function findFirstPosition(coordinates: unknown): LngLat | null {
  let value = coordinates;
  while (Array.isArray(value) && Array.isArray(value[0])) value = value[0];
  const position = readPosition(value);
  return position !== null && isOnGlobe(position) ? position : null;
}

function readPosition(value: unknown): LngLat | null {
  if (!Array.isArray(value)) return null;
  const [x, y] = value as unknown[];
  if (typeof x !== 'number' || typeof y !== 'number') return null;
  return Number.isFinite(x) && Number.isFinite(y) ? [x, y] : null;
}

/** Longitudes and latitudes beyond their range, told apart by what they look like. */
function checkOnGlobe(points: readonly LngLat[], label: BlockLabel): MassingIssue | null {
  const wrong = points.find((point) => !isOnGlobe(point));
  if (wrong === undefined) return null;
  const [x, y] = wrong;
  if (points.every((point) => isSwapped(point))) {
    return createIssue(
      'MASSING_COORDINATES_SWAPPED',
      placeAt(label, [y, x]),
      `${label.text} has its coordinates the wrong way round: [${x}, ${y}] is latitude before longitude.`,
      'Export it again with longitude first, as GeoJSON has it.',
    );
  }
  return createIssue(
    'MASSING_COORDINATES_PROJECTED',
    placeAt(label, null),
    `${label.text} has the point [${x}, ${y}], which is no longitude and latitude; it looks like metres or feet of a projected system.`,
    'Export it again in WGS 84 (EPSG:4326), in degrees.',
  );
}

function isOnGlobe([x, y]: LngLat): boolean {
  return Math.abs(x) <= 180 && Math.abs(y) <= 90;
}

/** Off the globe as it stands, and on it the other way round. */
function isSwapped([x, y]: LngLat): boolean {
  return !isOnGlobe([x, y]) && isOnGlobe([y, x]);
}

function describeShape(value: unknown, label: BlockLabel): MassingIssue {
  return createIssue(
    'MASSING_COORDINATE_INVALID',
    placeAt(label, null),
    `${label.text} has ${showValue(value)} where a ring of points was expected.`,
    'Export the block again as a GeoJSON Polygon.',
  );
}

function describePoint(value: unknown, label: BlockLabel): MassingIssue {
  return createIssue(
    'MASSING_COORDINATE_INVALID',
    placeAt(label, null),
    `${label.text} has a point that is not a pair of numbers: ${showValue(value)}.`,
    'Give every point as [longitude, latitude] in degrees.',
  );
}

function isFilledList(value: unknown): value is unknown[] {
  return Array.isArray(value) && value.length > 0;
}
