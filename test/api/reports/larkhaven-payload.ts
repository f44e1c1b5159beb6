import { readFileSync } from 'node:fs';
import { feature, featureCollection, union } from '@turf/turf';
import type { MultiPolygon, Polygon } from 'geojson';
import { loadClipper } from '../../../api/clipper.ts';
import { chooseMapExtent } from '../../../api/modules/reports/map-extent.ts';
import {
  reportPayloadSchema,
  type ReportPayload,
} from '../../../api/modules/reports/report-payload.ts';
import { listFindingRows } from '../../../api/modules/studies/list-finding-rows.ts';
import { municipalitySchema } from '../../../shared/contracts/base-data.ts';
import { polygonalSchema, type Polygonal } from '../../../shared/geometry/geojson-schema.ts';
import { polygonsOf } from '../../../shared/geometry/project-polygon.ts';
import { measureMassing } from '../../../shared/massing/measure-massing.ts';
import { readMassing } from '../../../shared/massing/read-massing.ts';
import { ruleSchema } from '../../../shared/rules/rule-schema.ts';
import { keyDatesOfYear } from '../../../shared/solar/key-dates.ts';
import { computeStudy } from '../../../shared/study/compute-study.ts';
import { engineVersion } from '../../../shared/study/engine-version.ts';
import { evidenceFormat, studyInputSchema } from '../../../shared/study/evidence-schema.ts';
import { listJudgedDays } from '../../../shared/study/judged-days.ts';
import { listKeyDateInstants } from '../../../shared/study/key-date-instants.ts';
import { computeReceptorLedger } from '../../../shared/study/receptor-ledger.ts';

interface Feature<Properties> {
  properties: Properties;
  geometry: Polygonal;
}

function readLayer<Properties>(name: string): Feature<Properties>[] {
  const url = new URL(`../../../sample-data/larkhaven/${name}.geojson`, import.meta.url);
  return (JSON.parse(readFileSync(url, 'utf8')) as { features: Feature<Properties>[] }).features;
}

const municipality = municipalitySchema
  .omit({ studyYear: true })
  .parse(
    JSON.parse(
      readFileSync(
        new URL('../../../sample-data/larkhaven/municipality.json', import.meta.url),
        'utf8',
      ),
    ),
  );
const year = 2026;

const rule = ruleSchema.parse({
  id: 'solar-access',
  version: 1,
  title: 'Sun kept for neighbours',
  citation: 'Larkhaven Zoning Code 18.42',
  clauses: [
    {
      id: 'winter-noon-hours',
      title: 'Sun around noon in winter',
      receptors: { classes: ['parcel', 'open-space'] },
      days: [{ event: 'winter-solstice' }],
      window: { basis: 'standard', from: '10:00', to: '14:00' },
      step: 10,
      measure: { kind: 'sun-hours' },
      limit: { anyOf: [{ atLeast: 2 }, { losesAtMost: 0.5 }] },
    },
  ],
});

/** How far around the site the fixture looks, in degrees. */
const reach = { longitude: 0.0045, latitude: 0.003 };

/**
 * A report of Tallow Wharf Lofts with a real study of the sample city, as the server collects it;
 * only the base data comes from the files in place of the database.
 */
