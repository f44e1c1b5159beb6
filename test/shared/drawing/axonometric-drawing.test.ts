import { expect, it } from 'vitest';
import { drawAxonometric } from '../../../shared/drawing/axonometric-drawing.ts';
import { createFigureFormat } from '../../../shared/drawing/figure-format.ts';
import type { Polygonal } from '../../../shared/geometry/geojson-schema.ts';

function box(west: number, south: number, east: number, north: number): Polygonal {
  return {
    type: 'Polygon',
    coordinates: [
      [
        [west, south],
        [east, south],
        [east, north],
        [west, north],
        [west, south],
      ],
    ],
  };
}

it('draws podium and tower inside the picture, with their heights', () => {
  const svg = drawAxonometric(
    [
      { geometry: box(-91.3004, 46.7493, -91.2996, 46.7498), baseM: 0, topM: 14, role: 'proposed' },
      { geometry: box(-91.3, 46.7494, -91.2997, 46.7497), baseM: 14, topM: 44, role: 'proposed' },
      { geometry: box(-91.3012, 46.7495, -91.3009, 46.7497), baseM: 0, topM: 9, role: 'context' },
    ],
    { site: [box(-91.3005, 46.7492, -91.2995, 46.7499)], parcels: [] },
    {
      origin: { longitude: -91.3, latitude: 46.75 },
      width: 480,
      height: 240,
      view: { fromDeg: 155, altitudeDeg: 38 },
      label: 'The proposal',
      figures: createFigureFormat('en-US'),
    },
  );
  expect(svg).toContain('+14.0 m');
  expect(svg).toContain('+44.0 m');
  expect(svg).not.toContain('+9.0 m');
  expect(svg).toContain('true north');
  const points = [...svg.matchAll(/[ML](-?[\d.]+) (-?[\d.]+)/g)];
  expect(points.length).toBeGreaterThan(30);
  for (const [, x, y] of points) {
    expect(Number(x)).toBeGreaterThanOrEqual(0);
    expect(Number(x)).toBeLessThanOrEqual(480);
    expect(Number(y)).toBeGreaterThanOrEqual(0);
    expect(Number(y)).toBeLessThanOrEqual(240);
  }
});
