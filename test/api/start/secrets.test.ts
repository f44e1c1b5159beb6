import { readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';
import { readOrMakeSecrets, readSecrets } from '../../../api/start/secrets.mjs';
import { makeTemporaryFolder } from './temporary-folder.ts';

const noCluster = () => false;

describe('the secrets of a data folder', () => {
  it('are made once, differ from each other, and stay', () => {
    const folder = makeTemporaryFolder();
    expect(readSecrets(folder)).toBeNull();
    const secrets = readOrMakeSecrets(folder, noCluster);
    expect(new Set(Object.values(secrets)).size).toBe(4);
    for (const secret of Object.values(secrets)) expect(secret).toMatch(/^[\w-]{43}$/);
    expect(readOrMakeSecrets(folder, noCluster)).toEqual(secrets);
  });

  it('can be read by their owner alone', () => {
    const folder = makeTemporaryFolder();
    readOrMakeSecrets(folder, noCluster);
    expect(statSync(path.join(folder, 'secrets.json')).mode & 0o777).toBe(0o600);
  });

  it('are not made anew beside a database that they would lock out', () => {
    const folder = makeTemporaryFolder();
    readOrMakeSecrets(folder, noCluster);
    rmSync(path.join(folder, 'secrets.json'));
    expect(() => readOrMakeSecrets(folder, () => true)).toThrow('its database is still there');
  });

  it('are left as they are when damaged', () => {
    const folder = makeTemporaryFolder();
    const file = path.join(folder, 'secrets.json');
    writeFileSync(file, '{"ownerPassword": "o');
    expect(() => readOrMakeSecrets(folder, noCluster)).toThrow('is damaged');
    expect(readFileSync(file, 'utf8')).toBe('{"ownerPassword": "o');
  });
});
