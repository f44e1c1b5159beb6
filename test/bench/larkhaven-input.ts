import { readFile } from 'node:fs/promises';
import { z } from 'zod';
import { polygonalSchema } from '../../shared/geometry/geojson-schema.ts';
import type { StudyInput } from '../../shared/study/evidence-schema.ts';
import { listKeyDateInstants } from '../../shared/study/key-date-instants.ts';
import { readStudyInput } from '../../shared/study/read-study-input.ts';

const folder = new URL('../../sample-data/', import.meta.url);

function collectionOf<Properties extends z.ZodType>(properties: Properties) {
  return z.object({
    features: z.array(z.object({ properties, geometry: polygonalSchema })),
  });
}

async function read<Schema extends z.ZodType>(path: string, schema: Schema) {
  const value: unknown = JSON.parse(await readFile(new URL(path, folder), 'utf8'));
  return schema.parse(value);
}

/** The study of Tallow Wharf Lofts among all of Larkhaven, straight from the sample files. */
export async function readLarkhavenInput(): Promise<StudyInput> {
  const municipality = await read(
    'larkhaven/municipality.json',
    z.object({
      name: z.string(),
      timeZone: z.string(),
      longitude: z.number(),
      latitude: z.number(),
      elevationM: z.number(),
    }),
  );
  const buildings = await read(
    'larkhaven/buildings.geojson',
    collectionOf(z.object({ id: z.string(), baseM: z.number(), topM: z.number() })),
  );
  const parcels = await read(
    'larkhaven/parcels.geojson',
    collectionOf(z.object({ number: z.string(), address: z.string() })),
  );
  const openSpace = await read(
    'larkhaven/open-space.geojson',
    collectionOf(z.object({ id: z.string(), class: z.string(), name: z.string() })),
  );
  const massing = await read(
    'massings/tallow-wharf.geojson',
    collectionOf(z.object({ id: z.string(), role: z.string(), base: z.number(), top: z.number() })),
  );
  const { cases } = await read(
    'larkhaven/cases.json',
    z.object({ cases: z.array(z.object({ key: z.string(), siteParcels: z.array(z.string()) })) }),
  );
  const site = new Set(cases.find(({ key }) => key === 'tallow-wharf-lofts')?.siteParcels);
  const removed = new Set(massing.features.map(({ properties }) => properties.id));
  const place = {
    name: municipality.name,
    timezone: municipality.timeZone,
    longitude: municipality.longitude,
    latitude: municipality.latitude,
    elevation: municipality.elevationM,
  };
  const result = readStudyInput({
    format: 'noonmark-study/1',
    place,
    year: 2026,
    instants: listKeyDateInstants(place, 2026),
    blocks: {
      features: [
        ...buildings.features
          .filter(({ properties }) => !removed.has(properties.id))
          .map(({ properties, geometry }) => ({
            properties: {
              id: properties.id,
              role: 'context',
              base: properties.baseM,
              top: properties.topM,
            },
            geometry,
          })),
        ...massing.features.map(({ properties, geometry }) => ({
          properties: {
            id: properties.id,
            role: properties.role,
            base: properties.base,
            top: properties.top,
          },
          geometry,
        })),
      ],
    },
    receptors: {
      features: [
        ...parcels.features
          .filter(({ properties }) => !site.has(properties.number))
          .map(({ properties, geometry }) => ({
            properties: { id: properties.number, class: 'parcel', label: properties.address },
            geometry,
          })),
        ...openSpace.features.map(({ properties, geometry }) => ({
          properties: { id: properties.id, class: properties.class, label: properties.name },
          geometry,
        })),
      ],
    },
    rule: {
      id: 'solar-access',
      version: 1,
      title: 'Sun kept for neighbours',
      clauses: [
        {
          id: 'winter-noon-hours',
          title: 'Two hours of sun at midwinter',
          receptors: { classes: ['parcel', 'open-space'] },
          days: [{ event: 'winter-solstice' }],
          window: { basis: 'standard', from: '10:00', to: '14:00' },
          step: 10,
          measure: { kind: 'sun-hours' },
          limit: { anyOf: [{ atLeast: 2 }, { losesAtMost: 0.5 }] },
        },
      ],
    },
  });
  if (!result.ok) throw new Error(JSON.stringify(result.issues.slice(0, 3)));
  return result.input;
}
