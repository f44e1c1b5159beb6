import { describe, expect, it } from 'vitest';
import { checkMassing } from '../../../../shared/massing/check-massing.ts';
import { block, codesOf, issueOf, metresAt, rectangle, ring, site } from '../drawn-massing.ts';
import type { Point } from '../drawn-massing.ts';

function check(...rings: Point[][]) {
  return checkMassing([block('p1', rings)], site);
}

describe('checkOutlines, rings', () => {
  it('finds where a bow-tie crosses itself', () => {
    const issue = issueOf(
      check(ring([10, 10], [30, 30], [30, 10], [10, 30])),
      'MASSING_RING_CROSSES_ITSELF',
    );
    expect(issue).toMatchObject({ severity: 'error', feature: 'p1' });
    const [x, y] = metresAt(issue.lngLat);
    // The middle of the square, to the centimetre in which places are given.
    expect(Math.hypot(x - 20, y - 20)).toBeLessThan(0.02);
  });

  it('finds a small crossing in a large outline', () => {
    const outline = ring(
      [10, 10],
      [60, 10],
      [60, 40],
      [30, 40],
      [30.4, 40.4],
      [30.4, 39.9],
      [10, 40],
    );
    const [x, y] = metresAt(issueOf(check(outline), 'MASSING_RING_CROSSES_ITSELF').lngLat);
    expect(Math.hypot(x - 30.4, y - 40)).toBeLessThan(1);
  });

  it('finds a bow-tie whose crossing is a corner', () => {
    const issue = issueOf(
      check(ring([10, 10], [20, 20], [30, 30], [30, 10], [20, 20], [10, 30])),
      'MASSING_RING_CROSSES_ITSELF',
    );
    const [x, y] = metresAt(issue.lngLat);
    expect(Math.hypot(x - 20, y - 20)).toBeLessThan(0.02);
  });

  it('finds an outline that runs round twice', () => {
    const square: Point[] = [
      [10, 10],
      [30, 10],
      [30, 30],
      [10, 30],
    ];
    expect(codesOf(check(ring(...square, ...square)))).toContain('MASSING_RING_CROSSES_ITSELF');
  });

  it('finds a hole that crosses itself', () => {
    const hole = ring([12, 12], [18, 18], [18, 12], [12, 18]);
    const issues = check(rectangle(10, 10, 20, 20), hole);
    expect(issueOf(issues, 'MASSING_RING_CROSSES_ITSELF').message).toContain('a hole');
  });

  it('takes an outline that touches itself, runs back on itself or is cut to a courtyard', () => {
    const touching = ring([10, 10], [30, 10], [30, 30], [20, 10], [10, 30]);
    const spiked = ring([10, 10], [30, 10], [40, 10], [30, 10], [30, 30], [10, 30]);
    const keyhole = ring(
      ...([
        [10, 10],
        [40, 10],
        [40, 40],
        [10, 40],
        [10, 10],
      ] as Point[]),
      ...([
        [15, 15],
        [15, 35],
        [35, 35],
        [35, 15],
        [15, 15],
      ] as Point[]),
    );
    for (const outline of [touching, spiked, keyhole]) expect(check(outline)).toEqual([]);
  });

  it('refuses a ring of two corners', () => {
    expect(codesOf(check(ring([10, 10], [20, 20])))).toContain('MASSING_TOO_FEW_POINTS');
  });

  it('gives up on a tangle quickly and still says that it crosses itself', () => {
    const star = Array.from({ length: 10_001 }, (_, index): Point => {
      const turn = (index * 5000 * 2 * Math.PI) / 10_001;
      return [50 + 30 * Math.cos(turn), 40 + 30 * Math.sin(turn)];
    });
    expect(codesOf(check(ring(...star)))).toContain('MASSING_RING_CROSSES_ITSELF');
  });
});

describe('checkOutlines, holes and parts', () => {
  const outline = rectangle(10, 10, 30, 30);

  it('takes holes within, touching the outline or each other', () => {
    expect(check(outline, rectangle(15, 15, 5, 5), rectangle(20, 15, 5, 5))).toEqual([]);
    expect(check(outline, ring([10, 20], [20, 15], [20, 25]))).toEqual([]);
  });

  it('finds a hole outside of its outline', () => {
    const issue = issueOf(check(outline, rectangle(60, 10, 5, 5)), 'MASSING_HOLE_OUTSIDE');
    const [x, y] = metresAt(issue.lngLat);
    expect(x).toBeCloseTo(62.5, 1);
    expect(y).toBeCloseTo(12.5, 1);
  });

  it('finds a hole that crosses its outline, among sound ones', () => {
    const issues = check(outline, rectangle(12, 12, 5, 5), rectangle(35, 20, 10, 5));
    const issue = issueOf(issues, 'MASSING_HOLE_CROSSES_OUTLINE');
    const [x, y] = metresAt(issue.lngLat);
    expect(x).toBeCloseTo(42.5, 1);
    expect(y).toBeCloseTo(22.5, 1);
    expect(codesOf(issues)).toEqual(['MASSING_HOLE_CROSSES_OUTLINE']);
  });

  it('finds holes that lie over one another', () => {
    const issues = check(outline, rectangle(15, 15, 10, 10), rectangle(20, 20, 10, 10));
    expect(issueOf(issues, 'MASSING_HOLES_OVERLAP').severity).toBe('error');
  });

  it('warns of parts that lie over one another', () => {
    const parts = (x: number) =>
      checkMassing(
        [
          block('p1', [], {
            geometry: {
              type: 'MultiPolygon',
              coordinates: [[outline], [rectangle(x, 10, 10, 10)]],
            },
          }),
        ],
        site,
      );
    expect(issueOf(parts(35), 'MASSING_PARTS_OVERLAP').severity).toBe('warning');
    expect(parts(40)).toEqual([]);
    expect(parts(50)).toEqual([]);
  });
});
