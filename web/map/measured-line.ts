import type { LngLat } from '../../shared/geometry/geojson-schema.ts';
import { createLocalPlane } from '../../shared/geometry/local-plane.ts';

/** The stretches of a line over level ground in metres, on a plane centred on its first point. */
export function stretchesM(points: readonly LngLat[]): number[] {
  const [first] = points;
  if (first === undefined) return [];
  const plane = createLocalPlane(first[0], first[1]);
  const onPlane = points.map((point) => plane.toPlane(point));
  return onPlane.slice(1).map(([x, y], index) => {
    const [fromX, fromY] = onPlane[index] ?? [x, y];
    return Math.hypot(x - fromX, y - fromY);
  });
}

/** The line and its points as the map draws them. */
export function measureFeatures(points: readonly LngLat[]): GeoJSON.FeatureCollection {
  const coordinates = [...points];
  const feature = (geometry: GeoJSON.Geometry): GeoJSON.Feature => ({
    type: 'Feature',
    properties: {},
    geometry,
  });
  return {
    type: 'FeatureCollection',
    features: [
      ...(coordinates.length < 2 ? [] : [feature({ type: 'LineString', coordinates })]),
      ...coordinates.map((point) => feature({ type: 'Point', coordinates: point })),
    ],
  };
}
