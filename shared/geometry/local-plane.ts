import proj4 from 'proj4';

/** A flat plane in metres around one place: x east, y true north at the place. */
export interface LocalPlane {
  /** Longitude and latitude in degrees to x and y in metres. */
  toPlane: (lngLat: readonly [number, number]) => [number, number];
  /** x and y in metres to longitude and latitude in degrees. */
  toLngLat: (xy: readonly [number, number]) => [number, number];
}

/**
 * The transverse Mercator plane on WGS 84 centred on a place (scale 1 on its meridian).
 * Within 5 km of the centre its lengths are true to 1 part in 3 million; Web-Mercator metres,
 * by contrast, are too long by 1/cos(latitude).
 *
 * @param longitude degrees, positive east
 * @param latitude degrees, positive north
 */
export function createLocalPlane(longitude: number, latitude: number): LocalPlane {
  const projection = proj4(
    `+proj=tmerc +lat_0=${latitude} +lon_0=${longitude} +k=1 +x_0=0 +y_0=0 +ellps=WGS84 +units=m +no_defs`,
  );
  return {
    toPlane: ([lng, lat]) => pair(projection.forward([lng, lat])),
    toLngLat: ([x, y]) => pair(projection.inverse([x, y])),
  };
}

function pair(coordinates: number[]): [number, number] {
  const [first, second] = coordinates;
  if (first === undefined || second === undefined) {
    throw new Error('A projected point needs two coordinates.');
  }
  return [first, second];
}
