import { labelFeature, placeAt, type BlockLabel } from '../block-label.ts';
import { readBlockProperties } from '../block-properties.ts';
import { createIssue, type IssueCode } from '../issue-severities.ts';
import type { MassingBlock } from '../massing-block.ts';
import type { MassingIssue } from '../massing-issue.ts';
import type { UnnamedBlock } from '../name-blocks.ts';
import { cleanText, cutText } from '../plain-text.ts';
import { repairFootprint, type LngLat } from '../repair-footprint.ts';
import { findFirstPosition, readCoordinates } from './geojson-coordinates.ts';
import { isRecord } from './json-document.ts';

export interface ReadFeature {
  /** Null when the feature could not be read; the issues then say why. */
  block: UnnamedBlock | null;
  issues: MassingIssue[];
  label: BlockLabel;
  /** Its coordinates had heights, which were left out. */
  hasHeights: boolean;
}

/** Reads one GeoJSON feature as a block. @param number Its place in the file, counted from 1. */
export function readGeojsonFeature(feature: unknown, number: number): ReadFeature {
  const record = isRecord(feature) ? feature : {};
  const properties = isRecord(record.properties) ? record.properties : {};
  const id = readText(properties.id) ?? readText(record.id);
  const name = readText(properties.name);
  const label = labelFeature(id, name, number);

  const geometry = readGeometry(feature, label);
  if (!geometry.ok) return { block: null, issues: [geometry.issue], label, hasHeights: false };

  const { coordinates, type } = geometry;
  const drawn = readCoordinates(type === 'Polygon' ? [coordinates] : coordinates, label);
  const read = readBlockProperties(properties, label, findFirstPosition(coordinates));
  if (!drawn.ok) {
    return { block: null, issues: [drawn.issue, ...read.issues], label, hasHeights: false };
  }
  const { hasHeights } = drawn;
  const footprint = repairFootprint(drawn.polygons, label);
  const issues = [...footprint.issues, ...read.issues];
  if (footprint.polygons === null || read.properties === null) {
    return { block: null, issues, label, hasHeights };
  }
  const drawing = toGeometry(type, footprint.polygons);
  return {
    block: { id, label, name, ...read.properties, geometry: drawing },
    issues,
    label,
    hasHeights,
  };
}

type ReadGeometry =
  | { ok: true; type: 'Polygon' | 'MultiPolygon'; coordinates: unknown[] }
  | { ok: false; issue: MassingIssue };

function readGeometry(feature: unknown, label: BlockLabel): ReadGeometry {
  const refuse = (
    code: IssueCode,
    message: string,
    suggestion: string,
    lngLat: LngLat | null = null,
  ): ReadGeometry => ({
    ok: false,
    issue: createIssue(code, placeAt(label, lngLat), message, suggestion),
  });

  if (!isRecord(feature) || feature.type !== 'Feature') {
    return refuse(
      'MASSING_FEATURE_INVALID',
      `${label.text} is no GeoJSON feature.`,
      'Export the massing again as a GeoJSON FeatureCollection.',
    );
  }
  const { geometry } = feature;
  if (!isRecord(geometry)) {
    return refuse(
      'MASSING_GEOMETRY_MISSING',
      `${label.text} has no geometry.`,
      'Draw its footprint as a polygon, or take the feature out.',
    );
  }
  const { type } = geometry;
  if (type === 'GeometryCollection') {
    const parts = Array.isArray(geometry.geometries) ? geometry.geometries : [];
    const lngLat = isRecord(parts[0]) ? findFirstPosition(parts[0].coordinates) : null;
    return refuse(
      'MASSING_GEOMETRY_COLLECTION',
      `${label.text} is a collection of ${parts.length} geometries, which is not read.`,
      'Make each part a feature of its own, with base and top.',
      lngLat,
    );
  }
  if (type !== 'Polygon' && type !== 'MultiPolygon') {
    return refuse(
      'MASSING_GEOMETRY_NOT_A_FOOTPRINT',
      `${label.text} is a ${typeof type === 'string' ? cutText(cleanText(type), 50) : 'geometry without a type'}, which has no footprint.`,
      'Draw the footprint as a closed polygon, or take the feature out of the file.',
      findFirstPosition(geometry.coordinates),
    );
  }
  if (!Array.isArray(geometry.coordinates) || geometry.coordinates.length === 0) {
    return refuse(
      'MASSING_GEOMETRY_MISSING',
      `${label.text} is a ${type} without coordinates.`,
      'Draw its footprint as a polygon, or take the feature out.',
    );
  }
  return { ok: true, type, coordinates: geometry.coordinates };
}

function toGeometry(
  type: 'Polygon' | 'MultiPolygon',
  polygons: LngLat[][][],
): MassingBlock['geometry'] {
  const [only] = polygons;
  return type === 'Polygon' && only !== undefined
    ? { type: 'Polygon', coordinates: only }
    : { type: 'MultiPolygon', coordinates: polygons };
}

/** An id or a name: text that says something, or a number. */
function readText(value: unknown): string | null {
  if (typeof value === 'number') return Number.isFinite(value) ? String(value) : null;
  if (typeof value !== 'string') return null;
  const text = value.trim();
  return text === '' ? null : text;
}
