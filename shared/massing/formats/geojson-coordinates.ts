import type { Position } from 'geojson';
import { placeAt, type BlockLabel } from '../block-label.ts';
import { createIssue, type IssueCode } from '../issue-severities.ts';
import type { MassingIssue } from '../massing-issue.ts';
import { isRecord } from './json-document.ts';

type LngLat = [number, number];

export interface ReadPolygons {
  /** Null when something in them could not be read; the issues then say what. */
  polygons: LngLat[][][] | null;
  issues: MassingIssue[];
  /** Third coordinates were there and left out. */
  hasHeights: boolean;
}

/** Points closer than this are one point: about 0.1 mm on the ground. */
const samePointDeg = 1e-9;

/** How many positions stand in the features' coordinates, at whatever depth. */
export function countPositions(features: readonly unknown[]): number {
  let count = 0;
  // The depth of the document is limited before, so the stack stays small.
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

/**
 * Reads the coordinates of polygons (each: outline, then holes) and puts right what can be put right without
 * changing the shape: rings are closed, repeated points dropped, rings turned as RFC 7946 (section 3.1.6) has it.
 */
export function readPolygons(coordinates: readonly unknown[], label: BlockLabel): ReadPolygons {
  const reader = createRingReader(label);
  const polygons = coordinates.map((rings) =>
    Array.isArray(rings) && rings.length > 0
      ? rings.map((ring, index) => reader.readRing(ring, index === 0))
      : [reader.readRing(rings, true)],
  );
  return {
    polygons: reader.hasFailed() ? null : polygons,
    issues: reader.listIssues(),
    hasHeights: reader.hasHeights(),
  };
}

function createRingReader(label: BlockLabel) {
  let failure: MassingIssue | null = null;
  let heights = false;
  const opened: LngLat[] = [];
  const repeated: LngLat[] = [];
  const turned: LngLat[] = [];

  function fail(code: IssueCode, lngLat: LngLat | null, message: string, suggestion: string) {
    failure ??= createIssue(code, placeAt(label, lngLat), message, suggestion);
  }

  /** Longitude and latitude of one position, or null after saying why not. */
  function readPoint(value: unknown): LngLat | null {
    const position = readPosition(value);
    if (position === null) {
      fail(
        'MASSING_COORDINATE_INVALID',
        null,
        `${label.text} has a point that is not a pair of numbers: ${show(value)}.`,
        'Give every point as [longitude, latitude] in degrees.',
      );
      return null;
    }
    if (Array.isArray(value) && value.length > 2) heights = true;
    if (isOnGlobe(position)) return position;
    const [x, y] = position;
    if (isOnGlobe([y, x])) {
      fail(
        'MASSING_COORDINATES_SWAPPED',
        [y, x],
        `${label.text} has its coordinates the wrong way round: [${x}, ${y}] is latitude before longitude.`,
        'Export it again with longitude first, as GeoJSON has it.',
      );
    } else {
      fail(
        'MASSING_COORDINATES_PROJECTED',
        null,
        `${label.text} has the point [${x}, ${y}], which is no longitude and latitude; it looks like metres or feet of a projected system.`,
        'Export it again in WGS 84 (EPSG:4326), in degrees.',
      );
    }
    return null;
  }

  function readRing(value: unknown, isOutline: boolean): LngLat[] {
    if (!Array.isArray(value)) {
      fail(
        'MASSING_COORDINATE_INVALID',
        null,
        `${label.text} has ${show(value)} where a ring of points was expected.`,
        'Export the block again as a GeoJSON Polygon.',
      );
      return [];
    }
    const points: LngLat[] = [];
    for (const item of value) {
      const point = readPoint(item);
      if (point === null) return [];
      const previous = points.at(-1);
      if (previous !== undefined && isSamePoint(previous, point)) repeated.push(point);
      else points.push(point);
    }
    const first = points[0];
    const last = points.at(-1);
    if (first !== undefined && last !== undefined && points.length > 1) {
      if (isSamePoint(first, last)) points.pop();
      else opened.push(last);
    }
    if (first === undefined || points.length < 3) {
      fail(
        'MASSING_TOO_FEW_POINTS',
        first ?? null,
        `${label.text} has ${isOutline ? 'an outline' : 'a hole'} of fewer than 4 points (the first one repeated at the end), so it encloses nothing.`,
        isOutline
          ? 'Draw the footprint as a closed polygon.'
          : 'Draw the hole as a closed polygon, or leave it out.',
      );
      return [];
    }
    if (isCounterClockwise(points) !== isOutline) {
      turned.push(first);
      // The ring keeps its first point.
      points.reverse().unshift(first);
      return points;
    }
    points.push(first);
    return points;
  }

  /** One issue for each kind of repair. */
  function listIssues(): MassingIssue[] {
    if (failure !== null) return [failure];
    const issues: MassingIssue[] = [];
    const say = (code: IssueCode, places: LngLat[], message: string) => {
      const lngLat = places[0];
      if (lngLat !== undefined) issues.push(createIssue(code, placeAt(label, lngLat), message));
    };
    say(
      'MASSING_RING_OPEN',
      opened,
      `${label.text}: ${count(opened, 'ring was', 'rings were')} not closed; the first point was repeated at the end.`,
    );
    say(
      'MASSING_POINTS_REPEATED',
      repeated,
      `${label.text}: ${count(repeated, 'point that repeated the one before was', 'points that repeated the one before were')} dropped.`,
    );
    say(
      'MASSING_RING_ORIENTATION',
      turned,
      `${label.text}: ${count(turned, 'ring was', 'rings were')} turned round (outlines run counter-clockwise, holes clockwise); the shape is the same.`,
    );
    return issues;
  }

  return {
    readRing,
    listIssues,
    hasFailed: () => failure !== null,
    hasHeights: () => heights,
  };
}

function readPosition(value: unknown): LngLat | null {
  if (!Array.isArray(value)) return null;
  const [x, y] = value as unknown[];
  if (typeof x !== 'number' || typeof y !== 'number') return null;
  return Number.isFinite(x) && Number.isFinite(y) ? [x, y] : null;
}

function isOnGlobe([x, y]: LngLat): boolean {
  return Math.abs(x) <= 180 && Math.abs(y) <= 90;
}

function isSamePoint(a: LngLat, b: LngLat): boolean {
  return Math.abs(a[0] - b[0]) < samePointDeg && Math.abs(a[1] - b[1]) < samePointDeg;
}

/** By the sign of the shoelace sum; only the sense of the ring is taken from it, no measure. */
function isCounterClockwise(points: readonly Position[]): boolean {
  const [originX = 0, originY = 0] = points[0] ?? [];
  let [previousX = 0, previousY = 0] = points.at(-1) ?? [];
  let sum = 0;
  for (const [x = 0, y = 0] of points) {
    sum += (previousX - originX) * (y - originY) - (x - originX) * (previousY - originY);
    previousX = x;
    previousY = y;
  }
  return sum > 0;
}

function count(places: LngLat[], one: string, many: string): string {
  return `${places.length} ${places.length === 1 ? one : many}`;
}

function show(value: unknown): string {
  const text = JSON.stringify(value) as string | undefined;
  if (text === undefined) return 'nothing';
  return text.length > 60 ? `${text.slice(0, 57)}…` : text;
}
