import { describe, expect, it } from 'vitest';
import { checkMassing } from '../../../../shared/massing/check-massing.ts';
import { block, codesOf, issueOf, rectangle, site, type Point } from '../drawn-massing.ts';

describe('checkWithinMunicipality', () => {
  it('refuses a block elsewhere and names the corner', () => {
    const elsewhere = rectangle(10, 10, 20, 20).map(([lng, lat]): Point => [lng + 5, lat]);
    const issues = checkMassing([block('p1', [elsewhere])], site);
    expect(codesOf(issues)).toEqual(['MASSING_OUTSIDE_MUNICIPALITY']);
    expect(issues[0]).toMatchObject({ severity: 'error', lngLat: elsewhere[0] });
    expect(issues[0]?.message).toContain('-86.29987, 46.75009');
  });

  it('refuses a block that reaches out of the municipality', () => {
    const [west] = site.extent;
    const across: Point[] = [
      [west - 0.001, 46.75],
      [west + 0.001, 46.75],
      [west + 0.001, 46.751],
    ];
    expect(codesOf(checkMassing([block('p1', [across])], site))).toContain(
      'MASSING_OUTSIDE_MUNICIPALITY',
    );
  });

  it('recognises latitude before longitude where both are in range', () => {
    // A municipality at 46.75 N, 31.30 E, whose coordinates may stand either way round.
    const east = { ...site, parcels: [], extent: [31.25, 46.7, 31.35, 46.8] as typeof site.extent };
    const turned: Point[] = [
      [46.75, 31.3],
      [46.7501, 31.3],
      [46.7501, 31.3001],
      [46.75, 31.3],
    ];
    const issues = checkMassing([block('p1', [turned])], { ...east, longitude: 31.3 });
    expect(issueOf(issues, 'MASSING_COORDINATES_SWAPPED')).toMatchObject({
      severity: 'error',
      lngLat: [31.3, 46.75],
    });
    expect(codesOf(issues)).not.toContain('MASSING_OUTSIDE_MUNICIPALITY');
  });
});
