import type { MultiPolygon } from 'geojson';
import type { InstantShadows, ShadowKind } from '../contracts/studies.ts';
import type { InstantShadowPolygons } from './draw-instant.ts';

const kinds: readonly ShadowKind[] = ['before', 'after', 'netNew'];

/** The shadows of one instant as GeoJSON, one feature for each kind. */
export function presentShadows(drawn: InstantShadowPolygons): InstantShadows {
  return {
    type: 'FeatureCollection',
    at: drawn.at,
    azimuthDeg: drawn.azimuthDeg,
    altitudeDeg: drawn.altitudeDeg,
    features: kinds.map((kind) => ({
      type: 'Feature',
      properties: { kind },
      geometry: { type: 'MultiPolygon', coordinates: toLngLats(drawn[kind]) },
    })),
  };
}

function toLngLats({ coordinates }: MultiPolygon): [number, number][][][] {
  return coordinates.map((rings) =>
    rings.map((ring) => ring.map(([lng = NaN, lat = NaN]): [number, number] => [lng, lat])),
  );
}
