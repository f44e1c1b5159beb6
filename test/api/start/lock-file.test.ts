import { spawnSync } from 'node:child_process';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { Lifetime } from '../../../api/start/lifetime.mjs';
import {
  lockDataFolder,
  lockFileOf,
  readLock,
  startTicksOf,
} from '../../../api/start/lock-file.mjs';
import { makeTemporaryFolder } from './temporary-folder.ts';

const description = {
  program: 'npm start',
  localUrl: 'http://127.0.0.1:8080',
  publicUrl: 'https://sun.example.gov',
};

function endedProcessId(): number {
  return spawnSync('true').pid;
}

describe('the lock of a data folder', () => {
  it('is refused to a second start, which is told the process and the address', () => {
    const folder = makeTemporaryFolder();
    lockDataFolder(new Lifetime(), folder, description);
    expect(() => lockDataFolder(new Lifetime(), folder, description)).toThrow(
      `npm start is already running with the data folder ${folder} ` +
        `(process ${process.pid}, http://127.0.0.1:8080)`,
    );
    expect(readLock(folder)).toMatchObject({ state: 'taken', owner: description });
  });

  it('is given back when the program stops', async () => {
    const folder = makeTemporaryFolder();
    const lifetime = new Lifetime();
    lockDataFolder(lifetime, folder, description);
    await lifetime.stop();
    expect(existsSync(lockFileOf(folder))).toBe(false);
    expect(readLock(folder)).toEqual({ state: 'free' });
  });

  it('of a dead process is taken over', () => {
    const folder = makeTemporaryFolder();
    lockDataFolder(new Lifetime(), folder, description);
    const left = readFileSync(lockFileOf(folder), 'utf8').replace(
      `"pid":${process.pid}`,
      `"pid":${endedProcessId()}`,
    );
    writeFileSync(lockFileOf(folder), left);
    expect(readLock(folder)).toEqual({ state: 'stale' });
    lockDataFolder(new Lifetime(), folder, description);
    expect(readLock(folder)).toMatchObject({ state: 'taken', owner: { pid: process.pid } });
  });

  it('of a process whose number another process has now is taken over', () => {
    const folder = makeTemporaryFolder();
    const owner = { ...description, pid: process.pid, startedAtTicks: '1' };
    writeFileSync(lockFileOf(folder), JSON.stringify(owner));
    expect(readLock(folder)).toEqual({ state: 'stale' });
  });

  it.each(['', '{"pid":', '[]', '{"pid":"one"}'])(
    'with the rubbish %j in it is taken over',
    (text) => {
      const folder = makeTemporaryFolder();
      writeFileSync(lockFileOf(folder), text);
      expect(readLock(folder)).toEqual({ state: 'stale' });
      lockDataFolder(new Lifetime(), folder, description);
      expect(readLock(folder)).toMatchObject({ state: 'taken' });
    },
  );
});

describe('startTicksOf', () => {
  it('stays the same for a process, and is null for one that has ended', () => {
    expect(startTicksOf(process.pid)).toMatch(/^\d+$/);
    expect(startTicksOf(process.pid)).toBe(startTicksOf(process.pid));
    expect(startTicksOf(endedProcessId())).toBeNull();
  });
});
