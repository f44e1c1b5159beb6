import { VectorTile } from '@mapbox/vector-tile';
import { PbfReader } from 'pbf';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { Building } from '../../../api/modules/base-data/building.entity.ts';
import { StreetLine } from '../../../api/modules/base-data/street-line.entity.ts';
import { Water } from '../../../api/modules/base-data/water.entity.ts';
import { tileLayers, tileLayerSchema } from '../../../shared/contracts/base-data.ts';
import type { LngLat, Polygonal } from '../../../shared/geometry/geojson-schema.ts';
import { buildSmallCity, rectangle } from '../../support/small-city.ts';
import { startTestApi, type Agent, type TestApi } from '../../support/test-api.ts';

/** The middle of the small city. */
const middle: LngLat = [-91.3, 46.75];
const contentType = 'application/vnd.mapbox-vector-tile';

let api: TestApi;
let reader: Agent;

beforeAll(async () => {
  api = await startTestApi();
  await buildSmallCity(api.orm);
  const em = api.orm.em.fork();
  em.create(Water, { name: 'Test Lake', geometry: box(-93, 45, -90, 48) });
  em.create(Water, { name: 'Last Bay', geometry: box(179, -18, 180, -16) });
  em.create(Water, { name: 'First Bay', geometry: box(-180, -18, -179, -16) });
  em.create(StreetLine, {
    name: 'Test Row',
    geometry: { type: 'LineString', coordinates: [middle, [-91.299, 46.75]] },
  });
  await em.flush();
  reader = await api.signIn('public');
});
afterAll(() => api.close());

function box(west: number, south: number, east: number, north: number): Polygonal {
  const ring: LngLat[] = [
    [west, south],
    [east, south],
    [east, north],
    [west, north],
    [west, south],
  ];
  return { type: 'Polygon', coordinates: [ring] };
}

/**
 * The tile of a zoom that holds a place: column from the west, row from the north, on the square of
 * Web Mercator (OGC Two Dimensional Tile Matrix Set, WebMercatorQuad; the formula from memory).
 */
function tileAt([lng, lat]: LngLat, z: number): { x: number; y: number; z: number } {
  const north = Math.asinh(Math.tan((lat * Math.PI) / 180));
  return {
    x: Math.floor(((lng + 180) / 360) * 2 ** z),
    y: Math.floor(((1 - north / Math.PI) / 2) * 2 ** z),
    z,
  };
}

type Place = ReturnType<typeof tileAt>;

const pathOf = (layer: string, { x, y, z }: Place) => `/api/tiles/${layer}/${z}/${x}/${y}.mvt`;

async function readTile(layer: string, place: Place) {
  const response = await reader.get(pathOf(layer, place)).responseType('blob').expect(200);
  const bytes: unknown = response.body;
  if (!Buffer.isBuffer(bytes)) throw new Error('The answer is no bytes.');
  return { bytes, layers: new VectorTile(new PbfReader(bytes)).layers };
}

async function readFeatures(layer: string, place: Place) {
  const found = (await readTile(layer, place)).layers[layer];
  return Array.from({ length: found?.length ?? 0 }, (_, index) => {
    const feature = found?.feature(index);
    if (feature === undefined) throw new Error(`The feature ${index} is missing.`);
    return feature;
  });
}

async function namesOf(layer: string, place: Place, property = 'number'): Promise<unknown[]> {
  const features = await readFeatures(layer, place);
  return features.map(({ properties }) => properties[property]).sort();
}

const cityTile = tileAt(middle, 14);

describe('a tile of parcels', () => {
  it('is one layer of that name, version 2 of the format, on a grid of 4096', async () => {
    const { layers } = await readTile('parcels', cityTile);
    expect(Object.keys(layers)).toEqual(['parcels']);
    expect(layers['parcels']).toMatchObject({ version: 2, name: 'parcels', extent: 4096 });
  });

  it('has every parcel with number, address and use', async () => {
    const features = await readFeatures('parcels', cityTile);
    expect(features.map(({ properties }) => properties)).toEqual(
      expect.arrayContaining(
        ['S-1', 'N-1', 'N-2', 'W-1', 'E-1', 'P-1'].map((number) => ({
          number,
          address: `${number} Test Row`,
          use: 'dwelling',
        })),
      ),
    );
    expect(features).toHaveLength(6);
  });

  it('draws a parcel where it lies, to a unit of the grid', async () => {
    const { x, y, z } = cityTile;
    const features = await readFeatures('parcels', cityTile);
    const drawn = features.find(({ properties }) => properties['number'] === 'N-1');
    const geometry = drawn?.toGeoJSON(x, y, z).geometry;
    if (geometry?.type !== 'Polygon') throw new Error('N-1 is no polygon.');
    const unitDeg = 360 / 2 ** z / 4096;
    for (const corner of rectangle(0, 40, 40, 40).coordinates[0] ?? []) {
      const distances = (geometry.coordinates[0] ?? []).map(([lng = 0, lat = 0]) =>
        Math.max(Math.abs(lng - Number(corner[0])), Math.abs(lat - Number(corner[1]))),
      );
      expect(Math.min(...distances)).toBeLessThanOrEqual(unitDeg);
    }
  });

  it('has what lies across its edge, as the tile beyond has', async () => {
    const parcels = { 'S-1': [0, 0], 'N-2': [0, 80], 'W-1': [-40, 0], 'P-1': [40, 40] } as const;
    for (const [number, [x, y]] of Object.entries(parcels)) {
      // A tile of this zoom is 26 m wide, so that no parcel lies on one alone.
      const tiles = rectangle(x + 1, y + 1, 38, 38).coordinates[0]?.map(([lng, lat]) =>
        tileAt([Number(lng), Number(lat)], 20),
      );
      expect(new Set(tiles?.map((tile) => pathOf('parcels', tile))).size).toBeGreaterThan(1);
      for (const tile of tiles ?? []) expect(await namesOf('parcels', tile)).toContain(number);
    }
  });
});

