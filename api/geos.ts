import type { Geometry, Position } from 'geojson';
import { z } from 'zod';

/** What is used of GEOS, the geometry library under PostGIS, compiled to WebAssembly. */
export interface Geos {
  /** GeoJSON to a pointer, which the caller destroys; coordinates are only numbers to GEOS. */
  read: (geometry: Geometry) => number;
  write: (pointer: number) => Geometry;
  GEOSisValid: (geometry: number) => number;
  GEOSMakeValid: (geometry: number) => number;
  GEOSGeom_setPrecision: (geometry: number, gridSize: number, flags: number) => number;
  GEOSUnion: (one: number, other: number) => number;
  GEOSDifference: (one: number, other: number) => number;
  GEOSArea: (geometry: number, areaPointer: number) => number;
  GEOSGeom_destroy: (geometry: number) => void;
  Module: {
    _malloc: (bytes: number) => number;
    _free: (pointer: number) => void;
    getValue: (pointer: number, type: 'double') => number;
  };
}

type Start = (options: {
  errorHandler: (message: string) => void;
  noticeHandler: (message: string) => void;
}) => Promise<Omit<Geos, 'read' | 'write'>>;

const isFunction = (value: unknown): boolean => typeof value === 'function';

// The package's own types name things that no longer exist, so what is used of it is typed here.
const packageSchema = z.object({ default: z.custom<Start>(isFunction) });
const helpersSchema = z.object({
  geojsonToGeosGeom: z.custom<(geometry: Geometry, geos: object) => number>(isFunction),
  geosGeomToGeojson: z.custom<(pointer: number, geos: object) => Geometry>(isFunction),
});

/** Starts GEOS. A call that fails gives 0 and tells `onError` why. */
export async function loadGeos(
  onError: (message: string) => void = () => undefined,
): Promise<Geos> {
  const { default: start } = packageSchema.parse(await import('geos-wasm'));
  const { geojsonToGeosGeom, geosGeomToGeojson } = helpersSchema.parse(
    await import('geos-wasm/helpers'),
  );
  const geos = await start({ errorHandler: onError, noticeHandler: () => undefined });
  return Object.assign(geos, {
    read: (geometry: Geometry) => geojsonToGeosGeom(geometry, geos),
    write: (pointer: number) => geosGeomToGeojson(pointer, geos),
  });
}

/** The polygons among what is left: where two borders fell together, a line may stand beside them. */
export function polygonsWithin(geometry: Geometry): Position[][][] {
  switch (geometry.type) {
    case 'Polygon':
      return [geometry.coordinates];
    case 'MultiPolygon':
      return geometry.coordinates;
    case 'GeometryCollection':
      return geometry.geometries.flatMap(polygonsWithin);
    default:
      return [];
  }
}
