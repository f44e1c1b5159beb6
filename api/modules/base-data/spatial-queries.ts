import { raw } from '@mikro-orm/core';
import type { EntityManager } from '@mikro-orm/postgresql';
import type { Point } from 'geojson';
import { z } from 'zod';
import { tileLayers } from '../../../shared/contracts/base-data.ts';
import type { TileLayer } from '../../../shared/contracts/base-data.ts';
import { polygonalSchema } from '../../../shared/geometry/geojson-schema.ts';
import type { LngLat, Polygonal } from '../../../shared/geometry/geojson-schema.ts';

/** The place in a pyramid of tiles. */
export interface TilePlace {
  z: number;
  x: number;
  y: number;
}

/** Grid units of a vector tile, and how far geometry reaches over its edge, so that outlines don't show there. */
const tileExtent = 4096;
const tileBuffer = 64;

const tileEntities = {
  parcels: 'Parcel',
  buildings: 'Building',
  streets: 'Street',
  'street-lines': 'StreetLine',
  water: 'Water',
  'open-space': 'OpenSpace',
} as const satisfies Record<TileLayer, string>;

/** One layer of the base data in one tile (Mapbox Vector Tile 2.1); empty where there is nothing. */
export async function renderTile(
  em: EntityManager,
  layer: TileLayer,
  { z, x, y }: TilePlace,
): Promise<Buffer> {
  const metadata = em.getMetadata().get(tileEntities[layer]);
  const columns = tileLayers[layer].map(
    (name) =>
      `"${metadata.props.find((prop) => prop.name === name)?.fieldNames[0] ?? name}" as "${name}"`,
  );
  const [row] = await em.execute<{ tile: Buffer }[]>(
    `with place as (
       select ST_TileEnvelope(?, ?, ?) as envelope,
         -- Within the world: what reaches over its edge would come back on the other side.
         ST_Transform(ST_Intersection(ST_TileEnvelope(?, ?, ?, margin => ?), ST_TileEnvelope(0, 0, 0)), 4326)
           as reach
     ),
     feature as (
       select ST_AsMVTGeom(ST_Transform(geometry, 3857), envelope, ?, ?, true) as geometry,
         ${columns.join(', ')}
       from "${metadata.tableName}", place
       where geometry && reach
     )
     select ST_AsMVT(feature, ?, ?, 'geometry') as tile from feature where geometry is not null`,
    [z, x, y, z, x, y, tileBuffer / tileExtent, tileExtent, tileBuffer, layer, tileExtent],
  );
  return row?.tile ?? Buffer.alloc(0);
}

/** A condition on any layer of base data: what touches west, south, east, north. It serves one query. */
export function touchingExtent(extent: readonly [number, number, number, number]) {
  return { [raw('geometry && ST_MakeEnvelope(?, ?, ?, ?, 4326)', [...extent])]: [] };
}

/** The area of these parcels as one shape, and a point inside it; null where none of them is known. */
export async function dissolveParcels(
  em: EntityManager,
  numbers: readonly string[],
): Promise<{ site: Polygonal; sitePoint: Point } | null> {
  const [row] = await em.execute<{ site: string | null; point: string | null }[]>(
    `select ST_AsGeoJSON(dissolved, 15) as site, ST_AsGeoJSON(ST_PointOnSurface(dissolved), 15) as point
     from (
       select ST_UnaryUnion(ST_Collect(geometry)) as dissolved from parcel where number in (select jsonb_array_elements_text(?::jsonb))
     ) as site`,
    [JSON.stringify(numbers)],
  );
  if (row === undefined || row.site === null || row.point === null) return null;
  return {
    site: polygonalSchema.parse(JSON.parse(row.site)),
    sitePoint: pointSchema.parse(JSON.parse(row.point)),
  };
}

/** The numbers of the parcels under a point; on a common border there are two. */
export async function listParcelNumbersAt(em: EntityManager, lngLat: LngLat): Promise<string[]> {
  const rows = await em.execute<{ number: string }[]>(
    `select number from parcel
     where ST_Intersects(geometry, ST_SetSRID(ST_MakePoint(?, ?), 4326))`,
    lngLat,
  );
  return rows.map(({ number }) => number);
}

/** The areas of these parcels on the ellipsoid, in square metres, by their numbers. */
export async function measureParcels(
  em: EntityManager,
  numbers: readonly string[],
): Promise<Map<string, number>> {
  const rows = await em.execute<{ number: string; areaM2: number }[]>(
    `select number, ST_Area(geometry::geography) as "areaM2" from parcel
     where number in (select jsonb_array_elements_text(?::jsonb))`,
    [JSON.stringify(numbers)],
  );
  return new Map(rows.map(({ number, areaM2 }) => [number, areaM2]));
}

const pointSchema = z.object({
  type: z.literal('Point'),
  coordinates: z.tuple([z.number(), z.number()]),
});
