import { distance } from '@turf/turf';
import { describe, expect, it } from 'vitest';
import { createFrame, cutRing, extentOnPlane } from '../../../shared/drawing/frame.ts';
import { outlinePath } from '../../../shared/drawing/path-data.ts';
import type { Polygonal } from '../../../shared/geometry/geojson-schema.ts';
import { createLocalPlane } from '../../../shared/geometry/local-plane.ts';

const plane = createLocalPlane(-91.3, 46.75);
const extent = extentOnPlane([-91.303, 46.748, -91.297, 46.752], plane);
const frame = createFrame(plane, extent, 600);
const place = (longitude: number, latitude: number) =>
  frame.toSheet(plane.toPlane([longitude, latitude]));

describe('createFrame', () => {
  it('puts north up and east to the right', () => {
    const [x, y] = place(-91.3, 46.75);
    const [northX, northY] = place(-91.3, 46.751);
    const [eastX, eastY] = place(-91.299, 46.75);
    expect(northX).toBeCloseTo(x, 3);
    expect(northY).toBeLessThan(y - 50);
    expect(eastX).toBeGreaterThan(x + 50);
    expect(Math.abs(eastY - y)).toBeLessThan(0.01);
  });

  it('has one scale in both directions, within 0.3 % of distances on a sphere', () => {
    // turf measures on a sphere of 6,371,008.8 m; at this latitude WGS 84 differs by up to 0.3 %.
    for (const [longitude, latitude] of [
      [-91.299, 46.75],
      [-91.3, 46.7515],
    ] as const) {
      const metres = distance([-91.3, 46.75], [longitude, latitude], { units: 'meters' });
      const [ax, ay] = place(-91.3, 46.75);
      const [bx, by] = place(longitude, latitude);
      const ratio = Math.hypot(bx - ax, by - ay) / frame.pxPerM / metres;
      expect(Math.abs(ratio - 1)).toBeLessThan(0.004);
    }
  });
});

describe('cutRing', () => {
  it('keeps what lies inside, and cuts at the edge what reaches over it', () => {
    const inside = [
      [10, 10],
      [20, 10],
      [20, 20],
    ] as const;
    expect(cutRing(inside, 100, 50)).toEqual(inside);
    const over = cutRing(
      [
        [90, 10],
        [130, 10],
        [130, 30],
        [90, 30],
      ],
      100,
      50,
    );
    expect(Math.max(...over.map(([x]) => x))).toBe(100);
    expect(over).toHaveLength(4);
  });

  it('covers the frame where the ring is all around it', () => {
    const around = cutRing(
      [
        [-50, -50],
        [200, -50],
        [200, 200],
        [-50, 200],
      ],
      100,
      50,
    );
    expect(new Set(around.map((point) => point.join(',')))).toEqual(
      new Set(['0,0', '100,0', '100,50', '0,50']),
    );
  });

  it('leaves nothing of a ring outside', () => {
    expect(
      cutRing(
        [
          [-50, -50],
          [-20, -50],
          [-20, -20],
        ],
        100,
        50,
      ),
    ).toEqual([]);
  });
});

describe('outlinePath', () => {
  it('draws no line along the frame where ground was cut off', () => {
    const overNorth: Polygonal = {
      type: 'Polygon',
      coordinates: [
        [
          [-91.301, 46.7515],
          [-91.299, 46.7515],
          [-91.299, 46.753],
          [-91.301, 46.753],
          [-91.301, 46.7515],
        ],
      ],
    };
    const path = outlinePath(frame.cutRings(overNorth), frame);
    const points = [...path.matchAll(/(-?[\d.]+) (-?[\d.]+)/g)].map(
      ([, x, y]) => [Number(x), Number(y)] as const,
    );
    expect(path.match(/M/g)).toHaveLength(1);
    expect(path).not.toContain('Z');
    expect(points).toHaveLength(4);
    const [first, last] = [points[0], points[3]];
    expect(first?.[1]).toBe(0);
    expect(last?.[1]).toBe(0);
    expect(points[1]?.[1]).toBeGreaterThan(0);
  });
});
