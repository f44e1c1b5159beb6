import { readFile } from 'node:fs/promises';
import path from 'node:path';
import { z } from 'zod';
import { municipalitySchema } from '../../shared/contracts/base-data.ts';
import { caseStateSchema } from '../../shared/contracts/case-life.ts';
import { lngLatSchema, polygonalSchema } from '../../shared/geometry/geojson-schema.ts';

const sampleFolder = path.resolve(import.meta.dirname, '../../sample-data');

const parcelProperties = z.object({
  number: z.string(),
  address: z.string(),
  zone: z.string(),
  use: z.string(),
});
const buildingProperties = z.object({
  id: z.string(),
  parcel: z.string().nullable(),
  kind: z.string(),
  storeys: z.int().nullable(),
  baseM: z.number(),
  topM: z.number(),
  heightSource: z.string(),
});
const yardProperties = z.object({
  id: z.string(),
  parcel: z.string(),
  address: z.string(),
  label: z.string(),
});
const openSpaceProperties = z.object({
  id: z.string(),
  class: z.enum(['open-space', 'walk']),
  name: z.string(),
});
const collectorProperties = z.object({
  id: z.string(),
  building: z.string().nullable(),
  address: z.string(),
  planeM: z.number(),
  tiltDeg: z.number(),
  facingDeg: z.number(),
});
const namedProperties = z.object({ name: z.string() });

const lineSchema = z.object({
  type: z.literal('LineString'),
  coordinates: z.array(lngLatSchema).min(2),
});

const sampleCaseSchema = z.object({
  key: z.string(),
  title: z.string(),
  description: z.string(),
  siteParcels: z.array(z.string()),
  applicant: z.string(),
  state: caseStateSchema,
  /** In the order of their revisions; one that is sent back names the reason. */
  massings: z.array(z.object({ file: z.string(), sentBackReason: z.string().nullable() })).min(1),
  comments: z.array(
    z.object({ author: z.string(), text: z.string(), pin: lngLatSchema.nullable() }),
  ),
});
export type SampleCase = z.infer<typeof sampleCaseSchema>;

/** The base data of the demo municipality. */
export async function readSampleCity() {
  return {
    municipality: await readJson(
      'larkhaven/municipality.json',
      municipalitySchema.omit({ studyYear: true }),
    ),
    parcels: await readFeatures('parcels', parcelProperties, polygonalSchema),
    buildings: await readFeatures('buildings', buildingProperties, polygonalSchema),
    yards: await readFeatures('yards', yardProperties, polygonalSchema),
    openSpaces: await readFeatures('open-space', openSpaceProperties, polygonalSchema),
    collectors: await readFeatures('collectors', collectorProperties, polygonalSchema),
    streets: await readFeatures('streets', namedProperties, polygonalSchema),
    streetLines: await readFeatures('street-lines', namedProperties, lineSchema),
    waters: await readFeatures('water', namedProperties, polygonalSchema),
  };
}
export type SampleCity = Awaited<ReturnType<typeof readSampleCity>>;

/** The cases of the demo. */
export async function readSampleCases(): Promise<SampleCase[]> {
  const file = await readJson(
    'larkhaven/cases.json',
    z.object({ cases: z.array(sampleCaseSchema) }),
  );
  return file.cases;
}

/** A massing file of the demo as an applicant would send it. */
export async function readSampleMassing(
  file: string,
): Promise<{ fileName: string; bytes: Buffer }> {
  return { fileName: path.basename(file), bytes: await readFile(path.join(sampleFolder, file)) };
}

async function readFeatures<Properties extends object, Geometry>(
  name: string,
  properties: z.ZodType<Properties>,
  geometry: z.ZodType<Geometry>,
): Promise<(Properties & { geometry: Geometry })[]> {
  const file = await readJson(
    `larkhaven/${name}.geojson`,
    z.object({ features: z.array(z.unknown()) }),
  );
  return file.features.map((feature) => ({
    ...properties.parse(readMember(feature, 'properties')),
    geometry: geometry.parse(readMember(feature, 'geometry')),
  }));
}

function readMember(feature: unknown, name: 'properties' | 'geometry'): unknown {
  return z.looseObject({}).parse(feature)[name];
}

async function readJson<Schema extends z.ZodType>(
  file: string,
  schema: Schema,
): Promise<z.output<Schema>> {
  const text = await readFile(path.join(sampleFolder, file), 'utf8');
  return schema.parse(JSON.parse(text));
}
