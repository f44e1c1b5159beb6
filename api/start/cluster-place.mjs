import { createHash } from 'node:crypto';
import path from 'node:path';

import { runCommand } from './commands.mjs';
import { parseJsonObject, readTextOrNull, writePrivateJson } from './files.mjs';
import { Problem } from './problem.mjs';

/** @typedef {import('./lifetime.mjs').Lifetime} Lifetime */

const DATABASE_USER = 'postgres';
const OUTSIDE_FOLDER = '/var/lib/noonmark';

/**
 * @typedef {object} ClusterPlace
 * @property {string} folder of the cluster's files
 * @property {string | null} asUser who runs it; null for the user who runs the launcher
 * @property {number | null} port that it used last
 */

/**
 * Finds where the data folder's cluster is or shall be. PostgreSQL refuses to run as root; then it
 * runs as Debian's user `postgres`, and where that user can't pass through to the data folder
 * (a clone in root's home), the cluster stands in /var/lib/noonmark.
 *
 * @param {Lifetime} lifetime
 * @param {string} dataFolder
 * @returns {Promise<ClusterPlace>}
 */
export async function findClusterPlace(lifetime, dataFolder) {
  const { folder: rememberedFolder, port } = readRememberedPlace(dataFolder);
  const asUser = process.getuid?.() === 0 ? DATABASE_USER : null;
  const insideFolder = path.join(dataFolder, 'cluster');
  if (!asUser) return { folder: insideFolder, asUser, port };

  const isPassable = await runCommand(lifetime, 'test', ['-x', dataFolder], { cwd: '/', asUser });
  if (isPassable.code === 127) {
    throw new Problem(
      `The system's user ${DATABASE_USER} is missing: reinstall postgresql-common.`,
    );
  }
  if (isPassable.isOk) return { folder: insideFolder, asUser, port };

  // The remembered place lets a project be moved together with its data folder.
  const isRemembered = rememberedFolder !== null && isClusterFolder(rememberedFolder);
  return { folder: isRemembered ? rememberedFolder : outsideFolderFor(dataFolder), asUser, port };
}

/**
 * @param {string} dataFolder
 * @returns {string}
 */
export function outsideFolderFor(dataFolder) {
  const hash = createHash('sha256').update(dataFolder).digest('hex').slice(0, 12);
  return path.join(OUTSIDE_FOLDER, hash, 'cluster');
}

/**
 * @param {string} folder
 * @returns {boolean} whether a cluster was completely made there
 */
export function isClusterFolder(folder) {
  return readTextOrNull(path.join(folder, 'PG_VERSION')) !== null;
}

/**
 * @param {string} dataFolder
 * @returns {{ folder: string | null, port: number | null }}
 */
export function readRememberedPlace(dataFolder) {
  const { folder, port } = parseJsonObject(readTextOrNull(placeFileOf(dataFolder)) ?? '') ?? {};
  return {
    folder: typeof folder === 'string' ? folder : null,
    port: typeof port === 'number' ? port : null,
  };
}

/**
 * @param {string} dataFolder
 * @param {ClusterPlace} place
 */
export function rememberPlace(dataFolder, { folder, port }) {
  writePrivateJson(placeFileOf(dataFolder), { folder, port });
}

/**
 * @param {string} dataFolder
 * @returns {string}
 */
function placeFileOf(dataFolder) {
  return path.join(dataFolder, 'cluster.json');
}
