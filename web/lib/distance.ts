import type { LngLat, Polygonal } from '../../shared/geometry/geojson-schema.ts';

const metresPerDegree = 111_320;

/** Metres between two near places, within a per cent: good for "about 120 m away", for no figure of a study. */
export function approximateDistanceM(one: LngLat, other: LngLat): number {
  const eastM =
    (other[0] - one[0]) * metresPerDegree * Math.cos(((one[1] + other[1]) / 2) * (Math.PI / 180));
  const northM = (other[1] - one[1]) * metresPerDegree;
  return Math.hypot(eastM, northM);
}

/** The middle of a polygon's box. */
export function boxMiddle(geometry: Polygonal): LngLat {
  const positions =
    geometry.type === 'Polygon' ? geometry.coordinates.flat() : geometry.coordinates.flat(2);
  const lngs = positions.map(([lng]) => lng);
  const lats = positions.map(([, lat]) => lat);
  return [(Math.min(...lngs) + Math.max(...lngs)) / 2, (Math.min(...lats) + Math.max(...lats)) / 2];
}
