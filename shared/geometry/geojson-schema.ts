import { z } from 'zod';

/** Longitude and latitude in degrees on WGS 84, in the order of RFC 7946. */
export const lngLatSchema = z.tuple([z.number().min(-180).max(180), z.number().min(-90).max(90)]);
export type LngLat = z.infer<typeof lngLatSchema>;

const ringSchema = z.array(lngLatSchema).min(4);

export const polygonSchema = z.strictObject({
  type: z.literal('Polygon'),
  coordinates: z.array(ringSchema).min(1),
});

export const multiPolygonSchema = z.strictObject({
  type: z.literal('MultiPolygon'),
  coordinates: z.array(z.array(ringSchema).min(1)),
});

/** A footprint, a parcel or a shadow: RFC 7946, longitude and latitude. */
export const polygonalSchema = z.discriminatedUnion('type', [polygonSchema, multiPolygonSchema]);
export type Polygonal = z.infer<typeof polygonalSchema>;

export const pointSchema = z.strictObject({ type: z.literal('Point'), coordinates: lngLatSchema });

export const lineStringSchema = z.strictObject({
  type: z.literal('LineString'),
  coordinates: z.array(lngLatSchema).min(2),
});

/** What may be judged: an area, or a window as a point or a line. */
export const receptorGeometrySchema = z.discriminatedUnion('type', [
  polygonSchema,
  multiPolygonSchema,
  pointSchema,
  lineStringSchema,
]);
export type ReceptorGeometry = z.infer<typeof receptorGeometrySchema>;

/** Whether a receptor's geometry has an area. */
export function isPolygonal(geometry: ReceptorGeometry): geometry is Polygonal {
  return geometry.type === 'Polygon' || geometry.type === 'MultiPolygon';
}
