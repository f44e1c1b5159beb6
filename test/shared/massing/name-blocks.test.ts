import { describe, expect, it } from 'vitest';
import { codesOf, feature, issueOf, readFeatures } from './drawn-massing.ts';

function readIds(...ids: (string | undefined)[]) {
  const { blocks, issues } = readFeatures(...ids.map((id) => feature({ id, base: 0, top: 9 })));
  return { ids: blocks.map(({ id }) => id), issues };
}

describe('nameBlocks', () => {
  it('keeps ids that stand once', () => {
    expect(readIds('b', 'a')).toEqual({ ids: ['b', 'a'], issues: [] });
  });

  it('renames an id that stood before and says so', () => {
    const { ids, issues } = readIds('a', 'a', 'a');
    expect(ids).toEqual(['a', 'a-2', 'a-3']);
    expect(codesOf(issues)).toEqual(['MASSING_ID_REPEATED', 'MASSING_ID_REPEATED']);
    expect(issues[0]).toMatchObject({ severity: 'repaired', feature: 'a-2' });
  });

  it('does not take an id that is sent further on', () => {
    expect(readIds('a', 'a', 'a-2').ids).toEqual(['a', 'a-3', 'a-2']);
    expect(readIds(undefined, 'block-1').ids).toEqual(['block-1-2', 'block-1']);
  });

  it('numbers blocks without an id by their place and says so once', () => {
    const { ids, issues } = readIds(undefined, 'a', ' ');
    expect(ids).toEqual(['block-1', 'a', 'block-3']);
    expect(issueOf(issues, 'MASSING_ID_MISSING').message).toBe(
      '2 blocks have no id and got one by the place in the file: block-1, block-3.',
    );
  });

  it('cuts an id of more than 100 characters, keeping ids apart', () => {
    const { ids, issues } = readIds('x'.repeat(101), 'x'.repeat(102));
    expect(ids[0]).toBe('x'.repeat(100));
    expect(ids[1]).toBe(`${'x'.repeat(98)}-2`);
    expect(codesOf(issues)).toEqual(['MASSING_ID_TOO_LONG', 'MASSING_ID_TOO_LONG']);
  });

  it('cuts a name of more than 200 characters and says so', () => {
    const { blocks, issues } = readFeatures(
      feature({ id: 'a', name: 'n'.repeat(201), base: 0, top: 9 }),
    );
    expect(blocks[0]?.name).toHaveLength(200);
    expect(codesOf(issues)).toEqual(['MASSING_NAME_TOO_LONG']);
  });
});
