import type { Feature, FeatureCollection, GeoJsonProperties, Polygon } from 'geojson';
import type { Path } from './path.ts';
import { toLngLat, toPolygonCoordinates } from './plane.ts';
import type { Shape } from './shape.ts';

const utf8 = new TextEncoder();

export const textBytes = (text: string): Uint8Array => utf8.encode(text);

/** JSON with two spaces of indent and a line feed at its end. */
export const jsonBytes = (value: unknown): Uint8Array =>
  textBytes(`${JSON.stringify(value, null, 2)}\n`);

/** GeoJSON with a line for each feature, so that a change to one feature is a change to one line. */
export function collectionBytes(features: readonly Feature[]): Uint8Array {
  const lines = features.map((feature) => JSON.stringify(feature)).join(',\n');
  return textBytes(`{"type":"FeatureCollection","features":[\n${lines}\n]}\n`);
}

export const polygonFeature = (shape: Shape, properties: GeoJsonProperties): Feature<Polygon> => ({
  type: 'Feature',
  properties,
  geometry: { type: 'Polygon', coordinates: toPolygonCoordinates(shape) },
});

/** One polygon where there is one piece, else a multi-polygon. */
export function areaFeature(
  pieces: readonly Shape[],
  properties: GeoJsonProperties,
): FeatureCollection['features'][number] {
  const [first, ...others] = pieces.map(toPolygonCoordinates);
  return first && others.length === 0
    ? { type: 'Feature', properties, geometry: { type: 'Polygon', coordinates: first } }
    : {
        type: 'Feature',
        properties,
        geometry: { type: 'MultiPolygon', coordinates: pieces.map(toPolygonCoordinates) },
      };
}

export const lineFeature = (path: Path, properties: GeoJsonProperties): Feature => ({
  type: 'Feature',
  properties,
  geometry: { type: 'LineString', coordinates: path.map(toLngLat) },
});
