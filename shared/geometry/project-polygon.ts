import type { Polygonal } from './geojson-schema.ts';
import type { LocalPlane } from './local-plane.ts';
import { orientRing, signedRingArea, type Ring } from './ring.ts';

/**
 * The rings of a GeoJSON polygon on the local plane in metres: outer rings counter-clockwise,
 * holes clockwise, the closing point and points that repeat their neighbour left out, rings
 * without any area dropped. Parts of a MultiPolygon follow one another.
 */
export function projectPolygon(geometry: Polygonal, plane: LocalPlane): Ring[] {
  return polygonsOf(geometry).flatMap((polygon) =>
    polygon.flatMap((lngLats, index) => {
      const ring = withoutRepeats(lngLats.map((lngLat) => plane.toPlane(lngLat)));
      if (ring.length < 3 || signedRingArea(ring) === 0) return [];
      return [orientRing(ring, index === 0 ? 'outer' : 'hole')];
    }),
  );
}

/** The polygons of a Polygon or MultiPolygon, each as its rings of longitude and latitude. */
export function polygonsOf(geometry: Polygonal): [number, number][][][] {
  return geometry.type === 'Polygon' ? [geometry.coordinates] : geometry.coordinates;
}

function withoutRepeats(points: [number, number][]): [number, number][] {
  return points.filter((point, index) => {
    const next = points[(index + 1) % points.length];
    return next !== undefined && (point[0] !== next[0] || point[1] !== next[1]);
  });
}
