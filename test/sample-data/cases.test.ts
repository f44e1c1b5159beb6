import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { caseStateSchema } from '../../shared/contracts/case-life.ts';
import {
  buildingProperties,
  inMetres,
  joined,
  massingProperties,
  outsideM2,
  parcelProperties,
  readAreas,
  readJson,
} from './sample-files.ts';

const { cases } = z
  .strictObject({
    cases: z.array(
      z.strictObject({
        key: z.string(),
        title: z.string().min(3),
        description: z.string(),
        address: z.string(),
        siteParcels: z.array(z.string()).min(1),
        applicant: z.string(),
        state: caseStateSchema,
        massings: z
          .array(z.strictObject({ file: z.string(), sentBackReason: z.string().nullable() }))
          .min(1),
        comments: z.array(
          z.strictObject({
            author: z.string(),
            text: z.string().min(5),
            pin: z.tuple([z.number(), z.number()]).nullable(),
          }),
        ),
      }),
    ),
  })
  .parse(readJson('larkhaven/cases.json'));

const parcels = new Map(
  readAreas('larkhaven/parcels.geojson', parcelProperties).map((parcel) => [
    parcel.properties.number,
    parcel,
  ]),
);
const buildings = readAreas('larkhaven/buildings.geojson', buildingProperties);

describe('the cases of the demo', () => {
  it('are six, in six different states', () => {
    expect(cases).toHaveLength(6);
    expect(new Set(cases.map(({ state }) => state)).size).toBe(6);
  });

  it('lie on parcels that exist, the first of which gives the address', () => {
    for (const { siteParcels, address, key } of cases) {
      for (const number of siteParcels) expect(parcels.has(number), key).toBe(true);
      expect(parcels.get(siteParcels[0] ?? '')?.properties.address, key).toBe(address);
    }
  });

  it('give a reason for each revision that was sent back, and none for the last', () => {
    for (const { massings, key } of cases) {
      const reasons = massings.map(({ sentBackReason }) => sentBackReason);
      expect(reasons.pop(), key).toBeNull();
      expect(reasons.includes(null), key).toBe(false);
    }
    expect(cases.filter(({ massings }) => massings.length === 2)).toHaveLength(1);
  });

  it.each(
    cases.flatMap(({ massings, siteParcels }) =>
      massings.map(({ file }) => [file, siteParcels] as const),
    ),
  )('have every block of %s within the site', (file, siteParcels) => {
    const site = joined(
      siteParcels.flatMap((number) => {
        const parcel = parcels.get(number);
        return parcel ? inMetres(parcel.geometry) : [];
      }),
    );
    for (const { geometry, properties } of readAreas(file, massingProperties)) {
      // Rounding to degrees moves a party wall of twenty metres by up to a centimetre.
      expect(outsideM2(inMetres(geometry), site), properties.id).toBeLessThan(0.2);
      expect(properties.top, properties.id).toBeGreaterThan(properties.base);
    }
  });

  it.each(
    cases.flatMap(({ massings, siteParcels }) =>
      massings.map(({ file }) => [file, siteParcels] as const),
    ),
  )('name in %s exactly the buildings that stand on the site as existing', (file, siteParcels) => {
    const standing = buildings
      .filter(({ properties }) => siteParcels.includes(properties.parcel))
      .map(({ properties, geometry }) => [properties.id, properties.topM, geometry]);
    const existing = readAreas(file, massingProperties)
      .filter(({ properties }) => properties.role === 'existing')
      .map(({ properties, geometry }) => [properties.id, properties.top, geometry]);
    expect(existing).toEqual(standing);
  });

  it('include a tower of 14 storeys and 44 m on a podium of 14 m', () => {
    const blocks = readAreas('massings/tallow-wharf.geojson', massingProperties)
      .map(({ properties }) => properties)
      .filter(({ role }) => role === 'proposed');
    expect(blocks).toMatchObject([
      { id: 'podium', base: 0, top: 14 },
      { id: 'tower', base: 14, top: 44, storeys: 14 },
    ]);
  });
});

it('offers a block of two tiers on an empty parcel of no case', () => {
  const [lower, upper] = readAreas('massings/two-tier-block.geojson', massingProperties);
  expect(upper?.properties.base).toBe(lower?.properties.top);
  const free = [...parcels.values()].find(
    ({ geometry }) => lower && outsideM2(inMetres(lower.geometry), inMetres(geometry)) < 0.05,
  );
  expect(free?.properties.use).toBe('vacant');
  expect(cases.some(({ siteParcels }) => siteParcels.includes(free?.properties.number ?? ''))).toBe(
    false,
  );
});
