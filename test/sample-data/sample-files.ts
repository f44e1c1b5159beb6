import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import type { Feature, MultiPolygon, Polygon } from 'geojson';
import { difference, intersection, union, type Geom } from 'polyclip-ts';
import { z } from 'zod';
import { createLocalPlane } from '../../shared/geometry/local-plane.ts';

const root = join(import.meta.dirname, '../../sample-data');

export const readBytes = (path: string): Uint8Array => readFileSync(join(root, path));
export const readJson = (path: string): unknown =>
  JSON.parse(readFileSync(join(root, path), 'utf8'));

export type AreaFeature<Properties> = Feature<Polygon | MultiPolygon, Properties>;

const position = z.tuple([z.number(), z.number()]);
const rings = z.array(z.array(position));
const areaGeometry = z.discriminatedUnion('type', [
  z.object({ type: z.literal('Polygon'), coordinates: rings }),
  z.object({ type: z.literal('MultiPolygon'), coordinates: z.array(rings) }),
]);

/** The areas of a GeoJSON file, with their properties checked. */
export function readAreas<Properties>(
  path: string,
  properties: z.ZodType<Properties>,
): AreaFeature<Properties>[] {
  return z
    .object({
      type: z.literal('FeatureCollection'),
      features: z.array(
        z.object({ type: z.literal('Feature'), properties, geometry: areaGeometry }),
      ),
    })
    .parse(readJson(path)).features;
}

export const anyProperties = z.record(z.string(), z.unknown());

export const parcelProperties = z.strictObject({
  number: z.string(),
  address: z.string(),
  zone: z.string(),
  use: z.enum(['residential', 'commercial', 'civic', 'vacant']),
});
export const buildingProperties = z.strictObject({
  id: z.string(),
  parcel: z.string(),
  kind: z.enum(['house', 'garage', 'shop', 'apartment', 'civic', 'warehouse']),
  storeys: z.int().min(1),
  baseM: z.number(),
  topM: z.number(),
  heightSource: z.string().min(1),
});
export const massingProperties = z.strictObject({
  id: z.string(),
  role: z.enum(['proposed', 'existing']),
  base: z.number(),
  top: z.number(),
  storeys: z.int().min(1),
  name: z.string(),
});

const plane = createLocalPlane(-91.3, 46.75);
export const toMetres = plane.toPlane;

type PlanePolygon = [number, number][][];

/** The polygons of a geometry in metres. */
export function inMetres(geometry: Polygon | MultiPolygon): PlanePolygon[] {
  const polygons = geometry.type === 'Polygon' ? [geometry.coordinates] : geometry.coordinates;
  return polygons.map((polygon) =>
    polygon.map((ring) => ring.map(([lng = NaN, lat = NaN]) => toMetres([lng, lat]))),
  );
}

export function ringArea(ring: readonly (readonly number[])[]): number {
  let sum = 0;
  for (let index = 1; index < ring.length; index++) {
    const [x1 = NaN, y1 = NaN] = ring[index - 1] ?? [];
    const [x2 = NaN, y2 = NaN] = ring[index] ?? [];
    sum += x1 * y2 - x2 * y1;
  }
  return sum / 2;
}

export const areaM2 = (polygons: readonly PlanePolygon[]): number =>
  polygons.flat().reduce((sum, ring) => sum + ringArea(ring), 0);

export const commonM2 = (a: Geom, b: Geom): number => areaM2(intersection(a, b));
export const outsideM2 = (inner: Geom, outer: Geom): number => areaM2(difference(inner, outer));
export const joined = (polygons: readonly PlanePolygon[]): PlanePolygon[] =>
  union(polygons.slice(0, 1), ...polygons.slice(1).map((one): Geom => [one]));

interface Box {
  west: number;
  south: number;
  east: number;
  north: number;
}

function boxOf(polygons: readonly PlanePolygon[]): Box {
  const points = polygons.flat(2);
  const xs = points.map(([x]) => x);
  const ys = points.map(([, y]) => y);
  return {
    west: Math.min(...xs),
    south: Math.min(...ys),
    east: Math.max(...xs),
    north: Math.max(...ys),
  };
}

/** The pairs whose boxes meet, each once: what lies further apart cannot overlap. */
export function nearPairs<Item extends { polygons: PlanePolygon[] }>(
  items: readonly Item[],
): [Item, Item][] {
  const boxed = items
    .map((item) => ({ item, box: boxOf(item.polygons) }))
    .sort((a, b) => a.box.west - b.box.west);
  return boxed.flatMap(({ item, box }, index) => {
    const pairs: [Item, Item][] = [];
    for (const other of boxed.slice(index + 1)) {
      if (other.box.west > box.east) break;
      const meets = other.box.south <= box.north && other.box.north >= box.south;
      if (meets) pairs.push([item, other.item]);
    }
    return pairs;
  });
}
