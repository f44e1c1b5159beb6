import { describe, expect, it, vi } from 'vitest';
import { z } from 'zod';
import {
  anyProperties,
  areaM2,
  buildingProperties,
  commonM2,
  inMetres,
  nearPairs,
  outsideM2,
  parcelProperties,
  readAreas,
  readJson,
  ringArea,
} from './sample-files.ts';

/** A sliver that rounding to seven decimals of a degree may leave along a border, in m². */
const SLIVER_M2 = 0.05;

// Polygons are overlaid by the thousand here, which takes its time on a busy machine.
vi.setConfig({ testTimeout: 60_000 });

const parcels = readAreas('larkhaven/parcels.geojson', parcelProperties).map((feature) => ({
  ...feature.properties,
  polygons: inMetres(feature.geometry),
}));
const buildings = readAreas('larkhaven/buildings.geojson', buildingProperties).map((feature) => ({
  ...feature.properties,
  polygons: inMetres(feature.geometry),
}));
const parcelByNumber = new Map(parcels.map((parcel) => [parcel.number, parcel]));
const buildingById = new Map(buildings.map((building) => [building.id, building]));

describe('the parcels', () => {
  it('are about four hundred, each with a number and an address of its own', () => {
    expect(parcels.length).toBeGreaterThan(380);
    expect(parcels.length).toBeLessThan(430);
    expect(parcelByNumber.size).toBe(parcels.length);
    expect(new Set(parcels.map(({ address }) => address)).size).toBe(parcels.length);
    expect(parcels.every(({ number }) => /^LH-\d{4}$/.test(number))).toBe(true);
    expect(parcels.every(({ address }) => /^\d+ [A-Z]/.test(address))).toBe(true);
  });

  it('do not overlap', () => {
    const pairs = nearPairs(parcels);
    expect(pairs.length).toBeGreaterThan(parcels.length);
    const overlapping = pairs.filter(([a, b]) => commonM2(a.polygons, b.polygons) > SLIVER_M2);
    expect(overlapping.map(([a, b]) => `${a.number} ${b.number}`)).toEqual([]);
  });

  it('have the sizes of town lots, and larger ones at the shore', () => {
    const areasOf = (zone: string) =>
      parcels
        .filter((parcel) => parcel.zone === zone)
        .map(({ polygons }) => areaM2(polygons))
        .sort((a, b) => a - b);
    const town = areasOf('R-1 Town Residential');
    const shore = areasOf('R-2 Shore Residential');
    expect(town[0]).toBeGreaterThan(280);
    expect(town.at(-1)).toBeLessThan(1250);
    const middleOf = (areas: number[]) => areas[Math.floor(areas.length / 2)] ?? NaN;
    expect(middleOf(town)).toBeGreaterThan(450);
    expect(middleOf(town)).toBeLessThan(750);
    expect(middleOf(shore)).toBeGreaterThan(middleOf(town) * 1.4);
  });

  it('leave the streets free', () => {
    const streets = readAreas('larkhaven/streets.geojson', anyProperties).map((feature) => ({
      number: 'street',
      polygons: inMetres(feature.geometry),
    }));
    // Streets and parcels are rounded apart: a centimetre along a front of a hundred metres.
    const covered = nearPairs([...parcels, ...streets])
      .filter(([a, b]) => (a.number === 'street') !== (b.number === 'street'))
      .filter(([a, b]) => commonM2(a.polygons, b.polygons) > 1);
    expect(covered.map(([a, b]) => `${a.number} ${b.number}`)).toEqual([]);
  });
});

describe('the buildings', () => {
  it('are about five hundred and fifty, with numbers of their own', () => {
    expect(buildings.length).toBeGreaterThan(520);
    expect(buildings.length).toBeLessThan(600);
    expect(buildingById.size).toBe(buildings.length);
  });

  it('stand within their parcels', () => {
    const outside = buildings.filter(({ parcel, polygons }) => {
      const ground = parcelByNumber.get(parcel);
      return !ground || outsideM2(polygons, ground.polygons) > SLIVER_M2;
    });
    expect(outside.map(({ id }) => id)).toEqual([]);
  });

  it('overlap nowhere but where the tower stands on the civic hall', () => {
    const overlapping = nearPairs(buildings).filter(
      ([a, b]) => commonM2(a.polygons, b.polygons) > SLIVER_M2,
    );
    expect(overlapping.map((pair) => pair.map(({ kind }) => kind))).toEqual([['civic', 'civic']]);
    const [hall, tower] = (overlapping[0] ?? []).toSorted((a, b) => a.baseM - b.baseM);
    expect(tower?.baseM).toBe(hall?.topM);
  });

  it('have the heights of their kinds', () => {
    const ranges = {
      house: [5, 9],
      garage: [2.8, 3.5],
      shop: [3.6, 14],
      apartment: [14, 25],
      civic: [9, 31],
      warehouse: [7, 11],
    } as const;
    for (const { kind, baseM, topM, id } of buildings) {
      expect(topM, id).toBeGreaterThanOrEqual(ranges[kind][0]);
      expect(topM, id).toBeLessThanOrEqual(ranges[kind][1]);
      expect(topM, id).toBeGreaterThan(baseM);
    }
  });

  it('share the whole of their party walls on the main street', () => {
    const shops = buildings.filter(({ kind, topM }) => kind === 'shop' && topM >= 8);
    const corners = new Map<string, number>();
    for (const { polygons } of shops) {
      for (const [x, y] of polygons.flat(2)) {
        const key = `${x},${y}`;
        corners.set(key, (corners.get(key) ?? 0) + 1);
      }
    }
    // A front corner is shared by two neighbours when both have it to the last digit.
    const sharing = shops.filter(({ polygons }) =>
      polygons.flat(2).some(([x, y]) => (corners.get(`${x},${y}`) ?? 0) > 1),
    );
    expect(sharing.length).toBeGreaterThan(45);
  });

  it('include one with a courtyard', () => {
    const withHoles = buildings.filter(({ polygons }) =>
      polygons.some((rings) => rings.length > 1),
    );
    expect(withHoles.map(({ kind }) => kind)).toEqual(['apartment']);
  });
});

