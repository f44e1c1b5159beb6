import { describe, expect, it } from 'vitest';
import { createLocalPlane } from '../../../../shared/geometry/local-plane.ts';
import {
  contoursPath,
  nextKeyDates,
  planeBlocksOf,
  shadowContours,
} from '../../../../web/features/massings/shadow-preview.ts';
import { larkhaven } from '../../support/render-in-place.tsx';

const plane = createLocalPlane(larkhaven.longitude, larkhaven.latitude);
const corners: [number, number][] = [
  [0, 0],
  [10, 0],
  [10, 20],
  [0, 20],
  [0, 0],
];
const block = {
  id: 'b1',
  role: 'proposed' as const,
  baseM: 0,
  topM: 30,
  storeys: null,
  name: null,
  geometry: { type: 'Polygon' as const, coordinates: [corners.map((xy) => plane.toLngLat(xy))] },
};

describe('the shadow preview', () => {
  it('casts a shadow of the height’s length away from a sun at 45°', () => {
    const blocks = planeBlocksOf([block], larkhaven);
    // With the sun in the south at 45° a wall of 30 m shades 30 m to the north: common trigonometry.
    const contours = shadowContours(blocks, 'proposed', { azimuthDeg: 180, altitudeDeg: 45 });
    const ys = contours.flat().map(([, y]) => y);
    expect(Math.max(...ys)).toBeCloseTo(50, 3);
    expect(Math.min(...ys)).toBeCloseTo(0, 3);
  });

  it('keeps what stands today apart from what comes', () => {
    const blocks = planeBlocksOf([block], larkhaven);
    expect(shadowContours(blocks, 'existing', { azimuthDeg: 180, altitudeDeg: 45 })).toEqual([]);
  });

  it('writes closed paths', () => {
    const path = contoursPath([corners.slice(0, 4)], ([x, y]) => [x, -y]);
    expect(path).toBe('M0.0 0.0L10.0 0.0L10.0 -20.0L0.0 -20.0Z');
  });

  it('begins with the next key date and goes on into the next year', () => {
    expect(nextKeyDates('2026-12-01', 'America/Chicago').map(({ date }) => date)).toEqual([
      '2026-12-21',
      '2027-03-20',
      '2027-06-21',
      '2027-09-23',
    ]);
  });

  it('still shows a key date on its own day', () => {
    expect(nextKeyDates('2026-12-21', 'America/Chicago')[0]?.date).toBe('2026-12-21');
  });
});
