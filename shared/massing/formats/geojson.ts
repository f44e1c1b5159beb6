import { createIssue, wholeFile, type IssueCode } from '../issue-severities.ts';
import type { MassingIssue } from '../massing-issue.ts';
import { massingLimits } from '../massing-limits.ts';
import type { ReadMassing } from '../massing-reading.ts';
import { nameBlocks, type UnnamedBlock } from '../name-blocks.ts';
import { showValue } from '../plain-text.ts';
import { countPositions } from './geojson-coordinates.ts';
import { readGeojsonFeature } from './geojson-feature.ts';
import { isRecord, parseJsonDocument } from './json-document.ts';
import type { MassingFile, MassingFormat } from './massing-format.ts';

/** GeoJSON by RFC 7946: longitude and latitude on WGS 84. Heights come from each feature's properties. */
export const geojsonFormat: MassingFormat = {
  name: 'GeoJSON',
  recognises: ({ head }) => head.startsWith('{') || head.startsWith('['),
  read: readGeojson,
};

const geometryTypes = [
  'Point',
  'MultiPoint',
  'LineString',
  'MultiLineString',
  'Polygon',
  'MultiPolygon',
  'GeometryCollection',
];

/** Other JSON that draws buildings or maps, by the `type` that it starts with. */
const otherJson: Record<string, string> = {
  CityJSON: 'CityJSON',
  CityJSONFeature: 'CityJSON',
  Topology: 'TopoJSON',
};

/** How WGS 84 is called: urn:ogc:def:crs:OGC:1.3:CRS84, EPSG:4326, urn:ogc:def:crs:EPSG::4326, WGS 84. */
const wgs84Names = /(^|[:/])CRS84$|EPSG[:/](.*[:/])?4326$|^WGS ?84$/i;

function readGeojson({ bytes, fileName }: MassingFile): ReadMassing {
  const document = parseJsonDocument(bytes, fileName);
  if (!document.ok) return { ok: false, issues: [document.issue] };

  const root = document.value;
  const features = listFeatures(root);
  if (features === null) return refuseDocument(root, fileName);
  const crsIssue = checkCrs(root, fileName);
  if (crsIssue !== null) return { ok: false, issues: [crsIssue] };
  if (features.length === 0) {
    return refuse(
      'MASSING_NO_FEATURES',
      `${fileName} holds no features.`,
      'Send one polygon for each block, with base and top in metres.',
    );
  }
  if (features.length > massingLimits.features) {
    return refuse(
      'MASSING_TOO_MANY_FEATURES',
      `${fileName} has ${features.length} features; at most ${massingLimits.features} are read.`,
      'Send the massing alone: one footprint for each block, without surroundings.',
    );
  }
  const vertices = countPositions(features);
  if (vertices > massingLimits.vertices) {
    return refuse(
      'MASSING_TOO_MANY_VERTICES',
      `${fileName} has ${vertices} points; at most ${massingLimits.vertices} are read.`,
      'Simplify the massing: one footprint for each block, curves as chords of about a metre.',
    );
  }
  return readFeatures(features);
}

function readFeatures(features: unknown[]): ReadMassing {
  const issues: MassingIssue[] = [];
  const blocks: UnnamedBlock[] = [];
  const heightened: string[] = [];
  features.forEach((feature, index) => {
    const reading = readGeojsonFeature(feature, index + 1);
    issues.push(...reading.issues);
    if (reading.block !== null) blocks.push(reading.block);
    if (reading.hasHeights) heightened.push(reading.label.text);
  });
  if (heightened.length > 0) {
    const others = heightened.length - 1;
    issues.push(
      createIssue(
        'MASSING_HEIGHTS_IN_COORDINATES',
        wholeFile,
        `The heights in the coordinates of ${heightened[0] ?? ''}${others > 0 ? ` and ${others} more` : ''} were left out: heights are read from base and top alone.`,
        'Check that base and top say what the drawing shows.',
      ),
    );
  }
  const named = nameBlocks(blocks);
  return { ok: true, blocks: named.blocks, issues: [...issues, ...named.issues] };
}

/** The features of a FeatureCollection, a Feature or a bare geometry; null for anything else. */
function listFeatures(root: unknown): unknown[] | null {
  if (!isRecord(root)) return null;
  if (root.type === 'FeatureCollection') return Array.isArray(root.features) ? root.features : null;
  if (root.type === 'Feature') return [root];
  if (typeof root.type === 'string' && geometryTypes.includes(root.type)) {
    return [{ type: 'Feature', geometry: root, properties: null }];
  }
  return null;
}

function refuseDocument(root: unknown, fileName: string): ReadMassing {
  const type = isRecord(root) && typeof root.type === 'string' ? root.type : null;
  const other = isRecord(root) ? nameOtherJson(root) : undefined;
  if (other !== undefined) {
    return refuse(
      'MASSING_FORMAT_NOT_READ',
      `${fileName} is ${other}, which is not read yet.`,
      'Send the massing as GeoJSON: one polygon for each block, on WGS 84, with base and top in metres.',
    );
  }
  return refuse(
    'MASSING_GEOJSON_TYPE',
    type === 'FeatureCollection'
      ? `${fileName} is a FeatureCollection without a list of features.`
      : `${fileName} is JSON, but no GeoJSON FeatureCollection, Feature or geometry.`,
    'Export the massing again as a GeoJSON FeatureCollection.',
  );
}

function nameOtherJson({ type, geometryType }: Record<string, unknown>): string | undefined {
  if (typeof geometryType === 'string' && geometryType.startsWith('esri')) return 'Esri JSON';
  return typeof type === 'string' && Object.hasOwn(otherJson, type) ? otherJson[type] : undefined;
}

/** GeoJSON of 2008 could name another system; RFC 7946 (section 4) knows WGS 84 alone. */
function checkCrs(root: unknown, fileName: string): MassingIssue | null {
  if (!isRecord(root) || root.crs === undefined || root.crs === null) return null;
  const properties = isRecord(root.crs) ? root.crs.properties : null;
  const name = isRecord(properties) && typeof properties.name === 'string' ? properties.name : null;
  if (name !== null && wgs84Names.test(name.trim())) return null;
  return createIssue(
    'MASSING_CRS_NOT_READ',
    wholeFile,
    `${fileName} says that its coordinates are in ${name === null ? 'a system that it does not name' : showValue(name)}; GeoJSON is read as longitude and latitude on WGS 84 alone.`,
    'Export it again in WGS 84 (EPSG:4326).',
  );
}

function refuse(code: IssueCode, message: string, suggestion: string): ReadMassing {
  return { ok: false, issues: [createIssue(code, wholeFile, message, suggestion)] };
}
