import { describe, expect, it } from 'vitest';
import { labelBlock } from '../../../shared/massing/block-label.ts';
import { readBlockProperties } from '../../../shared/massing/block-properties.ts';
import { codesOf, issueOf } from './drawn-massing.ts';

const label = labelBlock({ id: 'p1', name: null });

function read(record: Record<string, unknown>) {
  return readBlockProperties(record, label, [-91.3, 46.75]);
}

describe('the role of a block', () => {
  it.each([
    [undefined, 'proposed'],
    [null, 'proposed'],
    ['', 'proposed'],
    ['proposed', 'proposed'],
    ['Proposal', 'proposed'],
    [' new ', 'proposed'],
    ['existing', 'existing'],
    ['Demolish', 'existing'],
    ['removed', 'existing'],
  ])('written %j is %s', (role, expected) => {
    expect(read({ role, base: 0, top: 9 }).properties?.role).toBe(expected);
  });

  it.each(['context', 'constructor', 5, { toString: 1 }])('written %j is refused', (role) => {
    const { properties, issues } = read({ role, base: 0, top: 9 });
    expect(properties).toBeNull();
    expect(issueOf(issues, 'MASSING_ROLE_UNKNOWN').suggestion).toContain('"existing"');
  });
});

describe('the heights of a block', () => {
  it.each([
    [{ base: 3, top: 9 }],
    [{ baseM: 3, topM: 9 }],
    [{ base_m: 3, top_m: 9 }],
    [{ BASE: 3, TOP: 9 }],
    [{ 'Base M': 3, 'Top-M': 9 }],
    [{ min_height: 3, height: 9 }],
    [{ min_height: 3, height_m: 9 }],
    [{ base: 3, top: 9, height: 9 }],
  ])('are found under %j', (record) => {
    expect(read(record).properties).toMatchObject({ baseM: 3, topM: 9 });
  });

  it('begin at the ground where no base is given, and that is said', () => {
    const { properties, issues } = read({ top: 9, base: null });
    expect(properties).toMatchObject({ baseM: 0, topM: 9 });
    expect(codesOf(issues)).toEqual(['MASSING_BASE_MISSING']);
    expect(issues[0]?.severity).toBe('repaired');
  });

  it('given as text are read as numbers, and that is said', () => {
    const { properties, issues } = read({ base: '0', top: ' 12.5 ' });
    expect(properties).toMatchObject({ baseM: 0, topM: 12.5 });
    expect(codesOf(issues)).toEqual(['MASSING_NUMBER_AS_TEXT', 'MASSING_NUMBER_AS_TEXT']);
    expect(issues[1]?.message).toContain('" 12.5 " in top was read as the number 12.5');
  });

  it.each(['12,5', '12.5 m', '40 ft', '1e3', '0x10', 'high', true, [9], {}, Infinity])(
    'written %j are refused',
    (top) => {
      const { properties, issues } = read({ base: 0, top });
      expect(properties).toBeNull();
      expect(issueOf(issues, 'MASSING_NUMBER_INVALID')).toMatchObject({
        severity: 'error',
        feature: 'p1',
        lngLat: [-91.3, 46.75],
      });
    },
  );

  it('given twice and differently are refused', () => {
    const { properties, issues } = read({ base: 0, top: 30, height: 20 });
    expect(properties).toBeNull();
    expect(issueOf(issues, 'MASSING_PROPERTIES_DISAGREE').message).toContain('top 30, height 20');
  });

  it('called height above a base are read as the top, with a warning', () => {
    const { properties, issues } = read({ base: 12, height: 45 });
    expect(properties).toMatchObject({ baseM: 12, topM: 45 });
    expect(issueOf(issues, 'MASSING_HEIGHT_READ_AS_TOP').severity).toBe('warning');
    expect(codesOf(read({ base: 0, height: 45 }).issues)).toEqual([]);
  });

  it('take −0 for 0', () => {
    expect(read({ base: -0, top: 9 }).properties?.baseM).toBe(0);
  });

  it('are not guessed from storeys', () => {
    const { properties, issues } = read({ base: 0, levels: 14 });
    expect(properties).toBeNull();
    const issue = issueOf(issues, 'MASSING_TOP_MISSING');
    expect(issue.message).toContain('has levels but no top height');
    expect(issue.suggestion).toContain('Add top');
  });

  it('are not read from feet', () => {
    const { issues } = read({ height_ft: 120 });
    const issue = issueOf(issues, 'MASSING_TOP_MISSING');
    expect(issue.message).toContain('"height_ft" is not read');
    expect(issue.suggestion).toContain('0.3048');
  });

  it('may lie below the datum', () => {
    expect(read({ base: -6, top: '-1.5' }).properties).toMatchObject({ baseM: -6, topM: -1.5 });
  });
});

describe('the storeys of a block', () => {
  it.each(['storeys', 'stories', 'levels', 'floors', 'Storeys'])('are found under %s', (name) => {
    expect(read({ base: 0, top: 9, [name]: 3 }).properties?.storeys).toBe(3);
  });

  it('given as text are read, and that is said', () => {
    const { properties, issues } = read({ base: 0, top: 9, storeys: '3' });
    expect(properties?.storeys).toBe(3);
    expect(codesOf(issues)).toEqual(['MASSING_NUMBER_AS_TEXT']);
  });

  it.each([2.5, 0, -1, 301, 'three'])('written %j are left out with a warning', (storeys) => {
    const { properties, issues } = read({ base: 0, top: 9, storeys });
    expect(properties?.storeys).toBeNull();
    expect(issueOf(issues, 'MASSING_STOREYS_NOT_READ').severity).toBe('warning');
  });

  it('may be missing without a word', () => {
    expect(read({ base: 0, top: 9 })).toEqual({
      properties: { role: 'proposed', baseM: 0, topM: 9, storeys: null },
      issues: [],
    });
  });
});
