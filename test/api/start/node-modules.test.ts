import { describe, expect, it } from 'vitest';
import { isInstalled } from '../../../api/start/node-modules.mjs';

const lockOf = (packages: Record<string, object>) => JSON.stringify({ packages });

describe('isInstalled', () => {
  const zod = { 'node_modules/zod': { version: '4.6.7' } };
  const foreign = { 'node_modules/fsevents': { version: '2.3.3', optional: true } };

  it('holds when every package stands there in its version', () => {
    expect(isInstalled(lockOf({ '': {}, ...zod }), lockOf(zod))).toBe(true);
  });

  it('holds without an optional package, which is for another system', () => {
    expect(isInstalled(lockOf({ ...zod, ...foreign }), lockOf(zod))).toBe(true);
  });

  it('fails for another version, a missing package and one too many', () => {
    const older = { 'node_modules/zod': { version: '4.6.6' } };
    expect(isInstalled(lockOf(zod), lockOf(older))).toBe(false);
    expect(isInstalled(lockOf(zod), lockOf({}))).toBe(false);
    expect(isInstalled(lockOf(zod), lockOf({ ...zod, ...foreign }))).toBe(false);
  });

  it('fails for a record that is no JSON', () => {
    expect(isInstalled(lockOf(zod), '{"packages": {')).toBe(false);
    expect(isInstalled('', '')).toBe(false);
  });
});
