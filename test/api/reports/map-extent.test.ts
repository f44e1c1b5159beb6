import { describe, expect, it } from 'vitest';
import { chooseMapExtent } from '../../../api/modules/reports/map-extent.ts';
import { extentOnPlane } from '../../../shared/drawing/frame.ts';
import type { Polygonal } from '../../../shared/geometry/geojson-schema.ts';
import { createLocalPlane } from '../../../shared/geometry/local-plane.ts';

function siteAt(latitude: number): Polygonal {
  const [west, south, east, north] = [-91.3, latitude, -91.2992, latitude + 0.0004];
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

/** Metres from the site to the edges of the map. */
function margins(latitude: number, heightM: number) {
  const plane = createLocalPlane(-91.3, latitude);
  const map = extentOnPlane(chooseMapExtent([siteAt(latitude)], heightM), plane);
  const site = extentOnPlane([-91.3, latitude, -91.2992, latitude + 0.0004], plane);
  return {
    west: site.westM - map.westM,
    south: site.southM - map.southM,
    east: map.eastM - site.eastM,
    north: map.northM - site.northM,
    shape: (map.eastM - map.westM) / (map.northM - map.southM),
  };
}

describe('chooseMapExtent', () => {
  it('reaches towards the pole, where shadows fall, on both hemispheres', () => {
    const northern = margins(46.75, 44);
    expect(northern.north).toBeGreaterThan(170);
    expect(northern.north).toBeGreaterThan(northern.south * 3);
    const southern = margins(-33.9, 44);
    expect(southern.south).toBeGreaterThan(southern.north * 3);
  });

  it.each([[6], [44], [300]])(
    'has one shape at a height of %i m, with the site inside',
    (heightM) => {
      const { shape, ...sides } = margins(46.75, heightM);
      expect(shape).toBeGreaterThan(1.43);
      expect(shape).toBeLessThan(1.47);
      for (const side of Object.values(sides)) expect(side).toBeGreaterThan(10);
    },
  );
});
