import type { Feature, FeatureCollection, Geometry, Position } from 'geojson';
import type { LngLat, Polygonal } from '../../shared/geometry/geojson-schema.ts';
import type { Finding } from '../../shared/study/evidence-schema.ts';

/** A block of a massing as the map draws it. */
export interface MapBlock {
  id: string;
  role: 'proposed' | 'existing';
  /** Metres above the ground. */
  baseM: number;
  topM: number;
  geometry: Polygonal;
}

/** What stands around the site, as the tilted view shows it. */
export type MapVolume = Omit<MapBlock, 'role'>;

/** A receptor as the map draws it; `finding` is null where it has not been judged. */
export interface MapReceptor {
  id: string;
  label: string;
  class: string;
  finding: Finding | null;
  geometry: Polygonal;
}

/** A place that is marked on the map: a comment, a case, a point that was picked. */
export interface MapPin {
  id: string;
  lngLat: LngLat;
  label?: string;
  isChosen?: boolean;
}

/** West, south, east, north in degrees. */
export type Bounds = [number, number, number, number];

const metresPerDegree = 111_320;

export function collect<G extends Geometry, P>(features: Feature<G, P>[]): FeatureCollection<G, P> {
  return { type: 'FeatureCollection', features };
}

/** Blocks from low to high, so that a tower lies on its podium. */
export function blockFeatures(blocks: readonly MapBlock[]) {
  return collect(
    blocks
      .toSorted((a, b) => a.topM - b.topM)
      .map(({ geometry, ...properties }) => ({ type: 'Feature' as const, properties, geometry })),
  );
}

export function volumeFeatures(volumes: readonly MapVolume[]) {
  return collect(
    volumes.map(({ geometry, ...properties }) => ({
      type: 'Feature' as const,
      properties,
      geometry,
    })),
  );
}

/**
 * The height of each proposed block, in its middle; where a higher block stands on that, towards
 * the corner farthest from the higher one.
 */
export function blockLabelFeatures(
  blocks: readonly MapBlock[],
  writeHeight: (topM: number) => string,
) {
  const proposed = blocks
    .filter((block) => block.role === 'proposed')
    .map((block) => ({ ...block, middle: middleOf(block.geometry) }));
  return collect(
    proposed.map((block) => {
      const above = proposed
        .filter((other) => other.topM > block.topM && isInside(block.middle, other.geometry))
        .toSorted((a, b) => b.topM - a.topM)[0];
      const place =
        above === undefined
          ? block.middle
          : between(farthestVertex(block.geometry, above.middle), block.middle, 0.3);
      return pointFeature(place, { text: writeHeight(block.topM) });
    }),
  );
}

export function receptorFeatures(receptors: readonly MapReceptor[]) {
  return collect(
    receptors.map(({ geometry, ...properties }): Feature<Polygonal> => ({
      type: 'Feature',
      properties,
      geometry,
    })),
  );
}

/** One point for every receptor where the rule is not met: there the map sets a cross. */
export function notMetFeatures(receptors: readonly MapReceptor[]) {
  return collect(
    receptors
      .filter((receptor) => receptor.finding === 'not-met')
      .map((receptor) => pointFeature(middleOf(receptor.geometry), { id: receptor.id })),
  );
}

export function pinFeatures(pins: readonly MapPin[]) {
  return collect(
    pins.map((pin) =>
      pointFeature(pin.lngLat, {
        id: pin.id,
        label: pin.label ?? '',
        isChosen: pin.isChosen === true,
      }),
    ),
  );
}

/** The rectangle around geometries, widened on every side; null where there is nothing. */
export function boundsAround(geometries: readonly Geometry[], marginM = 0): Bounds | null {
  const positions = geometries.flatMap(listPositions);
  if (positions.length === 0) return null;
  const lngs = positions.map(([lng = 0]) => lng);
  const lats = positions.map(([, lat = 0]) => lat);
  // Loops, not spread arguments: a district has more vertices than a call takes arguments.
  const least = (values: number[]) => values.reduce((a, b) => Math.min(a, b));
  const most = (values: number[]) => values.reduce((a, b) => Math.max(a, b));
  const latMargin = marginM / metresPerDegree;
  const lngMargin = latMargin / Math.cos((least(lats) * Math.PI) / 180);
  return [
    least(lngs) - lngMargin,
    least(lats) - latMargin,
    most(lngs) + lngMargin,
    most(lats) + latMargin,
  ];
}

