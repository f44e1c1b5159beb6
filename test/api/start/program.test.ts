import { spawn } from 'node:child_process';
import type { ChildProcess } from 'node:child_process';
import { readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it, vi } from 'vitest';
import { startTicksOf } from '../../../api/start/lock-file.mjs';
import { makeTemporaryFolder } from './temporary-folder.ts';

const startFolder = path.resolve(import.meta.dirname, '../../../api/start');

/** A launcher with two children; each writes its process id, and a line when it is asked to end. */
const launcher = `
  import { startChild } from '${startFolder}/children.mjs';
  import { runProgram } from '${startFolder}/program.mjs';
  const child = (name) => 'echo $$ > ' + name + '.pid; trap "echo ' + name + ' >> order; exit 0" TERM; ' +
    'while :; do sleep 0.05; done';
  await runProgram(async (lifetime) => {
    startChild(lifetime, 'sh', ['-c', child('first')], { cwd: process.cwd() });
    const second = startChild(lifetime, 'sh', ['-c', child('second')], { cwd: process.cwd() });
    const { code } = await second.ended;
    return code ?? 9;
  });
`;

async function startLauncher(): Promise<{ folder: string; process: ChildProcess; pids: number[] }> {
  const folder = makeTemporaryFolder();
  writeFileSync(path.join(folder, 'launcher.mjs'), launcher);
  const program = spawn(process.execPath, ['launcher.mjs'], { cwd: folder, stdio: 'ignore' });
  const pids = await vi.waitFor(
    () =>
      ['first', 'second'].map((name) => {
        const pid = Number(readFileSync(path.join(folder, `${name}.pid`), 'utf8'));
        if (pid === 0) throw new Error('The child has not written its number yet.');
        return pid;
      }),
    { timeout: 10_000 },
  );
  return { folder, process: program, pids };
}

function endOf(program: ChildProcess): Promise<number | null> {
  return new Promise((resolve) => program.once('exit', (code) => resolve(code)));
}

describe('runProgram', () => {
  it.each(['SIGINT', 'SIGTERM', 'SIGHUP'] as const)(
    'ends its children in order, last first, and exits with 0 on %s',
    async (signal) => {
      const { folder, process: program, pids } = await startLauncher();
      const ended = endOf(program);
      program.kill(signal);
      expect(await ended).toBe(0);
      expect(readFileSync(path.join(folder, 'order'), 'utf8')).toBe('second\nfirst\n');
      expect(pids.map(startTicksOf)).toEqual([null, null]);
    },
  );

  it('leaves no child behind when it is killed outright', async () => {
    const { process: program, pids } = await startLauncher();
    const ended = endOf(program);
    program.kill('SIGKILL');
    await ended;
    await vi.waitFor(() => expect(pids.map(startTicksOf)).toEqual([null, null]), {
      timeout: 10_000,
    });
  });

  it('ends with the exit code of its main function, after the other children', async () => {
    const { folder, process: program, pids } = await startLauncher();
    const ended = endOf(program);
    process.kill(pids[1] ?? 0, 'SIGKILL');
    expect(await ended).toBe(9);
    expect(readFileSync(path.join(folder, 'order'), 'utf8')).toBe('first\n');
  });
});
