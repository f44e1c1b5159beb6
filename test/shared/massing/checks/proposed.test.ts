import { describe, expect, it } from 'vitest';
import { checkMassing } from '../../../../shared/massing/check-massing.ts';
import { block, codesOf, issueOf, rectangle, site } from '../drawn-massing.ts';

describe('checkProposed', () => {
  it('refuses a massing without any block', () => {
    expect(codesOf(checkMassing([], site))).toEqual(['MASSING_NOTHING_PROPOSED']);
  });

  it('refuses a massing that only takes away', () => {
    const issues = checkMassing([block('e', [rectangle(0, 0, 9, 9)], { role: 'existing' })], site);
    expect(issueOf(issues, 'MASSING_NOTHING_PROPOSED')).toMatchObject({
      severity: 'error',
      feature: null,
      lngLat: null,
    });
  });
});
