import { describe, expect, it } from 'vitest';
import { massingComparisonSchema } from '../../../shared/contracts/massings.ts';
import { compareMassings } from '../../../shared/massing/compare-massings.ts';
import { block, rectangle, ring } from './drawn-massing.ts';

const podium = block('podium', [rectangle(10, 10, 40, 30)], { topM: 12 });
const tower = block('tower', [rectangle(15, 15, 20, 20)], { baseM: 12, topM: 45 });

function changes(...[before, after]: Parameters<typeof compareMassings>) {
  return compareMassings(before, after).map(({ id, change }) => `${id} ${change}`);
}

describe('compareMassings', () => {
  it('finds nothing changed between a massing and itself, in whatever order', () => {
    expect(changes([podium, tower], [tower, podium])).toEqual(['tower same', 'podium same']);
  });

  it('takes a ring from another corner, the other way round, for the same', () => {
    const redrawn = block('podium', [ring([50, 40], [50, 10], [10, 10], [10, 40])], { topM: 12 });
    expect(changes([podium], [redrawn])).toEqual(['podium same']);
  });

  it('tells what was added and removed, in the later order and then what went', () => {
    const wing = block('wing', [rectangle(60, 10, 10, 10)]);
    const compared = compareMassings([podium, tower], [wing, podium]);
    expect(compared.map(({ id, change }) => [id, change])).toEqual([
      ['wing', 'added'],
      ['podium', 'same'],
      ['tower', 'removed'],
    ]);
    expect(compared[0]?.before).toBeNull();
    expect(compared[2]?.after).toBeNull();
  });

  it('gives heights and footprint before and after of what changed', () => {
    const lower = { ...tower, topM: 30, geometry: block('', [rectangle(15, 15, 20, 10)]).geometry };
    const [change] = compareMassings([tower], [lower]);
    expect(change).toMatchObject({
      id: 'tower',
      change: 'changed',
      before: { baseM: 12, topM: 45 },
      after: { baseM: 12, topM: 30 },
    });
    expect(change?.before?.footprintM2).toBeCloseTo(400, 2);
    expect(change?.after?.footprintM2).toBeCloseTo(200, 2);
  });

  it('sees a block that was moved without being reshaped, or that changed its role', () => {
    const moved = block('podium', [rectangle(10.5, 10, 40, 30)], { topM: 12 });
    expect(changes([podium], [moved])).toEqual(['podium changed']);
    expect(changes([podium], [{ ...podium, role: 'existing' }])).toEqual(['podium changed']);
  });

  it('knows a renamed block by its footprint', () => {
    expect(
      changes(
        [podium, tower],
        [
          { ...tower, id: 'B' },
          { ...podium, id: 'A' },
        ],
      ),
    ).toEqual(['B same', 'A same']);
    expect(changes([tower], [{ ...tower, id: 'B', topM: 30 }])).toEqual(['B changed']);
  });

  it('prefers the tier at the same height among tiers of one footprint', () => {
    const tiers = [0, 10, 20].map((baseM, index) =>
      block(`t${index}`, [rectangle(10, 10, 20, 20)], { baseM, topM: baseM + 10 }),
    );
    const [, second] = tiers;
    if (second === undefined) throw new Error('unreachable');
    expect(changes(tiers, [{ ...second, id: 'middle' }])).toEqual([
      'middle same',
      't0 removed',
      't2 removed',
    ]);
  });

  it('does not take a small block within a large one for it', () => {
    const core = block('core', [rectangle(15, 15, 5, 5)], { topM: 12 });
    expect(changes([podium], [core])).toEqual(['core added', 'podium removed']);
  });

  it('matches numbered blocks by footprint, since their numbers shift', () => {
    const before = [
      { ...podium, id: 'block-1' },
      { ...tower, id: 'block-2' },
    ];
    const after = [{ ...tower, id: 'block-1' }];
    expect(changes(before, after)).toEqual(['block-1 same', 'block-1 (earlier revision) removed']);
  });

  it('answers as the contract has it', () => {
    const blocks = compareMassings([podium], [tower]);
    expect(massingComparisonSchema.shape.blocks.parse(blocks)).toEqual(blocks);
  });
});
