import { randomBytes } from 'node:crypto';
import path from 'node:path';

import { parseJsonObject, readTextOrNull, writePrivateJson } from './files.mjs';
import { Problem } from './problem.mjs';

/**
 * @typedef {object} Secrets
 * @property {string} superuserPassword of the cluster's own superuser, which only the launcher uses
 * @property {string} ownerPassword of the role that owns the schema and migrates
 * @property {string} appPassword of the role that runs the application
 * @property {string} sessionSecret signs session cookies
 */

/**
 * Reads the data folder's secrets, or makes them at the first start.
 *
 * @param {string} dataFolder
 * @param {() => boolean} isClusterThere whether a cluster exists that older secrets belong to
 * @returns {Secrets}
 */
export function readOrMakeSecrets(dataFolder, isClusterThere) {
  const existing = readSecrets(dataFolder);
  if (existing) return existing;
  if (isClusterThere()) {
    throw new Problem(
      `${secretsFileOf(dataFolder)} is missing, but its database is still there. ` +
        'Bring the file back, or remove the database folder to start afresh.',
    );
  }
  const secrets = {
    superuserPassword: makeSecret(),
    ownerPassword: makeSecret(),
    appPassword: makeSecret(),
    sessionSecret: makeSecret(),
  };
  writePrivateJson(secretsFileOf(dataFolder), secrets);
  return secrets;
}

/**
 * @param {string} dataFolder
 * @returns {Secrets | null} null before the first start
 */
export function readSecrets(dataFolder) {
  const text = readTextOrNull(secretsFileOf(dataFolder));
  if (text === null) return null;
  const { superuserPassword, ownerPassword, appPassword, sessionSecret } =
    parseJsonObject(text) ?? {};
  if (
    typeof superuserPassword !== 'string' ||
    typeof ownerPassword !== 'string' ||
    typeof appPassword !== 'string' ||
    typeof sessionSecret !== 'string'
  ) {
    throw new Problem(
      `${secretsFileOf(dataFolder)} is damaged. Bring it back from a backup; the database's passwords stand in it.`,
    );
  }
  return { superuserPassword, ownerPassword, appPassword, sessionSecret };
}

/**
 * @param {string} dataFolder
 * @returns {string}
 */
function secretsFileOf(dataFolder) {
  return path.join(dataFolder, 'secrets.json');
}

/** @returns {string} 32 random bytes in letters, digits, `-` and `_`, which need no quoting anywhere */
function makeSecret() {
  return randomBytes(32).toString('base64url');
}
