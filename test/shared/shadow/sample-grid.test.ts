import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { orientRing, signedRingArea, type Ring } from '../../../shared/geometry/ring.ts';
import { sampleArea } from '../../../shared/shadow/sample-grid.ts';
import { makeWindowFront } from '../../../shared/shadow/window-front.ts';
import { makeRectangle } from '../../support/plane-scenes.ts';

const sample = (rings: readonly Ring[], more: Partial<Parameters<typeof sampleArea>[0]> = {}) =>
  sampleArea({
    rings,
    outside: [],
    areaM2: rings.reduce((sum, ring) => sum + signedRingArea(ring), 0),
    gridM: 1,
    mostPoints: 10_000,
    withBorder: false,
    ...more,
  });

describe('a sampling grid', () => {
  it('halves the asked spacing, and is finer where the receptor is small', () => {
    // 30 m × 20 m at half a metre: 60 × 40 points. 4 m × 1 m: 400 points, 0.1 m apart.
    expect(sample([makeRectangle(0, 0, 30, 20)])).toMatchObject({ spacingM: 0.5, count: 2400 });
    const small = sample([makeRectangle(0, 0, 4, 1)]);
    expect(small.spacingM).toBeCloseTo(0.1, 9);
    expect(small.count).toBe(400);
  });

  it('is wider where the receptor would need too many points', () => {
    // 1 km² at 10,000 points: one every 10 m.
    expect(sample([makeRectangle(0, 0, 1000, 1000)])).toMatchObject({
      spacingM: 10,
      count: 10_000,
    });
  });

  it('leaves out what is cut away', () => {
    const cut = sample([makeRectangle(0, 0, 20, 20)], {
      outside: [makeRectangle(0, 0, 10, 20)],
      areaM2: 200,
    });
    expect(cut.count).toBe(800);
  });

  it('holds four grids of twice the spacing', () => {
    const { grid, gridCount } = sample([makeRectangle(0, 0, 20, 20)]);
    expect(gridCount).toBe(4);
    for (let one = 0; one < 4; one += 1) {
      expect(grid.filter((of) => of === one)).toHaveLength(400);
    }
  });

  it('finds points in slivers that lie between the rows of their grid', () => {
    expect(sample([makeRectangle(0, 0, 100, 0.01)]).count).toBeGreaterThan(15);
    expect(sample([makeRectangle(3, 7, 60, 0.02, 31)]).count).toBeGreaterThan(15);
  });

  it('stands for the area to its own spacing along the border', () => {
    fc.assert(
      fc.property(
        fc.array(fc.tuple(fc.double({ min: 0.3, max: 1 }), fc.double({ min: 4, max: 40 })), {
          minLength: 3,
          maxLength: 12,
        }),
        (spokes) => {
          // A star around the origin never crosses itself.
          const turns = spokes.reduce((sum, [turn]) => sum + turn, 0);
          let angle = 0;
          const ring = orientRing(
            spokes.map(([turn, radius]) => {
              angle += (turn / turns) * 2 * Math.PI;
              return [radius * Math.cos(angle), radius * Math.sin(angle)] as const;
            }),
            'outer',
          );
          const areaM2 = signedRingArea(ring);
          fc.pre(areaM2 > 1);
          const { count, spacingM } = sample([ring]);
          const borderM = ring.reduce((sum, [x, y], index) => {
            const [nextX, nextY] = ring[(index + 1) % ring.length] ?? [x, y];
            return sum + Math.hypot(nextX - x, nextY - y);
          }, 0);
          const cellM = spacingM ?? NaN;
          expect(Math.abs(count * cellM ** 2 - areaM2)).toBeLessThan(borderM * cellM);
        },
      ),
    );
  });

  it('adds a row of points just inside the border, of holes as well', () => {
    const withBorder = sample([makeRectangle(0, 0, 20, 20)], {
      outside: [makeRectangle(8, 8, 4, 4)],
      areaM2: 384,
      withBorder: true,
    });
    // 400 m² less 16 m² in half-metre cells; 80 m of border and 16 m around the hole.
    expect(withBorder.partCount).toBe((400 - 16) * 4);
    expect(withBorder.count - withBorder.partCount).toBe((80 + 16) * 2);
  });
});

describe('the points of a window', () => {
  it('lie a centimetre in front of its wall, evenly along it', () => {
    // A window 4 m wide in a wall that faces south: 0.01 m south of it.
    const front = makeWindowFront(
      [
        [0, 0],
        [4, 0],
      ],
      180,
      1,
    );
    expect(front.points.count).toBe(32);
    expect(front.points.spacingM).toBeCloseTo(0.125, 9);
    expect(front.points.box.minX).toBeCloseTo(0.0625, 9);
    expect(front.points.box.maxX).toBeCloseTo(3.9375, 9);
    expect(front.points.box.minY).toBeCloseTo(-0.01, 9);
    expect(front.points.box.maxY).toBeCloseTo(-0.01, 9);
  });

  it('go around the corner of a bay', () => {
    const front = makeWindowFront(
      [
        [0, 0],
        [2, 0],
        [2, 2],
      ],
      180,
      0.25,
    );
    // 4 m at an eighth of a metre.
    expect(front.points.count).toBe(32);
    expect(front.points.box.maxY).toBeCloseTo(2 - 0.0625 - 0.01, 9);
  });

  it('are one where the window is a point', () => {
    expect(makeWindowFront([[3, 4]], 90, 1).points).toMatchObject({ count: 1, spacingM: null });
  });
});
