import { describe, expect, it } from 'vitest';
import { checkMassing } from '../../../../shared/massing/check-massing.ts';
import { block, codesOf, issueOf, rectangle, site } from '../drawn-massing.ts';

const podium = block('podium', [rectangle(10, 10, 40, 30)], { topM: 12 });

function tower(baseM: number, x = 15) {
  return block('tower', [rectangle(x, 15, 10, 10)], { baseM, topM: baseM + 30 });
}

describe('checkFloatingBlocks', () => {
  it('takes a tier on the one below, overhanging or standing within it', () => {
    for (const tier of [tower(12), tower(12, 45), tower(12.04)]) {
      expect(checkMassing([podium, tier], site)).toEqual([]);
    }
    expect(codesOf(checkMassing([podium, tower(8)], site))).toEqual(['MASSING_BLOCKS_OVERLAP']);
  });

  it('warns of a gap to the block below and names it', () => {
    const issue = issueOf(checkMassing([podium, tower(14.5)], site), 'MASSING_BLOCK_FLOATS');
    expect(issue).toMatchObject({ severity: 'warning', feature: 'tower' });
    expect(issue.message).toBe(
      'Block tower begins 2.50 m above block podium, with nothing between.',
    );
  });

  it('warns of a block over the bare ground, though another stands beside it', () => {
    const issue = issueOf(checkMassing([podium, tower(12, 60)], site), 'MASSING_BLOCK_FLOATS');
    expect(issue.message).toContain('12.00 m above the ground');
  });

  it('does not take what is removed for a support', () => {
    const existing = { ...podium, role: 'existing' as const };
    expect(codesOf(checkMassing([existing, tower(12)], site))).toEqual(['MASSING_BLOCK_FLOATS']);
  });

  it('suspects heights above sea level where the gap is large', () => {
    const issue = issueOf(checkMassing([tower(186)], site), 'MASSING_BLOCK_FLOATS');
    expect(issue.suggestion).toContain('not above sea level');
  });

  it('leaves existing blocks alone', () => {
    const bridge = block('e1', [rectangle(60, 10, 5, 5)], { role: 'existing', baseM: 4 });
    expect(checkMassing([podium, bridge], site)).toEqual([]);
  });
});
