import { existsSync, readdirSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';
import { describeWriteError, openDataFolder } from '../../../api/start/data-folder.mjs';
import { makeTemporaryFolder } from './temporary-folder.ts';

describe('openDataFolder', () => {
  it('makes the folder with its parents and leaves nothing but the folder of logs in it', () => {
    const folder = path.join(makeTemporaryFolder(), 'some/where');
    openDataFolder(folder);
    expect(readdirSync(folder)).toEqual(['log']);
  });

  it('says when a file stands in its place', () => {
    const file = path.join(makeTemporaryFolder(), 'data');
    writeFileSync(file, '');
    expect(() => openDataFolder(file)).toThrow('a file stands in its place');
    expect(() => openDataFolder(path.join(file, 'deeper'))).toThrow('a file stands in its place');
  });

  it('ends with a sentence where no folder can be made at all', () => {
    expect(() => openDataFolder('/proc/noonmark')).toThrow("can't be used");
  });

  it('says how much room is missing on the disk', () => {
    const folder = path.join(makeTemporaryFolder(), 'data');
    expect(() => openDataFolder(folder, 2 ** 60)).toThrow(/has \d+ MB left; Noonmark needs \d+ MB/);
    expect(existsSync(folder)).toBe(true);
  });

  it.each([
    ['EACCES', 'may not write there'],
    ['EROFS', 'read-only file system'],
    ['ENOSPC', 'the disk is full'],
  ])('puts the system error %s into words', (code, words) => {
    const error = describeWriteError('/data', Object.assign(new Error(), { code }));
    expect(String(error)).toContain(words);
  });
});
