import { mkdirSync, readdirSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';

import { isClusterFolder } from './cluster-place.mjs';
import { runCommand } from './commands.mjs';
import { readTextOrNull } from './files.mjs';
import { Problem } from './problem.mjs';

/** @typedef {import('./lifetime.mjs').Lifetime} Lifetime */
/** @typedef {import('./cluster-place.mjs').ClusterPlace} ClusterPlace */

export const POSTGRES_PROGRAMS = '/usr/lib/postgresql/15/bin';
export const SUPERUSER = 'postgres';
const POSTGRES_VERSION = '15';
const PARTIAL_SUFFIX = '.partial-';

/**
 * Makes the cluster's files unless they are there. They are made beside their place and moved to it
 * when whole, so that an interrupted first start leaves nothing that looks like a cluster.
 *
 * @param {Lifetime} lifetime
 * @param {ClusterPlace} place
 * @param {{ superuserPassword: string } | 'test'} use a test cluster trusts all on this machine and skips fsync
 * @returns {Promise<boolean>} whether it was made just now
 */
export async function makeClusterFiles(lifetime, { folder, asUser }, use) {
  if (isClusterFolder(folder)) {
    const version = readTextOrNull(path.join(folder, 'PG_VERSION'))?.trim();
    if (version !== POSTGRES_VERSION) {
      throw new Problem(
        `${folder} was made by PostgreSQL ${String(version)}; this Noonmark runs ${POSTGRES_VERSION}. ` +
          'Move the data with pg_dump, or set DATABASE_URL.',
      );
    }
    return false;
  }
  mkdirSync(path.dirname(folder), { recursive: true, mode: 0o711 });
  removePartialFolders(folder);
  // A name of its own: the initdb of a launcher that was killed may still be busy with the earlier one.
  const partialFolder = `${folder}${PARTIAL_SUFFIX}${process.pid}`;
  const passwordFile = `${partialFolder}.password`;
  mkdirSync(partialFolder, { mode: 0o700 });
  try {
    const password = use === 'test' ? 'test' : use.superuserPassword;
    writeFileSync(passwordFile, password, { mode: 0o600 });
    if (asUser) await giveTo(lifetime, asUser, [partialFolder, passwordFile]);
    const result = await runCommand(
      lifetime,
      `${POSTGRES_PROGRAMS}/initdb`,
      [
        `--pgdata=${partialFolder}`,
        `--username=${SUPERUSER}`,
        `--pwfile=${passwordFile}`,
        '--encoding=UTF8',
        '--locale=C.UTF-8',
        ...(use === 'test' ? ['--auth=trust', '--no-sync'] : ['--auth=scram-sha-256']),
      ],
      { cwd: '/', asUser, env: postgresEnvironment() },
    );
    if (!result.isOk) {
      throw new Problem(`The database could not be made in ${folder}:`, result.output);
    }
    rmSync(passwordFile);
    renameSync(partialFolder, folder);
  } finally {
    removePartialFolders(folder);
  }
  return true;
}

/**
 * @param {string} folder of the cluster, beside which an interrupted start may have left something
 */
function removePartialFolders(folder) {
  const prefix = path.basename(folder) + PARTIAL_SUFFIX;
  for (const name of readdirSync(path.dirname(folder))) {
    if (!name.startsWith(prefix)) continue;
    rmSync(path.join(path.dirname(folder), name), { recursive: true, force: true, maxRetries: 5 });
  }
}

/**
 * @param {Lifetime} lifetime
 * @param {string} user
 * @param {string[]} paths
 */
async function giveTo(lifetime, user, paths) {
  const result = await runCommand(lifetime, 'chown', [`${user}:`, ...paths]);
  if (!result.isOk) throw new Problem(`chown ${user} failed:`, result.output);
}

/**
 * @param {NodeJS.ProcessEnv} extra
 * @returns {NodeJS.ProcessEnv} for PostgreSQL's programs: messages in English, and no settings meant for another server
 */
export function postgresEnvironment(extra = {}) {
  const others = Object.entries(process.env).filter(([name]) => !/^PG[A-Z]+$/.test(name));
  return { ...Object.fromEntries(others), LC_ALL: 'C.UTF-8', ...extra };
}
