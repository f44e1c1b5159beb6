import type { MikroORM } from '@mikro-orm/postgresql';
import { Building } from '../../api/modules/base-data/building.entity.ts';
import { Collector } from '../../api/modules/base-data/collector.entity.ts';
import { OpenSpace } from '../../api/modules/base-data/open-space.entity.ts';
import { Parcel } from '../../api/modules/base-data/parcel.entity.ts';
import { Street } from '../../api/modules/base-data/street.entity.ts';
import { Yard } from '../../api/modules/base-data/yard.entity.ts';
import { RuleVersion } from '../../api/modules/rules/rule-version.entity.ts';
import { Municipality } from '../../api/modules/settings/municipality.entity.ts';
import type { Polygonal } from '../../shared/geometry/geojson-schema.ts';
import { createLocalPlane } from '../../shared/geometry/local-plane.ts';
import { ruleSchema } from '../../shared/rules/rule-schema.ts';
import type { Rule } from '../../shared/rules/rule-schema.ts';

const longitude = -91.3;
const latitude = 46.75;
const plane = createLocalPlane(longitude, latitude);

/** A rectangle, x metres east and y metres north of the city's middle. */
export function rectangle(x: number, y: number, widthM: number, depthM: number): Polygonal {
  const corners: [number, number][] = [
    [x, y],
    [x + widthM, y],
    [x + widthM, y + depthM],
    [x, y + depthM],
    [x, y],
  ];
  return {
    type: 'Polygon',
    coordinates: [
      corners.map((corner) => {
        const [lng, lat] = plane.toLngLat(corner);
        return [Math.round(lng * 1e7) / 1e7, Math.round(lat * 1e7) / 1e7];
      }),
    ],
  };
}

interface TestBlock {
  id: string;
  role?: 'proposed' | 'existing';
  base?: number;
  top: number;
  /** x, y, width and depth in metres. */
  at: [number, number, number, number];
}

/** A massing file as an applicant would send it. */
export function massingFile(blocks: readonly TestBlock[]): Buffer {
  return Buffer.from(
    JSON.stringify({
      type: 'FeatureCollection',
      features: blocks.map(({ id, role = 'proposed', base = 0, top, at }) => ({
        type: 'Feature',
        properties: { id, role, base, top },
        geometry: rectangle(...at),
      })),
    }),
  );
}

/** On the site, 30 m high: it takes the midwinter sun of N-1 north of it. */
export const tower = massingFile([{ id: 'tower', top: 30, at: [10, 10, 20, 20] }]);
/** On the site, 4 m high: nobody notices. */
export const cottage = massingFile([{ id: 'cottage', top: 4, at: [15, 5, 10, 8] }]);

/** As `solar-access` of the demo: two hours of midwinter sun around noon, or a loss of half an hour at most. */
export function smallCityRule(change: Partial<Rule['clauses'][number]> = {}): Rule {
  return ruleSchema.parse({
    id: 'solar-access',
    version: 1,
    title: 'Sun kept for neighbours',
    citation: 'Zoning Code 18.42',
    clauses: [
      {
        id: 'winter-noon-hours',
        title: 'Two hours of midwinter sun',
        receptors: { classes: ['parcel', 'open-space'] },
        days: [{ event: 'winter-solstice' }],
        window: { basis: 'standard', from: '10:00', to: '14:00' },
        step: 10,
        measure: { kind: 'sun-hours' },
        limit: { anyOf: [{ atLeast: 2 }, { losesAtMost: 0.5 }] },
        ...change,
      },
    ],
  });
}

/**
 * Six parcels of 40 m around the site S-1: N-1 north of it, N-2 beyond, W-1, E-1, and P-1 with a park;
 * a shed on the site, a house on each of the others, a yard and a roof with a collector on N-1.
 */
export async function buildSmallCity(orm: MikroORM, rule = smallCityRule()): Promise<void> {
  const em = orm.em.fork();
  em.create(Municipality, {
    shortName: 'Testham',
    name: 'Town of Testham',
    timeZone: 'America/Chicago',
    locale: 'en-US',
    longitude,
    latitude,
    elevationM: 186,
    extent: [-91.31, 46.745, -91.29, 46.755],
    studyYear: 2026,
  });
  em.create(RuleVersion, { ruleId: rule.id, version: 1, inForceFrom: '2026-01-01', rule });
  const parcels: [string, number, number][] = [
    ['S-1', 0, 0],
    ['N-1', 0, 40],
    ['N-2', 0, 80],
    ['W-1', -40, 0],
    ['E-1', 40, 0],
    ['P-1', 40, 40],
  ];
  for (const [number, x, y] of parcels) {
    em.create(Parcel, {
      number,
      address: `${number} Test Row`,
      zone: 'R',
      use: 'dwelling',
      geometry: rectangle(x, y, 40, 40),
    });
    if (number === 'P-1') continue;
    em.create(Building, {
      id: `B-${number}`,
      parcel: number,
      kind: 'house',
      storeys: 2,
      baseM: 0,
      topM: number === 'S-1' ? 5 : 8,
      heightSource: 'made up',
      geometry: rectangle(x + 12, y + 24, 10, 10),
    });
  }
  em.create(OpenSpace, {
    id: 'O-1',
    class: 'open-space',
    name: 'Test Park',
    geometry: rectangle(45, 45, 30, 30),
  });
  em.create(Yard, {
    id: 'Y-1',
    parcel: 'N-1',
    address: 'N-1 Test Row',
    label: 'Yard of N-1 Test Row',
    geometry: rectangle(2, 42, 20, 15),
  });
  em.create(Yard, {
    id: 'Y-0',
    parcel: 'S-1',
    address: 'S-1 Test Row',
    label: 'Yard of the site itself',
    geometry: rectangle(2, 2, 6, 6),
  });
  em.create(Collector, {
    id: 'C-1',
    building: 'B-N-1',
    address: 'N-1 Test Row',
    planeM: 8,
    tiltDeg: 30,
    facingDeg: 180,
    geometry: rectangle(13, 65, 8, 4),
  });
  em.create(Street, { name: 'Test Row', geometry: rectangle(-40, -12, 120, 10) });
  await em.flush();
}
