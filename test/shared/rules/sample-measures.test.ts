import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { DayLight } from '../../../shared/rules/day-light.ts';
import { evaluateLimit, type MeasuredValue } from '../../../shared/rules/limits.ts';
import { measureDay, measureTolerance } from '../../../shared/rules/measures.ts';
import type { RuleMeasure } from '../../../shared/rules/rule-schema.ts';
import { sampleArea } from '../../../shared/shadow/sample-grid.ts';
import { makeRectangle } from '../../support/plane-scenes.ts';

/** 10 m by 10 m at half a metre: 20 rows of 20 points, and six judged hours. */
const points = sampleArea({
  rings: [makeRectangle(0, 0, 10, 10)],
  outside: [],
  areaM2: 100,
  gridM: 1,
  mostPoints: 10_000,
  withBorder: false,
});

/** A day on which each row of points, from the south, has these hours of sun. */
function dayOf(hoursOfRow: (row: number) => number): DayLight {
  const hours = Float64Array.from({ length: points.count }, (_, point) =>
    hoursOfRow(Math.floor(point / 20)),
  );
  return {
    date: '2026-12-21',
    areaM2: 100,
    isWindow: false,
    pointShare: 0,
    spans: [
      {
        atMs: [0, 6 * 3_600_000],
        lights: [],
        openShares: [1, 1],
        beamWm2: [0, 0],
      },
    ],
    samples: {
      points,
      hoursBefore: new Float64Array(points.count).fill(6),
      hoursAfter: hours,
      openHours: 6,
      judgedHours: 6,
    },
  };
}

const share = (hours: number): RuleMeasure => ({ kind: 'sun-share', hours });
const worst: RuleMeasure = { kind: 'worst-shade-hours' };

describe('measures of sample points', () => {
  // Rows have 0, 0.25, 0.5 … 4.75 hours: at least two from the ninth on, 12 of 20.
  const ramp = dayOf((row) => row / 4);

  it('count the points with at least the hours asked for', () => {
    expect(measureDay(share(2), ramp, 'after')).toBeCloseTo(12 / 20, 9);
    expect(measureDay({ kind: 'sun-area', hours: 2 }, ramp, 'after')).toBeCloseTo(60, 9);
    expect(measureDay(share(2), ramp, 'before')).toBe(1);
    expect(measureDay(share(6), ramp, 'theoretical')).toBe(1);
  });

  it('take no hours to mean more than none', () => {
    expect(measureDay(share(0), ramp, 'after')).toBeCloseTo(19 / 20, 9);
  });

  it('take the most shaded point for the worst hours', () => {
    expect(measureDay(worst, ramp, 'after')).toBe(6);
    expect(
      measureDay(
        worst,
        dayOf((row) => 2 + row / 4),
        'after',
      ),
    ).toBe(4);
    expect(measureDay(worst, ramp, 'theoretical')).toBe(0);
  });

  it('tolerate what one step, or one spacing, can change', () => {
    // A step of ten minutes moves the border between rows 7 and 8 nowhere, one of 20 by a row; the
    // border of 20 points moves by 20 of 400 with the grid: a twentieth.
    expect(measureTolerance(share(2), ramp, 10)).toBeCloseTo(1 / 20, 9);
    // An hour is four rows up, or four down.
    expect(measureTolerance(share(2), ramp, 60)).toBeCloseTo(4 / 20, 9);
    // The most shaded row and its neighbour differ by a quarter of an hour.
    expect(measureTolerance(worst, ramp, 10)).toBeCloseTo(0.25, 9);
  });

  it('keep their order whatever the hours are', () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ min: 0, max: 6, noNaN: true }), { minLength: 20, maxLength: 20 }),
        fc.double({ min: 0.1, max: 6, noNaN: true }),
        (rows, hours) => {
          const day = dayOf((row) => rows[row] ?? 0);
          const asked = measureDay(share(hours), day, 'after');
          expect(measureDay(share(0), day, 'after')).toBeGreaterThanOrEqual(asked);
          expect(measureDay(share(hours + 0.5), day, 'after')).toBeLessThanOrEqual(asked);
          // No point has fewer hours than the most shaded one.
          const fewest = 6 - measureDay(worst, day, 'after');
          expect(fewest).toBeCloseTo(Math.min(...rows), 9);
          if (hours <= fewest) expect(asked).toBe(1);
          // The four grids of twice the spacing are each a quarter of the points.
          const quarters = [0, 1, 2, 3].map((grid) => measureDay(share(hours), day, 'after', grid));
          expect(quarters.reduce((sum, one) => sum + one, 0) / 4).toBeCloseTo(asked, 9);
        },
      ),
    );
  });
});

describe('a finding that hangs on the grid', () => {
  const value: MeasuredValue = {
    before: 1,
    after: 0.52,
    theoretical: 1,
    tolerance: 0.001,
    whole: 1,
    coarser: [],
    largestNetNewM2: 0,
  };
  const hold = (afterByGrid: number[]) =>
    evaluateLimit({ atLeast: 0.5 }, share(2), 1, () => ({
      ...value,
      coarser: afterByGrid.map((after) => ({ before: 1, after, theoretical: 1 })),
    }));

  it('is close when any grid of twice the spacing decides otherwise', () => {
    expect(hold([0.53, 0.51, 0.52, 0.52])).toMatchObject({ met: true, close: false });
    expect(hold([0.53, 0.51, 0.55, 0.49])).toMatchObject({ met: true, close: true });
  });

  it('states how far the grids differ', () => {
    expect(hold([0.53, 0.51, 0.55, 0.49]).tests[0]?.samplingError).toBeCloseTo(0.03, 9);
    expect(hold([]).tests[0]?.samplingError).toBeNull();
  });
});

describe('limits on hours of shade', () => {
  // Of six judged hours two are shade before and three after: four of sun become three.
  const value: MeasuredValue = {
    before: 2,
    after: 3,
    theoretical: 0,
    tolerance: 0.1,
    whole: 6,
    coarser: [],
    largestNetNewM2: 50,
  };
  const isMet = (limit: Parameters<typeof evaluateLimit>[0]) =>
    evaluateLimit(limit, worst, 1, () => value).met;

  it('are of the sun that is left at the most shaded point', () => {
    // Three quarters of four hours are three.
    expect(isMet({ keeps: 0.75 })).toBe(true);
    expect(isMet({ keeps: 0.8 })).toBe(false);
    expect(isMet({ losesAtMost: 1 })).toBe(true);
    expect(isMet({ losesAtMost: 0.9 })).toBe(false);
    expect(isMet({ losesAtMostShare: 0.25, of: 'before' })).toBe(true);
    // A sixth of the six hours without any building.
    expect(isMet({ losesAtMostShare: 0.16, of: 'theoretical' })).toBe(false);
    expect(isMet({ losesAtMostShare: 0.17, of: 'theoretical' })).toBe(true);
  });

  it('hold no-worse hours to the hours, not to the place', () => {
    expect(isMet({ noWorse: true })).toBe(false);
    expect(evaluateLimit({ noWorse: true }, worst, 1, () => ({ ...value, after: 2 })).met).toBe(
      true,
    );
  });
});
