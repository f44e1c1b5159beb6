import { describe, expect, it } from 'vitest';
import { readTestEnvironment } from '../../../api/start/test-environment.mjs';
import { chooseParts } from '../../../api/start/test-parts.mjs';
import { renderSummary } from '../../../api/start/test-summary.mjs';
import { countTests } from '../../../api/start/vitest-counts.mjs';

const namesOf = (args: string[]) => chooseParts(args).parts.map((part) => part.name);

describe('chooseParts', () => {
  it('takes all parts but the long one when none is named', () => {
    expect(namesOf([])).toEqual([
      ...['typecheck', 'lint', 'format', 'unit', 'reference'],
      ...['api', 'build', 'e2e', 'migrations'],
    ]);
    expect(namesOf(['long'])).toEqual(['long']);
  });

  it('builds the client before the browser tests', () => {
    expect(namesOf(['e2e'])).toEqual(['build', 'e2e']);
  });

  it('takes what is no part as a filter for test files', () => {
    expect(chooseParts(['api', 'cases/']).filters).toEqual(['cases/']);
  });
});

describe('countTests', () => {
  const report = (testResults: object[]) => JSON.stringify({ testResults });
  const file = (...statuses: string[]) => ({
    status: statuses.includes('failed') ? 'failed' : 'passed',
    assertionResults: statuses.map((status) => ({ status })),
  });

  it('adds up the tests of all files', () => {
    expect(countTests(report([file('passed', 'passed'), file('passed', 'failed')]), 1)).toEqual({
      passed: 3,
      failed: 1,
      note: '',
    });
  });

  it('counts a skipped test as failed', () => {
    expect(countTests(report([file('passed', 'skipped', 'todo')]), 0)).toEqual({
      passed: 1,
      failed: 2,
      note: '2 skipped',
    });
  });

  it('counts a file that could not be run as failed', () => {
    const broken = { status: 'failed', assertionResults: [] };
    expect(countTests(report([file('passed'), broken]), 1)).toEqual({
      passed: 1,
      failed: 1,
      note: '1 files could not be run',
    });
  });

  it('never takes a run without a test, without a report or with an error for passed', () => {
    expect(countTests(report([]), 0)).toMatchObject({ failed: 1, note: 'no test was run' });
    expect(countTests(null, 0)).toMatchObject({ failed: 1 });
    expect(countTests('{"testResults": [', 0)).toMatchObject({ failed: 1 });
    expect(countTests(report([file('passed')]), 1)).toMatchObject({ passed: 1, failed: 1 });
  });
});

describe('renderSummary', () => {
  it('closes with the two sums alone on a line', () => {
    const text = renderSummary([
      { name: 'lint', passed: 1, failed: 0, note: '', durationMs: 2_340 },
      { name: 'unit', passed: 40, failed: 2, note: '1 skipped', durationMs: 61_000 },
    ]);
    expect(text.split('\n')).toEqual([
      'part          passed  failed   duration',
      'lint               1       0      2.3 s',
      'unit              40       2     61.0 s  1 skipped',
      '',
      '41 passed, 2 failed',
    ]);
  });
});

describe('readTestEnvironment', () => {
  it('hides a running Noonmark from the tests', () => {
    const env = {
      PATH: '/usr/bin',
      DATABASE_URL: 'postgresql://db/real',
      PORT: '80',
      NODE_ENV: 'production',
    };
    const { environment } = readTestEnvironment(env, '/srv/noonmark');
    expect(environment).toEqual({
      PATH: '/usr/bin',
      LOG_LEVEL: 'warn',
      CHROMIUM_PATH: '/usr/bin/chromium',
    });
  });

  it('keeps its data apart from those of npm start', () => {
    const folderOf = (env: NodeJS.ProcessEnv) =>
      readTestEnvironment(env, '/srv/noonmark').dataFolder;
    expect(folderOf({ NOONMARK_DATA: '/var/noonmark' })).toBe('/srv/noonmark/.noonmark-test');
    expect(folderOf({ NOONMARK_TEST_DATA: '/tmp/other' })).toBe('/tmp/other');
  });
});