describe('the receptors', () => {
  it('have a yard for nearly every residential parcel with a building, within the parcel and free of buildings', () => {
    const yards = readAreas(
      'larkhaven/yards.geojson',
      z.strictObject({
        id: z.string(),
        parcel: z.string(),
        address: z.string(),
        label: z.string(),
      }),
    );
    expect(new Set(yards.map(({ properties }) => properties.id)).size).toBe(yards.length);
    expect(yards.length).toBeGreaterThan(300);
    for (const { geometry, properties } of yards) {
      const polygons = inMetres(geometry);
      const parcel = parcelByNumber.get(properties.parcel);
      expect(parcel?.address, properties.id).toBe(properties.address);
      // Welding moves a parcel's corners by up to three centimetres.
      expect(outsideM2(polygons, parcel?.polygons ?? []), properties.id).toBeLessThan(0.5);
      const standing = buildings.filter((building) => building.parcel === properties.parcel);
      for (const building of standing) {
        expect(commonM2(polygons, building.polygons), properties.id).toBeLessThan(SLIVER_M2);
      }
    }
  });

  it('have two parks, a school yard, a community garden and a promenade', () => {
    const spaces = readAreas(
      'larkhaven/open-space.geojson',
      z.strictObject({ id: z.string(), class: z.enum(['open-space', 'walk']), name: z.string() }),
    );
    expect(spaces.map(({ properties }) => [properties.class, properties.name])).toEqual([
      ['open-space', 'Lanternyard Green'],
      ['open-space', 'Osierbend Park'],
      ['open-space', 'Netloft School Yard'],
      ['open-space', 'Gullfeather Community Garden'],
      ['walk', 'Saltpan Promenade'],
    ]);
  });

  it('have twenty solar collectors on the roofs that they name', () => {
    const collectors = readAreas(
      'larkhaven/collectors.geojson',
      z.strictObject({
        id: z.string(),
        building: z.string(),
        address: z.string(),
        class: z.literal('collector'),
        planeM: z.number(),
        tiltDeg: z.number().min(0).max(60),
        facingDeg: z.number().min(90).max(270),
      }),
    );
    expect(collectors).toHaveLength(20);
    for (const { geometry, properties } of collectors) {
      const roof = buildingById.get(properties.building);
      expect(properties.planeM, properties.id).toBe(roof?.topM);
      expect(outsideM2(inMetres(geometry), roof?.polygons ?? []), properties.id).toBe(0);
    }
  });
});

describe('every area of the sample', () => {
  const files = [
    'parcels',
    'buildings',
    'yards',
    'open-space',
    'collectors',
    'streets',
    'water',
  ].map((name) => `larkhaven/${name}.geojson`);

  it.each(files)('is valid and turned as RFC 7946 asks in %s', (path) => {
    for (const { geometry, properties } of readAreas(path, anyProperties)) {
      for (const [outer = [], ...holes] of inMetres(geometry)) {
        const name = JSON.stringify(properties);
        expect(ringArea(outer), name).toBeGreaterThan(0);
        for (const hole of holes) expect(ringArea(hole), name).toBeLessThan(0);
        for (const ring of [outer, ...holes]) {
          expect(ring.length, name).toBeGreaterThanOrEqual(4);
          expect(ring.at(-1), name).toEqual(ring[0]);
          expect(crossingsOf(ring), name).toBe(0);
        }
      }
    }
  });

  it('lies within the extent of the municipality', () => {
    const { extent } = z
      .object({ extent: z.tuple([z.number(), z.number(), z.number(), z.number()]) })
      .parse(readJson('larkhaven/municipality.json'));
    const [west, south, east, north] = extent;
    for (const path of files) {
      for (const { geometry } of readAreas(path, anyProperties)) {
        const polygons =
          geometry.type === 'Polygon' ? [geometry.coordinates] : geometry.coordinates;
        for (const [lng = NaN, lat = NaN] of polygons.flat(2)) {
          // The sheet is square in metres, so its degrees lean by up to a tenth of a metre.
          expect(lng > west - 2e-5 && lng < east + 2e-5 && lat > south - 2e-5, path).toBe(true);
          expect(lat < north + 2e-5, path).toBe(true);
        }
      }
    }
  });
});

/** How often sides of a ring cross or touch that are no neighbours, repeated corners included. */
function crossingsOf(ring: readonly (readonly [number, number])[]): number {
  const side = (a: readonly number[], b: readonly number[], c: readonly number[]): number =>
    ((b[0] ?? NaN) - (a[0] ?? NaN)) * ((c[1] ?? NaN) - (a[1] ?? NaN)) -
    ((b[1] ?? NaN) - (a[1] ?? NaN)) * ((c[0] ?? NaN) - (a[0] ?? NaN));
  const sides = ring.slice(1).map((end, index) => [ring[index] ?? end, end] as const);
  let crossings = new Set(ring.slice(1).map(String)).size === sides.length ? 0 : 1;
  sides.forEach(([a, b], index) => {
    for (const [c, d] of sides.slice(index + 2)) {
      const crosses =
        Math.sign(side(a, b, c)) * Math.sign(side(a, b, d)) < 0 &&
        Math.sign(side(c, d, a)) * Math.sign(side(c, d, b)) < 0;
      if (crosses) crossings += 1;
    }
  });
  return crossings;
}
