import { expect, it } from 'vitest';
import { standsOnSite } from '../../../api/modules/reports/report-parts/stands-on-site.ts';
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

const site = box(-91.3, 46.75, -91.299, 46.751);

it.each([
  ['inside it', true, box(-91.2998, 46.7502, -91.2992, 46.7508)],
  ['two thirds inside', true, box(-91.3001, 46.7502, -91.2998, 46.7504)],
  ['one third inside', false, box(-91.3002, 46.7502, -91.2999, 46.7504)],
  ['beside it, wall to wall', false, box(-91.301, 46.75, -91.3, 46.751)],
])('a building %s: on the site %s', (_, expected, building) => {
  expect(standsOnSite(building, site)).toBe(expected);
});
