import { describe, expect, it } from 'vitest';
import { checkMassing } from '../../../../shared/massing/check-massing.ts';
import { block, codesOf, rectangle, ring, site } from '../drawn-massing.ts';

const first = block('p1', [rectangle(10, 10, 20, 15)]);

describe('checkRepeatedBlocks', () => {
  it('warns of the same block under another id, drawn from another corner the other way', () => {
    const again = block('p2', [ring([30, 25], [30, 10], [10, 10], [10, 25])]);
    const issues = checkMassing([first, again], site);
    expect(codesOf(issues)).toEqual(['MASSING_BLOCK_REPEATED']);
    expect(issues[0]).toMatchObject({ severity: 'warning', feature: 'p2' });
    expect(issues[0]?.message).toContain('the same as block p1');
  });

  it('takes the same footprint at other heights or in the other role', () => {
    const tier = block('p2', [rectangle(10, 10, 20, 15)], { baseM: 10, topM: 20 });
    const existing = block('e1', [rectangle(10, 10, 20, 15)], { role: 'existing' });
    expect(checkMassing([first, tier, existing], site)).toEqual([]);
  });
});
