import { describe, expect, it } from 'vitest';
import { labelBlock } from '../../../shared/massing/block-label.ts';
import { repairFootprint } from '../../../shared/massing/repair-footprint.ts';
import { codesOf, issueOf, rectangle, type Point } from './drawn-massing.ts';

const label = labelBlock({ id: 'p1', name: null });
const outline = rectangle(0, 0, 20, 10);
const hole = rectangle(5, 2, 4, 4).reverse();

function repair(...rings: Point[][]) {
  return repairFootprint([rings], label);
}

describe('repairFootprint', () => {
  it('leaves a sound footprint as it is and says nothing', () => {
    expect(repair(outline, hole)).toEqual({ polygons: [[outline, hole]], issues: [] });
  });

  it('closes an open ring and says so', () => {
    const { polygons, issues } = repair(outline.slice(0, -1));
    expect(polygons).toEqual([[outline]]);
    expect(codesOf(issues)).toEqual(['MASSING_RING_OPEN']);
    expect(issues[0]).toMatchObject({ severity: 'repaired', feature: 'p1', lngLat: outline[0] });
    expect(issues[0]?.message).toBe(
      'Block p1: 1 ring was not closed; the first point was repeated at the end.',
    );
  });

  it('takes a last point within a tenth of a millimetre of the first as closing the ring', () => {
    const [lng, lat] = outline[0] ?? [0, 0];
    const nearly: Point = [lng + 5e-10, lat];
    expect(repair([...outline.slice(0, -1), nearly])).toEqual({
      polygons: [[outline]],
      issues: [],
    });
  });

  it('drops points that repeat the one before, counts and says them', () => {
    const stuttering = outline.flatMap((point, index) => (index < 2 ? [point, point] : [point]));
    const { polygons, issues } = repair(stuttering);
    expect(polygons).toEqual([[outline]]);
    expect(issueOf(issues, 'MASSING_POINTS_REPEATED').message).toContain('2 points that repeat');
  });

  it('turns a clockwise outline and a counter-clockwise hole and says so once', () => {
    const { polygons, issues } = repair(outline.toReversed(), hole.toReversed());
    expect(polygons).toEqual([[outline, hole]]);
    expect(codesOf(issues)).toEqual(['MASSING_RING_ORIENTATION']);
    expect(issues[0]?.message).toContain('2 rings were turned round');
  });

  it.each([
    ['no point', []],
    ['one point', outline.slice(0, 1)],
    ['two corners', [...outline.slice(0, 2), ...outline.slice(0, 1)]],
    ['one point again and again', [outline[0], outline[0], outline[0], outline[0]]],
  ])('refuses an outline of %s', (_, points) => {
    const { polygons, issues } = repair(points.filter((point) => point !== undefined));
    expect(polygons).toBeNull();
    expect(issueOf(issues, 'MASSING_TOO_FEW_POINTS').message).toContain(
      'an outline of fewer than 4',
    );
  });

  it('refuses a hole of two corners as a hole', () => {
    const { issues } = repair(outline, hole.slice(0, 2));
    expect(issueOf(issues, 'MASSING_TOO_FEW_POINTS').message).toContain('a hole of fewer than 4');
  });
});
