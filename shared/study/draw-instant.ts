import type { MultiPolygon, Position } from 'geojson';
import type { LocalPlane } from '../geometry/local-plane.ts';
import type { Ring } from '../geometry/ring.ts';
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
  const toMultiPolygon = multiPolygonsOf(scene.plane);
  return {
    polygons,
    shadows: {
      at,
      ...instant.sun,
      before: toMultiPolygon(polygons.before),
      after: toMultiPolygon(polygons.after),
      netNew: toMultiPolygon(polygons.netNew),
    },
  };
}

/** The grid of drawn shadows: a hundred-millionth of a degree, about a millimetre. */
export const degreesPerUnit = 1e-8;

const unitsPerDegree = Math.round(1 / degreesPerUnit);

/** Closed rings of RFC 7946 on that grid. What is the same before and after is projected once. */
function multiPolygonsOf(plane: LocalPlane): (polygons: PlanePolygons) => MultiPolygon {
  const round = (degrees: number) => Math.round(degrees * unitsPerDegree) / unitsPerDegree;
  const known = new Map<Ring[], Position[][]>();
  const toLngLats = (ring: Ring): Position[] => {
    const lngLats = ring.map((point) => {
      const [lng, lat] = plane.toLngLat(point);
      return [round(lng), round(lat)];
    });
    const [first] = lngLats;
    if (first !== undefined) lngLats.push(first);
    return lngLats;
  };
  return (polygons) => ({
    type: 'MultiPolygon',
    coordinates: polygons.map((rings) => {
      const lngLats = known.get(rings) ?? rings.map(toLngLats);
      known.set(rings, lngLats);
      return lngLats;
    }),
  });
}
