import { describe, expect, it } from 'vitest';
import type { LngLat, Polygonal } from '../../../shared/geometry/geojson-schema.ts';
import {
  blockFeatures,
  blockLabelFeatures,
  boundsAround,
  middleOf,
  notMetFeatures,
  type MapBlock,
  type MapReceptor,
} from '../../../web/map/map-features.ts';

const square = (west: number, south: number, size: number): Polygonal => ({
  type: 'Polygon',
  coordinates: [squareRing(west, south, size)],
});
const block = (id: string, topM: number, role: MapBlock['role'] = 'proposed'): MapBlock => ({
  id,
  role,
  baseM: 0,
  topM,
  geometry: square(-91.3, 46.75, 0.001),
});

describe('blockFeatures', () => {
  it('draws a tower after its podium, whatever their order', () => {
    const { features } = blockFeatures([block('tower', 44), block('podium', 14)]);
    expect(features.map((one) => one.properties.id)).toEqual(['podium', 'tower']);
  });
});

describe('blockLabelFeatures', () => {
  it('writes a proposed block’s height and nothing on what is removed', () => {
    const { features } = blockLabelFeatures(
      [block('tower', 44), block('old', 7, 'existing'), block('podium', 14)],
      (heightM) => `+${heightM} m`,
    );
    expect(features.map((one) => one.properties.text)).toEqual(['+44 m', '+14 m']);
  });

  it('sets the label of a tower into its middle and that of its podium aside', () => {
    const podium: MapBlock = { ...block('podium', 14), geometry: square(0, 0, 10) };
    const tower: MapBlock = { ...block('tower', 44), geometry: square(4, 4, 5) };
    const { features } = blockLabelFeatures([tower, podium], String);
    const [onTower, onPodium] = features.map((one) => one.geometry.coordinates);
    expect(onTower?.[0]).toBeCloseTo(6.5);
    expect(onTower?.[1]).toBeCloseTo(6.5);
    // Towards the podium's south-west corner, the farthest from the tower.
    expect(onPodium?.[0]).toBeCloseTo(1.5);
    expect(onPodium?.[1]).toBeCloseTo(1.5);
  });
});

describe('notMetFeatures', () => {
  it('sets a cross where the rule is not met and nowhere else', () => {
    const receptor = (id: string, finding: MapReceptor['finding']): MapReceptor => ({
      id,
      finding,
      label: id,
      class: 'yard',
      geometry: square(0, 0, 2),
    });
    const { features } = notMetFeatures([
      receptor('a', 'met'),
      receptor('b', 'not-met'),
      receptor('c', null),
    ]);
    expect(features).toMatchObject([
      { geometry: { coordinates: [1, 1] }, properties: { id: 'b' } },
    ]);
  });
});

describe('middleOf', () => {
  it('is the centroid, in either direction of drawing', () => {
    const geometry = square(10, 20, 4);
    const turned: Polygonal = {
      type: 'Polygon',
      coordinates: [squareRing(10, 20, 4).toReversed()],
    };
    for (const one of [geometry, turned]) {
      expect(middleOf(one)[0]).toBeCloseTo(12);
      expect(middleOf(one)[1]).toBeCloseTo(22);
    }
  });

  it('lies on the largest of several parts', () => {
    const parts: Polygonal = {
      type: 'MultiPolygon',
      coordinates: [[squareRing(0, 0, 1)], [squareRing(10, 10, 4)]],
    };
    expect(middleOf(parts)[0]).toBeCloseTo(12);
  });
});

describe('boundsAround', () => {
  it('holds everything with the margin on each side', () => {
    const bounds = boundsAround([square(-91.3, 46.75, 0.001)], 111.32);
    expect(bounds?.[1]).toBeCloseTo(46.749, 6);
    expect(bounds?.[3]).toBeCloseTo(46.752, 6);
    // A degree of longitude is shorter there by the cosine of the latitude.
    expect(bounds?.[0]).toBeCloseTo(-91.3 - 0.001 / Math.cos((46.75 * Math.PI) / 180), 6);
  });

  it('is null for nothing', () => {
    expect(boundsAround([])).toBeNull();
  });
});

function squareRing(west: number, south: number, size: number): LngLat[] {
  return [
    [west, south],
    [west + size, south],
    [west + size, south + size],
    [west, south + size],
    [west, south],
  ];
}
