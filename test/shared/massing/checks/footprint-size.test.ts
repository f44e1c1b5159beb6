import { describe, expect, it } from 'vitest';
import { checkMassing } from '../../../../shared/massing/check-massing.ts';
import { block, codesOf, rectangle, ring, site } from '../drawn-massing.ts';

describe('checkFootprintSize', () => {
  it('refuses less than half a square metre, and names the area', () => {
    const [issue] = checkMassing([block('p1', [rectangle(10, 10, 0.6, 0.7)])], site);
    expect(issue).toMatchObject({ code: 'MASSING_FOOTPRINT_TOO_SMALL', severity: 'error' });
    expect(issue?.message).toContain('0.42 m²');
  });

  it('refuses a footprint that is a line', () => {
    const issues = checkMassing([block('p1', [ring([10, 10], [20, 10], [30, 10])])], site);
    expect(codesOf(issues)).toContain('MASSING_FOOTPRINT_TOO_SMALL');
  });

  it('takes a chimney', () => {
    expect(checkMassing([block('p1', [rectangle(10, 10, 0.8, 0.8)])], site)).toEqual([]);
  });
});
