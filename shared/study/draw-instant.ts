import type { MultiPolygon } from 'geojson';
import type { LocalPlane } from '../geometry/local-plane.ts';
import type { Clipper } from '../shadow/clipper.ts';
import {
  drawShadowPolygons,
  type PlanePolygons,
  type ShadowPolygons,
} from '../shadow/shadow-polygons.ts';
import type { InstantLight } from './instant-light.ts';
import type { Scene } from './scene.ts';

/** The shadows on the ground at one instant, in longitude and latitude. */
export interface InstantShadowPolygons {
  at: string;
  /** Degrees clockwise from true north. */
  azimuthDeg: number;
  /** Apparent altitude in degrees. */
  altitudeDeg: number;
  before: MultiPolygon;
  after: MultiPolygon;
  netNew: MultiPolygon;
}

/** Draws one instant's shadows on the plane at datum 0; null with the sun down. */
export function drawInstant(
  clipper: Clipper,
  scene: Scene,
  instant: InstantLight,
  at: string,
): { shadows: InstantShadowPolygons; polygons: ShadowPolygons } | null {
  const layer = instant.layerOn(0);
  if (layer === null) return null;
  const polygons = drawShadowPolygons(clipper, layer);
  return {
    polygons,
    shadows: {
      at,
      ...instant.sun,
      before: toMultiPolygon(polygons.before, scene.plane),
      after: toMultiPolygon(polygons.after, scene.plane),
      netNew: toMultiPolygon(polygons.netNew, scene.plane),
    },
  };
}

/** Closed rings of RFC 7946 with seven decimals, about a centimetre. */
function toMultiPolygon(polygons: PlanePolygons, plane: LocalPlane): MultiPolygon {
  const round = (degrees: number) => Math.round(degrees * 1e7) / 1e7;
  return {
    type: 'MultiPolygon',
    coordinates: polygons.map((rings) =>
      rings.map((ring) => {
        const lngLats = ring.map((point) => plane.toLngLat(point).map(round));
        return [...lngLats, ...lngLats.slice(0, 1)];
      }),
    ),
  };
}
