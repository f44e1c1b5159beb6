import { describe, expect, it } from 'vitest';
import { checkMassing } from '../../../../shared/massing/check-massing.ts';
import { block, codesOf, issueOf, metresAt, rectangle, site } from '../drawn-massing.ts';

const podium = block('podium', [rectangle(10, 10, 40, 30)]);

describe('checkOverlappingBlocks', () => {
  it('warns of blocks in the same space, with area, height and place', () => {
    const wing = block('wing', [rectangle(40, 20, 30, 10)], { baseM: 4, topM: 20 });
    const issues = checkMassing([podium, wing], site);
    const issue = issueOf(issues, 'MASSING_BLOCKS_OVERLAP');
    expect(issue).toMatchObject({ severity: 'warning', feature: 'wing' });
    expect(issue.message).toContain('100.0 m² over 6.00 m');
    const [x, y] = metresAt(issue.lngLat);
    expect(x).toBeCloseTo(45, 1);
    expect(y).toBeCloseTo(25, 1);
  });

  it('takes stacked, adjoining and replaced blocks', () => {
    const issues = checkMassing(
      [
        podium,
        block('tower', [rectangle(15, 15, 10, 10)], { baseM: 10, topM: 40 }),
        block('wing', [rectangle(50, 10, 10, 30)]),
        block('old', [rectangle(20, 20, 30, 15)], { role: 'existing' }),
      ],
      site,
    );
    expect(issues).toEqual([]);
  });

  it('says so when there are too many blocks over one another to compare', () => {
    const heap = Array.from({ length: 1000 }, (_, index) =>
      block(`p${index}`, [rectangle(10 + index / 1000, 10, 20, 20)], {
        baseM: index / 10,
        topM: index / 10 + 0.1,
      }),
    );
    expect(codesOf(checkMassing(heap, site))).toEqual(['MASSING_NOT_ALL_COMPARED']);
  });
});
