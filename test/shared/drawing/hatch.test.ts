import { describe, expect, it } from 'vitest';
import type { SheetPoint, SheetRing } from '../../../shared/drawing/frame.ts';
import { hatchLines } from '../../../shared/drawing/hatch.ts';

/** Independent of the code under test: the winding of angles around a point. */
function isInsideByAngles([x, y]: SheetPoint, ring: SheetRing): boolean {
  let total = 0;
  ring.forEach(([ax, ay], index) => {
    const [bx, by] = ring[(index + 1) % ring.length] ?? [ax, ay];
    total += Math.atan2(
      (ax - x) * (by - y) - (ay - y) * (bx - x),
      (ax - x) * (bx - x) + (ay - y) * (by - y),
    );
  });
  return Math.abs(total) > Math.PI;
}

const outer: SheetRing = [
  [10, 12],
  [93, 5],
  [120, 60],
  [64, 44],
  [70, 101],
  [22, 90],
];
const hole: SheetRing = [
  [30, 30],
  [50, 28],
  [48, 55],
];

function areaOf(ring: SheetRing): number {
  return Math.abs(
    ring.reduce((sum, [ax, ay], index) => {
      const [bx, by] = ring[(index + 1) % ring.length] ?? [ax, ay];
      return sum + (ax * by - bx * ay) / 2;
    }, 0),
  );
}

describe('hatchLines', () => {
  it.each([0, 45, 90, 137])('lies inside the outline and outside its hole at %i°', (angle) => {
    const lines = hatchLines([outer, hole], 2, angle);
    expect(lines.length).toBeGreaterThan(20);
    for (const [from, to] of lines) {
      for (const share of [0.001, 0.25, 0.5, 0.75, 0.999]) {
        const point: SheetPoint = [
          from[0] + (to[0] - from[0]) * share,
          from[1] + (to[1] - from[1]) * share,
        ];
        expect(isInsideByAngles(point, outer)).toBe(true);
        expect(isInsideByAngles(point, hole)).toBe(false);
      }
    }
  });

  it('covers the whole area: line length times spacing comes to it', () => {
    const spacing = 0.5;
    const length = hatchLines([outer, hole], spacing, 45).reduce(
      (sum, [a, b]) => sum + Math.hypot(b[0] - a[0], b[1] - a[1]),
      0,
    );
    const area = areaOf(outer) - areaOf(hole);
    expect((length * spacing) / area).toBeGreaterThan(0.99);
    expect((length * spacing) / area).toBeLessThan(1.01);
  });

  it('rises to the right at 45° on a sheet whose y runs downward', () => {
    for (const [from, to] of hatchLines([outer], 3, 45)) {
      expect((to[1] - from[1]) / (to[0] - from[0])).toBeCloseTo(-1, 6);
    }
  });

  it('lies on one grid, so that two halves of an area are hatched like the whole', () => {
    const square = (left: number, right: number): SheetRing => [
      [left, 0],
      [right, 0],
      [right, 40],
      [left, 40],
    ];
    const offsets = (ring: SheetRing) =>
      new Set(hatchLines([ring], 4, 0).map(([from]) => from[1].toFixed(6)));
    expect(offsets(square(0, 17))).toEqual(offsets(square(17, 40)));
  });

  it('draws nothing for nothing', () => {
    expect(hatchLines([], 3, 45)).toEqual([]);
  });
});