/** The centroid of the largest outer ring: good enough to set a mark on it. */
export function middleOf(geometry: Polygonal): LngLat {
  const outerRings =
    geometry.type === 'Polygon'
      ? geometry.coordinates.slice(0, 1)
      : geometry.coordinates.map((polygon) => polygon[0] ?? []);
  const [middle] = outerRings
    .map(ringCentroid)
    .toSorted((a, b) => b.size - a.size)
    .map((one) => one.lngLat);
  if (middle === undefined) throw new RangeError('A polygon without a ring has no middle.');
  return middle;
}

function ringCentroid(ring: readonly LngLat[]): { lngLat: LngLat; size: number } {
  const [origin] = ring;
  if (origin === undefined) return { lngLat: [0, 0], size: 0 };
  // Relative to the first vertex: degrees to many digits would lose the small differences.
  let [twiceArea, sumLng, sumLat] = [0, 0, 0];
  ring.forEach(([lng, lat], index) => {
    const [nextLng, nextLat] = ring[index + 1] ?? origin;
    const [ax, ay, bx, by] = [
      lng - origin[0],
      lat - origin[1],
      nextLng - origin[0],
      nextLat - origin[1],
    ];
    const cross = ax * by - bx * ay;
    twiceArea += cross;
    sumLng += (ax + bx) * cross;
    sumLat += (ay + by) * cross;
  });
  if (twiceArea === 0) return { lngLat: origin, size: 0 };
  return {
    lngLat: [origin[0] + sumLng / (3 * twiceArea), origin[1] + sumLat / (3 * twiceArea)],
    size: Math.abs(twiceArea),
  };
}

/** Whether a place lies in a polygon, by the even-odd rule over all its rings. */
function isInside([lng, lat]: LngLat, geometry: Polygonal): boolean {
  let isOdd = false;
  for (const ring of ringsOf(geometry)) {
    ring.forEach(([lngA, latA], index) => {
      const [lngB, latB] = ring[index + 1] ?? ring[0] ?? [lngA, latA];
      const isCrossing =
        latA > lat !== latB > lat && lng < lngA + ((lat - latA) / (latB - latA)) * (lngB - lngA);
      if (isCrossing) isOdd = !isOdd;
    });
  }
  return isOdd;
}

function farthestVertex(geometry: Polygonal, from: LngLat): LngLat {
  const lngScale = Math.cos((from[1] * Math.PI) / 180);
  const distance = ([lng, lat]: LngLat) => Math.hypot((lng - from[0]) * lngScale, lat - from[1]);
  return ringsOf(geometry)
    .flat()
    .reduce((best, one) => (distance(one) > distance(best) ? one : best), from);
}

/** The place a share of the way from one to another. */
function between(a: LngLat, b: LngLat, share: number): LngLat {
  return [a[0] + (b[0] - a[0]) * share, a[1] + (b[1] - a[1]) * share];
}

function ringsOf(geometry: Polygonal): LngLat[][] {
  return geometry.type === 'Polygon' ? geometry.coordinates : geometry.coordinates.flat();
}

function listPositions(geometry: Geometry): Position[] {
  switch (geometry.type) {
    case 'Point':
      return [geometry.coordinates];
    case 'MultiPoint':
    case 'LineString':
      return geometry.coordinates;
    case 'MultiLineString':
    case 'Polygon':
      return geometry.coordinates.flat();
    case 'MultiPolygon':
      return geometry.coordinates.flat(2);
    case 'GeometryCollection':
      return geometry.geometries.flatMap(listPositions);
  }
}

function pointFeature<P>(
  coordinates: LngLat,
  properties: P,
): Feature<{ type: 'Point'; coordinates: LngLat }, P> {
  return { type: 'Feature', properties, geometry: { type: 'Point', coordinates } };
}
