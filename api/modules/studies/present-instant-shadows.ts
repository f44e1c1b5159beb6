import type { MultiPolygon } from 'geojson';
import type { InstantShadows, ShadowKind } from '../../../shared/contracts/studies.ts';
import type { InstantShadowPolygons } from '../../../shared/study/draw-instant.ts';
import { makePolygonsValid } from '../../valid-polygons.ts';

const kinds: readonly ShadowKind[] = ['before', 'after', 'netNew'];

/** The shadows of one instant as valid GeoJSON, one feature for each kind. */
export async function presentInstantShadows(drawn: InstantShadowPolygons): Promise<InstantShadows> {
  return {
    type: 'FeatureCollection',
    at: drawn.at,
    azimuthDeg: drawn.azimuthDeg,
    altitudeDeg: drawn.altitudeDeg,
    features: await Promise.all(
      kinds.map(async (kind) => ({
        type: 'Feature' as const,
        properties: { kind },
        geometry: {
          type: 'MultiPolygon' as const,
          coordinates: toLngLats(await makePolygonsValid(drawn[kind])),
        },
      })),
    ),
  };
}

function toLngLats({ coordinates }: MultiPolygon): [number, number][][][] {
  return coordinates.map((rings) =>
    rings.map((ring) => ring.map(([lng = NaN, lat = NaN]): [number, number] => [lng, lat])),
  );
}