describe('the layers', () => {
  it.each([
    ['parcels', 6],
    ['buildings', 5],
    ['streets', 1],
    ['street-lines', 1],
    ['water', 1],
    ['open-space', 1],
  ] as const)('have the properties that are published, and no more: %s', async (layer, count) => {
    const features = await readFeatures(layer, cityTile);
    expect(features).toHaveLength(count);
    for (const { properties } of features) {
      expect(Object.keys(properties).sort()).toEqual([...tileLayers[layer]].sort());
    }
  });

  it('are all named above', () => {
    expect(tileLayerSchema.options).toHaveLength(6);
  });

  it('give heights as numbers of metres', async () => {
    const features = await readFeatures('buildings', cityTile);
    const house = features.find(({ properties }) => properties['id'] === 'B-N-1');
    expect(house?.properties).toEqual({ id: 'B-N-1', baseM: 0, topM: 8 });
  });

  it.each(Array.from({ length: 23 }, (_, zoom) => zoom))(
    'show on zoom %i what is there',
    async (zoom) => {
      expect(await namesOf('water', tileAt(middle, zoom), 'name')).toContain('Test Lake');
    },
  );

  it.each([1, 2, 8, 14, 22])(
    'show on zoom %i what lies at either edge of the world',
    async (zoom) => {
      const lastTile = tileAt([179.999999, -17], zoom);
      expect(await namesOf('water', lastTile, 'name')).toEqual(['Last Bay']);
      expect(await namesOf('water', tileAt([-180, -17], zoom), 'name')).toEqual(['First Bay']);
    },
  );
});

describe('a tile with nothing on it', () => {
  it.each([
    ['far from the city', 'parcels', tileAt([10, 50], 14)],
    ['in the corner of the world', 'water', { x: 2 ** 22 - 1, y: 2 ** 22 - 1, z: 22 }],
    ['of things that are smaller than a grid’s unit', 'buildings', { x: 0, y: 0, z: 0 }],
  ])('is an answer without bytes: %s', async (_name, layer, place) => {
    const response = await reader.get(pathOf(layer, place)).responseType('blob').expect(200);
    expect(response.body).toEqual(Buffer.alloc(0));
    expect(response.headers['content-type']).toBe(contentType);
    expect(response.headers['cache-control']).toBe('public, max-age=600');
  });
});

describe('a tile that cannot be', () => {
  it.each([
    'parcels/23/0/0.mvt',
    'parcels/3/8/0.mvt',
    'parcels/3/0/8.mvt',
    'parcels/-1/0/0.mvt',
    'parcels/3/-1/0.mvt',
    'parcels/3/1.5/0.mvt',
    'parcels/3/x/0.mvt',
    'parcels/3/1e300/0.mvt',
    'yards/3/0/0.mvt',
    'parcel/3/0/0.mvt',
    'toString/3/0/0.mvt',
    'parcels/3/0/0.png',
    'parcels/3/0/0',
    'parcels/3/0.mvt',
  ])('is not found: %s', async (path) => {
    const response = await reader.get(`/api/tiles/${path}`).expect(404);
    expect(response.headers['content-type']).toContain('application/problem+json');
    expect(response.body).toMatchObject({ code: 'NOT_FOUND' });
    expect(response.headers['cache-control'] ?? '').not.toContain('public');
  });
});

describe('how a tile is kept', () => {
  it('is said for ten minutes, for everybody, with a tag', async () => {
    const { headers } = await reader.get(pathOf('parcels', cityTile)).expect(200);
    expect(headers['content-type']).toBe(contentType);
    expect(headers['cache-control']).toBe('public, max-age=600');
    expect(headers['etag']).toMatch(/^(?:W\/)?"[^"]+"$/);
  });

  it('costs no bytes as long as nothing has changed, and is new after a change', async () => {
    const path = pathOf('buildings', cityTile);
    const tag = String((await reader.get(path).expect(200)).headers['etag']);
    const same = await reader.get(path).set('If-None-Match', tag).expect(304);
    expect(same.text).toBe('');
    await api.orm.em.fork().nativeUpdate(Building, { id: 'B-N-2' }, { topM: 9 });
    const changed = await reader.get(path).set('If-None-Match', tag).expect(200);
    expect(changed.headers['etag']).not.toBe(tag);
    const features = await readFeatures('buildings', cityTile);
    expect(features.map(({ properties }) => properties)).toContainEqual(
      expect.objectContaining({ id: 'B-N-2', topM: 9 }),
    );
  });

  it('is the same whoever asks, and carries nobody’s cookie', async () => {
    const { bytes } = await readTile('parcels', cityTile);
    for (const person of ['other', 'planner', 'board', 'administrator'] as const) {
      const agent = await api.signIn(person);
      const path = pathOf('parcels', cityTile);
      const response = await agent.get(path).responseType('blob').expect(200);
      expect(response.body).toEqual(bytes);
      expect(response.headers['set-cookie']).toBeUndefined();
    }
  });
});
