import proj4 from 'proj4';
import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { massingProperties, readAreas, readBytes, readJson, toMetres } from './sample-files.ts';

const blocks = readAreas('massings/tallow-wharf.geojson', massingProperties);
const outlineOf = (block: (typeof blocks)[number]): number[][] =>
  block.geometry.type === 'Polygon' ? (block.geometry.coordinates[0] ?? []) : [];

describe('the massing as KML', () => {
  const kml = new TextDecoder().decode(readBytes('massings/tallow-wharf.kml'));
  const placemarks = kml.split('<Placemark').slice(1);

  it('has an extruded polygon above ground for each block', () => {
    expect(placemarks).toHaveLength(blocks.length);
    for (const placemark of placemarks) {
      expect(placemark).toContain('<extrude>1</extrude>');
      expect(placemark).toContain('<altitudeMode>relativeToGround</altitudeMode>');
    }
  });

  it('has the outlines of the GeoJSON at the height of the tops', () => {
    blocks.forEach((block, index) => {
      const text = /<coordinates>([^<]+)</.exec(placemarks[index] ?? '')?.[1] ?? '';
      const points = text.split(' ').map((point) => point.split(',').map(Number));
      expect(points).toEqual(outlineOf(block).map((point) => [...point, block.properties.top]));
    });
  });
});

describe('the massing as CityJSON', () => {
  const city = z
    .object({
      type: z.literal('CityJSON'),
      version: z.literal('2.0'),
      metadata: z.object({ referenceSystem: z.string() }),
      transform: z.object({
        scale: z.tuple([z.number(), z.number(), z.number()]),
        translate: z.tuple([z.number(), z.number(), z.number()]),
      }),
      vertices: z.array(z.tuple([z.int(), z.int(), z.int()])),
      CityObjects: z.record(
        z.string(),
        z.object({
          type: z.enum(['Building', 'BuildingPart']),
          attributes: z.record(z.string(), z.unknown()),
          parents: z.array(z.string()).optional(),
          children: z.array(z.string()).optional(),
          geometry: z
            .array(
              z.object({
                type: z.literal('Solid'),
                lod: z.string(),
                boundaries: z.array(z.array(z.array(z.array(z.int())))),
              }),
            )
            .optional(),
        }),
      ),
    })
    .parse(readJson('massings/tallow-wharf.city.json'));
  const { scale, translate } = city.transform;
  const vertices = city.vertices.map((vertex) =>
    vertex.map((value, axis) => value * (scale[axis] ?? NaN) + (translate[axis] ?? NaN)),
  );
  const shellOf = (id: string) => city.CityObjects[id]?.geometry?.[0]?.boundaries[0] ?? [];

  it('has a closed solid for each block, every edge walked once in each direction', () => {
    for (const { properties } of blocks) {
      const edges = shellOf(properties.id).flatMap((face) =>
        face.flatMap((ring) =>
          ring.map((from, index) => `${from} ${ring[(index + 1) % ring.length] ?? from}`),
        ),
      );
      expect(edges.length).toBeGreaterThanOrEqual(24);
      expect(new Set(edges).size).toBe(edges.length);
      for (const edge of edges) expect(edges).toContain(edge.split(' ').reverse().join(' '));
    }
  });

  it('stands at the heights and, on UTM zone 15 North, within a centimetre of the outlines of the GeoJSON', () => {
    expect(city.metadata.referenceSystem).toBe('https://www.opengis.net/def/crs/EPSG/0/32615');
    const toLngLat = proj4('+proj=utm +zone=15 +datum=WGS84 +units=m');
    for (const block of blocks) {
      const corners = [...new Set(shellOf(block.properties.id).flat(2))].map(
        (index) => vertices[index] ?? [],
      );
      const heights = corners.map(([, , z = NaN]) => z);
      expect(Math.min(...heights)).toBeCloseTo(block.properties.base, 3);
      expect(Math.max(...heights)).toBeCloseTo(block.properties.top, 3);
      const outline = outlineOf(block).map(([lng = NaN, lat = NaN]) => toMetres([lng, lat]));
      for (const [x = NaN, y = NaN] of corners) {
        const [lng = NaN, lat = NaN] = toLngLat.inverse([x, y]);
        const place = toMetres([lng, lat]);
        const gaps = outline.map((corner) =>
          Math.hypot(corner[0] - place[0], corner[1] - place[1]),
        );
        expect(Math.min(...gaps)).toBeLessThan(0.01);
      }
    }
  });

  it('has the proposal as one building of parts', () => {
    const parts = blocks
      .filter(({ properties }) => properties.role === 'proposed')
      .map(({ properties }) => properties.id);
    expect(city.CityObjects.proposal?.children).toEqual(parts);
    for (const part of parts) expect(city.CityObjects[part]?.parents).toEqual(['proposal']);
  });
});

it('has one fault in each of the five features of the broken massing', () => {
  const { features } = z
    .object({
      features: z.array(
        z.object({
          properties: z.object({ id: z.string(), base: z.number(), top: z.number() }),
          geometry: z.discriminatedUnion('type', [
            z.object({ type: z.literal('Point'), coordinates: z.array(z.number()) }),
            z.object({
              type: z.literal('Polygon'),
              coordinates: z.array(z.array(z.array(z.number()))),
            }),
          ]),
        }),
      ),
    })
    .parse(readJson('massings/broken-five-ways.geojson'));
  const faults = features.map(({ properties, geometry }) => {
    const ring = geometry.type === 'Polygon' ? (geometry.coordinates[0] ?? []) : [];
    const [first, last] = [ring[0], ring.at(-1)];
    return [
      properties.id,
      {
        isPoint: geometry.type === 'Point',
        isOpen: String(first) !== String(last),
        isUpsideDown: properties.top <= properties.base,
        isSwapped: (first?.[1] ?? 0) < 0,
      },
    ];
  });
  const none = { isPoint: false, isOpen: false, isUpsideDown: false, isSwapped: false };
  expect(faults).toEqual([
    ['crosses-itself', none],
    ['not-closed', { ...none, isOpen: true }],
    ['top-below-base', { ...none, isUpsideDown: true }],
    ['only-a-point', { ...none, isPoint: true }],
    ['latitude-first', { ...none, isSwapped: true }],
  ]);
});
