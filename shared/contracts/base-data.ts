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

/** The first administrator's answers where nothing is set up yet. */
export const setUpMunicipalityInputSchema = z
  .strictObject({
    name: z.string().trim().min(1, 'Write the name, for example City of Larkhaven.').max(120),
    shortName: z.string().trim().min(1, 'Write the short name.').max(40),
    timeZone: z.string().refine(isTimeZone, 'Write an IANA zone, for example America/Chicago.'),
    locale: z.string().refine(isLocale, 'Write a language tag, for example en-US.'),
    longitude: z.number('Write a number of degrees.').min(-180).max(180),
    latitude: z.number('Write a number of degrees.').min(-89).max(89),
    elevationM: z.number('Write a number of metres.').min(-450).max(9000),
    extent: municipalitySchema.shape.extent,
    studyYear: z.int('Write a year.').min(1900).max(2100),
  })
  .refine(({ extent: [west, south, east, north] }) => west < east && south < north, {
    path: ['extent'],
    error: 'West must be less than east, and south less than north.',
  });
export type SetUpMunicipalityInput = z.infer<typeof setUpMunicipalityInputSchema>;

function isTimeZone(name: string): boolean {
  try {
    new Intl.DateTimeFormat('en', { timeZone: name });
    return true;
  } catch {
    return false;
  }
}

function isLocale(tag: string): boolean {
  try {
    return Intl.DateTimeFormat.supportedLocalesOf(tag).length === 1;
  } catch {
    return false;
  }
}

export const parcelSchema = z.object({
  number: z.string(),
  address: z.string(),
  zone: z.string(),
  use: z.string(),
  areaM2: z.number(),
  geometry: polygonalSchema,
});
export type Parcel = z.infer<typeof parcelSchema>;

/** Digits on both sides of the comma: `Number` would take nothing at all for 0. */
const pointPattern = /^\s*(-?\d+(?:\.\d+)?(?:e-?\d+)?)\s*,\s*(-?\d+(?:\.\d+)?(?:e-?\d+)?)\s*$/;

const pointTextSchema = z.string().transform((text, context) => {
  const point = lngLatSchema.safeParse(pointPattern.exec(text)?.slice(1).map(Number));
  if (point.success) return point.data;
  context.addIssue({
    code: 'custom',
    message: 'Write longitude and latitude in degrees, for example -91.3,46.75.',
  });
  return z.NEVER;
});

export const listParcelsQuerySchema = listQuerySchema.extend({
  /** The parcel under this point, `lng,lat`. */
  at: pointTextSchema.optional(),
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
