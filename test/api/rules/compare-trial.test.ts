import { describe, expect, it } from 'vitest';
import { compareTrial, type JudgedByRule } from '../../../api/modules/rules/compare-trial.ts';
import type { FindingRow } from '../../../shared/contracts/studies.ts';
import { makeFindingRow } from '../../support/finding-row.ts';
import { smallCityRule } from '../../support/small-city.ts';

const makeRow = (receptor: string, change: Partial<FindingRow> = {}): FindingRow =>
  makeFindingRow({ receptor, label: receptor, ...change });

const judged = (version: number, rows: FindingRow[]): JudgedByRule => ({
  rule: { ...smallCityRule(), version },
  findings: { met: true, lossIndex: 0, clauses: [] },
  rows,
});

const notMet = { finding: 'not-met', margin: -1 } as const;

describe('two rules’ findings side by side', () => {
  it('are in the order in which they matter', () => {
    const inForce = judged(1, [
      makeRow('stays'),
      makeRow('other figures'),
      makeRow('disregarded now'),
      makeRow('better', notMet),
      makeRow('worse'),
      makeRow('dropped'),
    ]);
    const draft = judged(2, [
      makeRow('stays'),
      makeRow('other figures', { limit: 3, margin: 0 }),
      makeRow('disregarded now', { finding: 'disregarded' }),
      makeRow('better'),
      makeRow('worse', notMet),
      makeRow('new and worse', { ...notMet, margin: -2 }),
      makeRow('new, untouched', { finding: 'not-affected', margin: 0 }),
    ]);
    expect(compareTrial(inForce, draft).rows.map((row) => [row.receptor, row.change])).toEqual([
      ['new and worse', 'worse'],
      ['worse', 'worse'],
      ['better', 'better'],
      ['disregarded now', 'finding'],
      ['other figures', 'figures'],
      ['dropped', 'one-sided'],
      ['new, untouched', 'one-sided'],
      ['stays', 'same'],
    ]);
  });

  it('stay the same where only the words of the sentence differ', () => {
    const [row] = compareTrial(
      judged(1, [makeRow('a')]),
      judged(2, [makeRow('a', { sentence: 'Said otherwise.' })]),
    ).rows;
    expect(row?.change).toBe('same');
  });
});
