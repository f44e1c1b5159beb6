import { rmSync } from 'node:fs';
import path from 'node:path';

import { makeClusterFiles, SUPERUSER } from './cluster-files.mjs';
import { findClusterPlace } from './cluster-place.mjs';
import { startCluster } from './cluster.mjs';
import { openDataFolder } from './data-folder.mjs';
import { APP_ROLE, OWNER_ROLE, databaseUrl, makeDatabase, makeRoles } from './database.mjs';
import { lockDataFolder } from './lock-file.mjs';
import { runCliProgram } from './set-up.mjs';

/** @typedef {import('./lifetime.mjs').Lifetime} Lifetime */

/** Migrated once; every test file gets a copy of it. */
const TEMPLATE_DATABASE = 'noonmark_template';
/** Long enough for the server to accept it; it signs nothing but the tests' cookies. */
const TEST_SESSION_SECRET = 'for-tests-only-'.repeat(3);

/**
 * Starts a fresh cluster for tests and migrates the template database. The cluster trusts everyone
 * on this machine, but has the two roles of the real one, so that tests of their rights are real.
 *
 * @param {Lifetime} lifetime
 * @param {string} projectFolder
 * @param {string} dataFolder
 * @param {NodeJS.ProcessEnv} testEnvironment
 * @returns {Promise<NodeJS.ProcessEnv>} the variables that lead tests to the database
 */
export async function startTestDatabase(lifetime, projectFolder, dataFolder, testEnvironment) {
  openDataFolder(dataFolder);
  lockDataFolder(lifetime, dataFolder, { program: 'npm test', localUrl: '', publicUrl: '' });
  const place = { ...(await findClusterPlace(lifetime, dataFolder)), port: null };
  const removeCluster = () => rmSync(place.folder, { recursive: true, force: true });
  removeCluster();
  lifetime.hold(removeCluster);
  await makeClusterFiles(lifetime, place, 'test');
  const logFile = path.join(dataFolder, 'log/postgresql.log');
  const { port } = await startCluster(lifetime, place, { logFile, isTest: true });
  await makeRoles(lifetime, { port }, { ownerPassword: 'test', appPassword: 'test' });
  await makeDatabase(lifetime, { port }, TEMPLATE_DATABASE);

  const variables = {
    TEST_DATABASE_ADMIN_URL: databaseUrl({ role: SUPERUSER, port, database: 'postgres' }),
    TEST_DATABASE_TEMPLATE: TEMPLATE_DATABASE,
    TEST_DATA_FOLDER: dataFolder,
    SESSION_SECRET: TEST_SESSION_SECRET,
  };
  await runCliProgram(lifetime, projectFolder, 'migrate', {
    ...testEnvironment,
    ...variables,
    ...templateConnection(port),
    NOONMARK_DATA: path.join(dataFolder, 'files'),
  });
  return variables;
}

/**
 * @param {number} port
 * @returns {{ DATABASE_URL: string, DATABASE_OWNER_URL: string }}
 */
function templateConnection(port) {
  return {
    DATABASE_URL: databaseUrl({ role: APP_ROLE, port, database: TEMPLATE_DATABASE }),
    DATABASE_OWNER_URL: databaseUrl({ role: OWNER_ROLE, port, database: TEMPLATE_DATABASE }),
  };
}

/**
 * @param {string} adminUrl as in TEST_DATABASE_ADMIN_URL
 * @returns {{ DATABASE_URL: string, DATABASE_OWNER_URL: string }} the template's connections, for checks of the migrations
 */
export function templateConnectionOf(adminUrl) {
  return templateConnection(Number(new URL(adminUrl).port));
}
