import { describe, expect, it } from 'vitest';
import { checkMassing } from '../../../../shared/massing/check-massing.ts';
import { block, codesOf, lngLatAt, rectangle, site } from '../drawn-massing.ts';

function check(baseM: number, topM: number) {
  return checkMassing([block('p1', [rectangle(10, 10, 20, 15)], { baseM, topM })], site);
}

describe('checkHeights', () => {
  it.each([
    [NaN, 10],
    [0, NaN],
    [0, Infinity],
    [-Infinity, 5],
  ])('refuses a block from %d to %d', (baseM, topM) => {
    expect(codesOf(check(baseM, topM))).toEqual(['MASSING_HEIGHT_NOT_A_NUMBER']);
  });

  it.each([
    [0, 0],
    [30, 12],
    [-2, -3],
  ])('refuses a block from %d to %d m, and names both', (baseM, topM) => {
    const [issue] = check(baseM, topM);
    expect(issue).toMatchObject({
      code: 'MASSING_TOP_NOT_ABOVE_BASE',
      severity: 'error',
      feature: 'p1',
      lngLat: lngLatAt(10, 10),
      message: `Block p1 has its top at ${topM} m, not above its base at ${baseM} m.`,
    });
  });

  it('refuses heights beyond 1000 m, and takes 1000 m', () => {
    expect(check(0, 45_000)[0]).toMatchObject({ code: 'MASSING_HEIGHT_OVER_LIMIT' });
    expect(check(-45_000, 5)[0]?.message).toContain('its base at -45000 m');
    expect(check(0, 1000)).toEqual([]);
  });

  it('warns of a block that stays below the ground', () => {
    expect(check(-6, 0)[0]).toMatchObject({
      code: 'MASSING_BLOCK_BELOW_GROUND',
      severity: 'warning',
    });
    expect(check(-6, 3)).toEqual([]);
  });
});
