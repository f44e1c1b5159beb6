import { execFile } from 'node:child_process';
import { mkdtemp, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { makeRectangle } from '../../support/plane-scenes.ts';
import { blockFeature, receptorFeature, studyInputOf } from '../../support/small-study.ts';

let folder: string;
let evidencePath: string;

interface Run {
  code: number;
  stdout: string;
  stderr: string;
}

function recompute(...args: string[]): Promise<Run> {
  return new Promise((resolve) => {
    execFile(
      process.execPath,
      ['--import', 'tsx', 'api/cli/recompute.ts', ...args],
      { maxBuffer: 64 * 1024 * 1024 },
      (error, stdout, stderr) => {
        resolve({ code: typeof error?.code === 'number' ? error.code : 0, stdout, stderr });
      },
    );
  });
}

async function write(name: string, value: unknown): Promise<string> {
  const path = join(folder, name);
  await writeFile(path, typeof value === 'string' ? value : JSON.stringify(value));
  return path;
}

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'noonmark-recompute-'));
  const input = studyInputOf({
    blocks: [blockFeature('tower', 'proposed', makeRectangle(-5, -40, 14, 14), 0, 30)],
    receptors: [receptorFeature('12', makeRectangle(-10, 0, 20, 20))],
  });
  const run = await recompute(await write('input.study.json', input));
  expect(run.stderr).toBe('');
  expect(run.code).toBe(0);
  evidencePath = await write('evidence.study.json', run.stdout);
});

afterAll(() => rm(folder, { recursive: true }));

describe('the command recompute', () => {
  it('verifies its own evidence file with exit code 0', async () => {
    const run = await recompute(evidencePath, '--verify');
    expect(run.stdout).toMatch(/^Verified: sha256:[0-9a-f]{64}\n$/);
    expect(run.code).toBe(0);
  });

  it('exits 1 and names the first figure that was changed', async () => {
    const text = await readFile(evidencePath, 'utf8');
    const path = await write('changed.json', text.replace(/"sunBefore":[\d.]+/, '"sunBefore":1'));
    const run = await recompute(path, '--verify');
    expect(run.code).toBe(1);
    expect(run.stderr).toContain('results.receptors.0.instants.0.sunBefore');
  });

  it('exits 1 when the input was changed and the results were not', async () => {
    const text = await readFile(evidencePath, 'utf8');
    const path = await write('taller.json', text.replace('"top":30', '"top":31'));
    expect((await recompute(path, '--verify')).code).toBe(1);
  });

  it('exits 3 when only a last rounded digit differs', async () => {
    const text = await readFile(evidencePath, 'utf8');
    const changed = text.replace(/"sunAfter":([\d.]+)/, (_, area: string) => {
      return `"sunAfter":${(Number(area) + 0.01).toFixed(2)}`;
    });
    expect((await recompute(await write('digit.json', changed), '--verify')).code).toBe(3);
  });

  it('exits 4 for a file of another engine version', async () => {
    const text = await readFile(evidencePath, 'utf8');
    const other = text.replace(/"engine":"[^"]+"/, '"engine":"0.9.0"');
    const run = await recompute(await write('older.json', other), '--verify');
    expect(run.code).toBe(4);
    expect(run.stderr).toContain('0.9.0');
  });

  it('exits 2 with the path of each thing that is wrong, and for a file that is no JSON', async () => {
    const run = await recompute(
      await write('wrong.json', { format: 'noonmark-study/1', year: 'soon' }),
    );
    expect(run.code).toBe(2);
    expect(run.stderr).toMatch(/^place: /m);
    expect(run.stderr).toMatch(/^year: /m);
    expect((await recompute(await write('none.json', '{'))).code).toBe(2);
    expect((await recompute()).code).toBe(2);
  });

  it('computes a single instant with its polygons, and gives that no digest', async () => {
    const run = await recompute(evidencePath, '--at', '2026-03-20T15:00:00+00:00', '--shadows');
    expect(run.code).toBe(0);
    const output = JSON.parse(run.stdout) as {
      digest?: string;
      results: { instants: { at: string; shadows: { netNew: { coordinates: unknown[] } } }[] };
    };
    expect(output.digest).toBeUndefined();
    expect(output.results.instants).toHaveLength(1);
    expect(output.results.instants[0]?.shadows.netNew.coordinates.length).toBeGreaterThan(0);
  });
});