export async function buildLarkhavenPayload(): Promise<ReportPayload> {
  const clipper = await loadClipper();
  const siteNumbers = ['LH-0103', 'LH-0102'];
  const parcels = readLayer<{ number: string; address: string; zone: string; use: string }>(
    'parcels',
  );
  const siteParcels = parcels.filter(({ properties }) => siteNumbers.includes(properties.number));
  const [corner] = siteParcels.flatMap(({ geometry }) => polygonsOf(geometry).flat(2));
  if (corner === undefined) throw new Error('The sample city has lost its wharf.');
  const isNear = ({ geometry }: { geometry: Polygonal }) =>
    polygonsOf(geometry)
      .flat(2)
      .some(
        ([longitude, latitude]) =>
          Math.abs(longitude - corner[0]) < reach.longitude &&
          Math.abs(latitude - corner[1]) < reach.latitude,
      );

  const bytes = readFileSync(
    new URL('../../../sample-data/massings/tallow-wharf.geojson', import.meta.url),
  );
  const massing = readMassing(bytes, 'tallow-wharf.geojson');
  if (!massing.ok) throw new Error('The sample massing cannot be read.');
  const buildings = readLayer<{
    id: string;
    parcel: string;
    baseM: number;
    topM: number;
    heightSource: string;
  }>('buildings').filter(isNear);
  const contextBuildings = buildings.filter(
    ({ properties }) => !siteNumbers.includes(properties.parcel),
  );
  const yards = readLayer<{ id: string; parcel: string; label: string }>('yards').filter(isNear);
  const openSpace = readLayer<{ id: string; class: 'open-space' | 'walk'; name: string }>(
    'open-space',
  );
  const united = union(
    featureCollection<Polygon | MultiPolygon>(siteParcels.map(({ geometry }) => feature(geometry))),
  );
  const site = polygonalSchema.parse(united?.geometry);
  const place = {
    name: municipality.name,
    timezone: municipality.timeZone,
    longitude: municipality.longitude,
    latitude: municipality.latitude,
    elevation: municipality.elevationM,
  };
  const receptor = (id: string, receptorClass: string, label: string, geometry: Polygonal) => ({
    properties: { id, class: receptorClass, label },
    geometry,
  });
  const input = studyInputSchema.parse({
    format: evidenceFormat,
    place,
    site,
    blocks: {
      features: [
        ...contextBuildings.map(({ properties, geometry }) => ({
          properties: {
            id: properties.id,
            role: 'context',
            base: properties.baseM,
            top: properties.topM,
          },
          geometry,
        })),
        ...massing.blocks.map(({ id, role, baseM, topM, geometry }) => ({
          properties: { id: `m-${id}`, role, base: baseM, top: topM },
          geometry,
        })),
      ],
    },
    receptors: {
      features: [
        ...parcels
          .filter((one) => isNear(one) && !siteNumbers.includes(one.properties.number))
          .map(({ properties, geometry }) =>
            receptor(properties.number, 'parcel', properties.address, geometry),
          ),
        ...yards.map(({ properties, geometry }) =>
          receptor(properties.id, 'yard', properties.label, geometry),
        ),
        ...openSpace
          .filter(isNear)
          .map(({ properties, geometry }) =>
            receptor(properties.id, properties.class, properties.name, geometry),
          ),
      ],
    },
    year,
    instants: listKeyDateInstants(place, year),
    rule,
  });
  const { evidence, shadows } = await computeStudy(input, { clipper });
  const findingRows = listFindingRows(evidence);
  const notMet = findingRows
    .filter(({ finding }) => finding === 'not-met')
    .sort((a, b) => b.lost - a.lost);
  const figuresAt = new Map(evidence.results.instants.map((one) => [one.at, one]));

  return reportPayloadSchema.parse({
    payloadVersion: 1,
    number: '2026-0001-R1',
    issuedAt: '2026-12-01T15:30:00Z',
    issuedByName: 'Corvin Haldreth',
    caseUrl: 'https://planning.larkhaven.example/cases/2026-0001',
    evidenceUrl: 'https://planning.larkhaven.example/api/studies/1/evidence',
    municipality: { ...municipality, studyYear: year },
    reviewCase: {
      number: '2026-0001',
      title: 'Tallow Wharf Lofts',
      address: '2 Oarlock Shore',
      description:
        'A tower of 14 storeys, 44.0 m high, on a podium of 14.0 m along the street, with 96 apartments and workshops at the water. Two sheds of the old wharf are removed.',
      applicantName: 'Ilse Vantwistle',
    },
    siteParcels: siteParcels.map(({ properties, geometry }) => ({
      ...properties,
      areaM2: 1800,
      geometry,
    })),
    site,
    revision: {
      revision: 1,
      fileName: 'tallow-wharf.geojson',
      sha256: '9f0c4be2a1d7635880e4c35b21f96d0aa7c1e5f40b8d2963ce17508fa46b3d12',
      uploadedAt: '2026-11-03T16:20:00Z',
      figures: measureMassing(massing.blocks),
      blocks: massing.blocks.map(({ geometry, ...properties }) => ({
        type: 'Feature',
        properties,
        geometry,
      })),
    },
    mapExtent: chooseMapExtent(
      siteParcels.map(({ geometry }) => geometry),
      44,
    ),
    surroundings: {
      buildings: buildings.map(({ properties, geometry }) => ({ ...properties, geometry })),
      parcels: parcels.filter(isNear).map(({ properties, geometry }) => ({
        number: properties.number,
        geometry,
      })),
      streets: readLayer<{ name: string }>('streets').map(named),
      streetLines: readLayer<{ name: string }>('street-lines').map(named),
      water: readLayer<{ name: string }>('water').map(named),
      openSpace: openSpace.map(named),
    },
    study: {
      digest: evidence.digest,
      engine: engineVersion,
      finishedAt: '2026-11-20T17:02:00Z',
      year: input.year,
      rule,
      judgedDays: listJudgedDays(rule, place, input.year),
      keyDates: keyDatesOfYear(input.year, place.timezone),
      findings: evidence.results.findings,
      linkeTurbidity: input.settings.beam.linkeTurbidity,
      largestDifferenceM2: evidence.results.check?.largestDifferenceM2 ?? null,
    },
    instants: shadows.map((one) => ({
      ...one,
      netNewM2: figuresAt.get(one.at)?.netNew ?? 0,
      removedM2: figuresAt.get(one.at)?.removed ?? 0,
    })),
    findingRows,
    receptors: input.receptors.features.map(({ properties, geometry }) => ({
      id: properties.id,
      class: properties.class,
      label: properties.label,
      geometry,
    })),
    ledgers: notMet.slice(0, 6).map((row) => computeReceptorLedger(input, row.receptor)),
    publishedComments: [
      {
        authorName: 'Hedwin Marchbole',
        body: 'My back room has sun until about noon in winter. Please tell me how much of that is left.\n\nThe yard is where my mother sits.',
        receivedAt: '2026-11-24T18:12:00Z',
        revision: 1,
        pin: [-91.2978, 46.7497],
      },
      {
        authorName: 'Annick Sorrowby',
        body: 'I ask for two storeys less on the tower. The children play in the afternoon, when the shadow of the tower moves over the gardens of the whole row.',
        receivedAt: '2026-11-26T01:40:00Z',
        revision: 1,
        pin: null,
      },
    ],
    withheldComments: 1,
    narrative:
      'The site is the old wharf between Oarlock Shore and the lake. The proposal keeps the quay open and puts its height at the east end, away from the row houses.\n\nThe tower is the part that matters for the sun. Its shadow reaches the gardens between Ferrylamp Street and Sedgeslip Lane from late morning on. The podium alone casts little more than the sheds that stand there now.\n\nStaff asked the applicant to look at a tower of 32 m. The applicant answered that the floor area would then have to come back as a longer podium.',
    recommendation:
      'Staff recommends that the board continue the case and ask for a lower tower, so that the gardens named on page 1 keep two hours of sun at the winter solstice.',
  });
}

function named({ properties, geometry }: { properties: { name: string }; geometry: object }) {
  return { name: properties.name, geometry };
}
