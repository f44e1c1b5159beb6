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
      '2 blocks have no id and were numbered by order: block-1, block-3.',
    );
  });

  it('cuts an id of more than 100 characters, keeping ids apart', () => {
    const { ids, issues } = readIds('x'.repeat(101), 'x'.repeat(102));
    expect(ids[0]).toBe('x'.repeat(100));
    expect(ids[1]).toBe(`${'x'.repeat(98)}-2`);
    expect(codesOf(issues)).toEqual([
      'MASSING_ID_TOO_LONG',
      'MASSING_ID_TOO_LONG',
      'MASSING_ID_REPEATED',
    ]);
  });

  it('cuts a name of more than 200 characters and says so', () => {
    const { blocks, issues } = readFeatures(
      feature({ id: 'a', name: 'n'.repeat(201), base: 0, top: 9 }),
    );
    expect(blocks[0]?.name).toHaveLength(200);
    expect(codesOf(issues)).toEqual(['MASSING_NAME_TOO_LONG']);
  });

  it('leaves out characters that no page or database takes, and says so', () => {
    const { blocks, issues } = readFeatures(
      feature({ id: 'a\u0000b', name: 'North\ud800 tower', base: 0, top: 9 }),
      feature({ id: '\u0007', base: 0, top: 9 }),
    );
    expect(blocks.map(({ id, name }) => [id, name])).toEqual([
      ['ab', 'North tower'],
      ['block-2', null],
    ]);
    expect(codesOf(issues).filter((code) => code === 'MASSING_TEXT_CLEANED')).toHaveLength(3);
    expect(JSON.stringify(issues)).not.toMatch(/\\u0000|\\ud800/);
  });

  it('cuts no character in half', () => {
    const { blocks } = readFeatures(
      feature({ id: 'a', name: `${'n'.repeat(199)}🏠`, base: 0, top: 9 }),
    );
    expect(blocks[0]?.name).toBe('n'.repeat(199));
  });
});
