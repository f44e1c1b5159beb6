import { execFile } from 'node:child_process';
import { mkdirSync, rmSync } from 'node:fs';
import path from 'node:path';
import { promisify } from 'node:util';
import type { TestProject } from 'vitest/node';
import { startChild } from '../../api/start/children.mjs';
import { waitUntilReady } from '../../api/start/health.mjs';
import { Lifetime } from '../../api/start/lifetime.mjs';
import { findFreePort } from '../../api/start/ports.mjs';
import { createTestDatabase, readVariable } from '../support/test-database.ts';

const projectFolder = path.resolve(import.meta.dirname, '../..');
/** Apart from the port of `npm start` and that of `npm run dev`. */
const FIRST_PORT = 18_080;

/** Starts server and worker on a freshly seeded database before the browser tests, and ends them after. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  const running = process.env['E2E_BASE_URL'];
  if (running !== undefined) {
    // While a journey is being written: the demo of an `npm start` that runs already.
    project.provide('baseUrl', running);
    return () => Promise.resolve();
  }
  const lifetime = new Lifetime();
  const database = await createTestDatabase();
  lifetime.hold(() => database.drop());
  const port = await findFreePort(FIRST_PORT);
  const baseUrl = `http://127.0.0.1:${port}`;
  const dataFolder = path.join(readVariable('TEST_DATA_FOLDER'), database.name);
  mkdirSync(dataFolder);
  lifetime.hold(() => rmSync(dataFolder, { recursive: true, force: true }));
  const env = {
    ...process.env,
    NODE_ENV: 'test',
    DATABASE_URL: database.appUrl,
    HOST: '127.0.0.1',
    PORT: String(port),
    PUBLIC_URL: baseUrl,
    NOONMARK_DATA: dataFolder,
  };
  const start = (file: string) =>
    startChild(lifetime, process.execPath, ['--import', 'tsx', file], {
      cwd: projectFolder,
      env,
      stdio: ['ignore', 'inherit', 'inherit'],
    });

  try {
    const seeding = await promisify(execFile)(
      process.execPath,
      ['--import', 'tsx', 'api/cli/seed-demo.ts'],
      { cwd: projectFolder, env: { ...env, DATABASE_OWNER_URL: database.ownerUrl } },
    );
    start('api/worker.ts');
    await waitUntilReady(baseUrl, start('api/server.ts'));
    project.provide('baseUrl', baseUrl);
    project.provide('databaseUrl', database.appUrl);
    project.provide('demoAccounts', seeding.stdout);
    project.provide('dataFolder', dataFolder);
  } catch (error) {
    await lifetime.stop();
    throw error;
  }
  return () => lifetime.stop();
}
