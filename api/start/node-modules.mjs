import { createHash } from 'node:crypto';
import { writeFileSync } from 'node:fs';
import path from 'node:path';

import { runCommand } from './commands.mjs';
import { isObject, parseJsonObject, readTextOrNull } from './files.mjs';
import { Problem } from './problem.mjs';

/** @typedef {import('./lifetime.mjs').Lifetime} Lifetime */

/**
 * Runs `npm ci` unless node_modules holds just what package-lock.json asks for.
 *
 * @param {Lifetime} lifetime
 * @param {string} projectFolder
 * @returns {Promise<'present' | 'installed'>}
 */
export async function installNodeModules(lifetime, projectFolder) {
  const lockText = readTextOrNull(path.join(projectFolder, 'package-lock.json'));
  if (lockText === null) throw new Problem(`package-lock.json is missing in ${projectFolder}.`);
  const stamp = createHash('sha256').update(lockText).digest('hex');
  // Inside node_modules, so that it goes when they go.
  const stampFile = path.join(projectFolder, 'node_modules/.noonmark-lock-sha256');
  if (readTextOrNull(stampFile) === stamp) return 'present';

  // npm's own record tells of an `npm ci` or `npm install` that somebody ran by hand.
  const installedText = readTextOrNull(path.join(projectFolder, 'node_modules/.package-lock.json'));
  const isThere = installedText !== null && isInstalled(lockText, installedText);
  if (!isThere) await runNpmCi(lifetime, projectFolder);
  writeFileSync(stampFile, stamp);
  return isThere ? 'present' : 'installed';
}

/**
 * @param {string} lockText of package-lock.json
 * @param {string} installedText of node_modules/.package-lock.json
 * @returns {boolean} whether every package stands there in its version, and no other; optional ones,
 *   which are for other systems, may be absent
 */
export function isInstalled(lockText, installedText) {
  const wanted = packagesOf(lockText);
  const installed = packagesOf(installedText);
  return (
    wanted.size > 0 &&
    [...wanted].every(
      ([folder, { version, isOptional }]) =>
        (installed.get(folder)?.version ?? (isOptional ? version : null)) === version,
    ) &&
    [...installed.keys()].every((folder) => wanted.has(folder))
  );
}

/**
 * @param {string} text of a lock file
 * @returns {Map<string, { version: unknown, isOptional: boolean }>} by folder
 */
function packagesOf(text) {
  const packages = parseJsonObject(text)?.packages;
  return new Map(
    Object.entries(isObject(packages) ? packages : {}).flatMap(([folder, entry]) =>
      folder !== '' && isObject(entry)
        ? [[folder, { version: entry.version, isOptional: entry.optional === true }]]
        : [],
    ),
  );
}

/**
 * @param {Lifetime} lifetime
 * @param {string} projectFolder
 */
async function runNpmCi(lifetime, projectFolder) {
  // With NODE_ENV=production npm would leave out what the build needs.
  const args = ['ci', '--include=dev', '--no-audit', '--no-fund', '--loglevel=error'];
  const result = await runCommand(lifetime, 'npm', args, { cwd: projectFolder });
  if (!result.isOk) {
    throw new Problem(
      'npm ci failed (is the network there?). Its last lines, before you try again:',
      result.output,
    );
  }
}
