import path from 'node:path';

import { makeClusterFiles } from './cluster-files.mjs';
import {
  findClusterPlace,
  isClusterFolder,
  readRememberedPlace,
  rememberPlace,
} from './cluster-place.mjs';
import { startCluster } from './cluster.mjs';
import {
  APP_ROLE,
  DATABASE_NAME,
  OWNER_ROLE,
  databaseUrl,
  makeDatabase,
  makeRoles,
} from './database.mjs';
import { readOrMakeSecrets } from './secrets.mjs';

/** @typedef {import('./lifetime.mjs').Lifetime} Lifetime */
/** @typedef {import('./settings.mjs').Connection} Connection */

/**
 * Starts the data folder's own cluster, made at the first start, with its roles and its database.
 *
 * @param {Lifetime} lifetime
 * @param {string} dataFolder
 * @returns {Promise<{ connection: Connection, port: number, isNew: boolean, ended: Promise<unknown> }>}
 */
export async function startOwnDatabase(lifetime, dataFolder) {
  const place = await findClusterPlace(lifetime, dataFolder);
  const secrets = readOrMakeSecrets(dataFolder, () => isClusterFolder(place.folder));
  const isNew = await makeClusterFiles(lifetime, place, secrets);
  const logFile = path.join(dataFolder, 'log/postgresql.log');
  const { port, ended } = await startCluster(lifetime, place, { logFile });
  rememberPlace(dataFolder, { ...place, port });
  const server = { port, superuserPassword: secrets.superuserPassword };
  await makeRoles(lifetime, server, secrets);
  await makeDatabase(lifetime, server, DATABASE_NAME);
  return { connection: connectionTo(port, secrets), port, isNew, ended };
}

/**
 * @param {string} dataFolder
 * @param {import('./secrets.mjs').Secrets} secrets
 * @returns {Connection | null} to the running start's database; null before the first start
 */
export function readOwnConnection(dataFolder, secrets) {
  const { port } = readRememberedPlace(dataFolder);
  return port === null ? null : connectionTo(port, secrets);
}

/**
 * @param {number} port
 * @param {import('./secrets.mjs').Secrets} secrets
 * @returns {Connection}
 */
function connectionTo(port, { ownerPassword, appPassword }) {
  return {
    appUrl: databaseUrl({ role: APP_ROLE, password: appPassword, port }),
    ownerUrl: databaseUrl({ role: OWNER_ROLE, password: ownerPassword, port }),
  };
}
