import { z } from 'zod';
import { lngLatSchema, polygonalSchema } from '../geometry/geojson-schema.ts';
import { listQuerySchema, pageSchema } from './paging.ts';

/** The municipality that this server serves; read by everybody. */
export const municipalitySchema = z.object({
  name: z.string(),
  shortName: z.string(),
  timeZone: z.string(),
  locale: z.string(),
  longitude: z.number(),
  latitude: z.number(),
  elevationM: z.number(),
  /** West, south, east, north in degrees. */
  extent: z.tuple([z.number(), z.number(), z.number(), z.number()]),
  /** The civil year in which key dates are taken for a new study. */
  studyYear: z.int(),
});
export type Municipality = z.infer<typeof municipalitySchema>;

export const parcelSchema = z.object({
  number: z.string(),
  address: z.string(),
  zone: z.string(),
  use: z.string(),
  areaM2: z.number(),
  geometry: polygonalSchema,
});
export type Parcel = z.infer<typeof parcelSchema>;

export const listParcelsQuerySchema = listQuerySchema.extend({
  /** The parcel under this point, `lng,lat`. */
  at: z
    .string()
    .transform((text) => text.split(',').map(Number))
    .pipe(lngLatSchema)
    .optional(),
  /** Parcels by number, separated by commas. */
  numbers: z
    .string()
    .transform((text) => text.split(',').filter((one) => one !== ''))
    .pipe(z.array(z.string().max(40)).max(200))
    .optional(),
});
export type ListParcelsQuery = z.input<typeof listParcelsQuerySchema>;

export const parcelPageSchema = pageSchema(parcelSchema);
export type ParcelPage = z.infer<typeof parcelPageSchema>;

/** The layers of `GET /api/tiles/:layer/:z/:x/:y.mvt`, each with the properties that its features carry. */
export const tileLayers = {
  parcels: ['number', 'address', 'use'],
  buildings: ['id', 'baseM', 'topM'],
  streets: ['name'],
  'street-lines': ['name'],
  water: ['name'],
  'open-space': ['id', 'class', 'name'],
} as const;
export const tileLayerSchema = z.enum(
  Object.keys(tileLayers) as [keyof typeof tileLayers, ...(keyof typeof tileLayers)[]],
);
export type TileLayer = z.infer<typeof tileLayerSchema>;
