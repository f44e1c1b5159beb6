import { describe, expect, it } from 'vitest';
import { checkMassing } from '../../../../shared/massing/check-massing.ts';
import type { MassingRole } from '../../../../shared/massing/massing-block.ts';
import { block, codesOf, issueOf, metresAt, rectangle, ring, site } from '../drawn-massing.ts';
import type { Point } from '../drawn-massing.ts';

const known = block('known', [rectangle(2, 2, 5, 5)]);

function check(outline: Point[], role: MassingRole = 'proposed', parcels = site.parcels) {
  return checkMassing([known, block('p1', [outline], { role })], { ...site, parcels });
}

describe('checkWithinSite', () => {
  it('takes a block on the parcel line, and up to half a metre beyond', () => {
    expect(check(rectangle(80, 10, 20, 60))).toEqual([]);
    expect(check(rectangle(80, 10, 20.49, 60))).toEqual([]);
  });

  it('warns of a block that reaches farther, with distance, area, share and place', () => {
    const issue = issueOf(check(rectangle(80, 10, 25, 40)), 'MASSING_PARTLY_OUTSIDE_SITE');
    expect(issue).toMatchObject({ severity: 'warning', feature: 'p1' });
    expect(issue.message).toBe(
      "Block p1 reaches 5.0 m beyond the site's parcels, with 200.0 m² (20 %) of its footprint.",
    );
    expect(metresAt(issue.lngLat)[0]).toBeCloseTo(105, 1);
  });

  it('sees what bridges a gap between parcels although no corner lies in it', () => {
    const parcels = [rectangle(0, 0, 40, 80), rectangle(60, 0, 40, 80)].map((outline) => ({
      type: 'Polygon' as const,
      coordinates: [outline],
    }));
    const issue = issueOf(
      check(rectangle(30, 10, 40, 10), 'proposed', parcels),
      'MASSING_PARTLY_OUTSIDE_SITE',
    );
    expect(issue.message).toContain('reaches 10.0 m beyond');
    expect(issue.message).toContain('200.0 m² (50 %)');
  });

  it('takes a block across neighbouring parcels, whichever way their rings run', () => {
    const parcels = [rectangle(0, 0, 50, 80), rectangle(50, 0, 50, 80).reverse()].map(
      (outline) => ({ type: 'Polygon' as const, coordinates: [outline] }),
    );
    expect(check(rectangle(30, 10, 40, 10), 'proposed', parcels)).toEqual([]);
  });

  it('refuses a block wholly outside', () => {
    const issue = issueOf(check(ring([120, 10], [140, 10], [130, 40])), 'MASSING_OUTSIDE_SITE');
    expect(issue.severity).toBe('error');
  });

  it('warns of an existing block that is mostly outside, and takes one that is mostly inside', () => {
    const issue = issueOf(
      check(rectangle(98, 10, 10, 10), 'existing'),
      'MASSING_EXISTING_OUTSIDE_SITE',
    );
    expect(issue.severity).toBe('warning');
    expect(issue.message).toContain('80.0 m² (80 %)');
    expect(codesOf(check(rectangle(94, 10, 10, 10), 'existing'))).toEqual([]);
  });

  it('asks nothing where no parcel is named', () => {
    expect(check(rectangle(300, 10, 10, 10), 'proposed', [])).toEqual([]);
  });
});
