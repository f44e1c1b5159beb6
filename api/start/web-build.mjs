import { createHash } from 'node:crypto';
import { readFileSync, readdirSync, rmSync, statSync, writeFileSync } from 'node:fs';
import path from 'node:path';

import { runCommand } from './commands.mjs';
import { readTextOrNull } from './files.mjs';
import { Problem } from './problem.mjs';

/** @typedef {import('./lifetime.mjs').Lifetime} Lifetime */

/** What the built client depends on. */
const BUILD_INPUTS = ['web', 'shared', 'package-lock.json', 'vite.config.ts', 'tsconfig.json'];

export const VITE_PROGRAM = 'node_modules/vite/bin/vite.js';

/**
 * Builds the client unless the last build is of the same sources.
 *
 * @param {Lifetime} lifetime
 * @param {string} projectFolder
 * @returns {Promise<'unchanged' | 'built'>}
 */
export async function buildWeb(lifetime, projectFolder) {
  const distFolder = path.join(projectFolder, 'dist');
  const stampFile = path.join(distFolder, '.sources-sha256');
  const stamp = hashInputs(projectFolder, BUILD_INPUTS);
  if (readTextOrNull(stampFile) === stamp) return 'unchanged';
  // An interrupted build must not pass for a whole one.
  rmSync(stampFile, { force: true });
  const result = await runCommand(
    lifetime,
    process.execPath,
    [VITE_PROGRAM, 'build', '--outDir', distFolder, '--emptyOutDir'],
    { cwd: projectFolder, env: { ...process.env, NODE_ENV: 'production' } },
  );
  if (!result.isOk) throw new Problem('The client could not be built:', result.output);
  writeFileSync(stampFile, stamp);
  return 'built';
}

/**
 * @param {string} projectFolder
 * @param {string[]} inputs files and folders in it; absent ones count as empty
 * @returns {string} SHA-256 over their paths and contents
 */
export function hashInputs(projectFolder, inputs) {
  const hash = createHash('sha256');
  for (const file of inputs.flatMap((input) => listFiles(projectFolder, input)).sort()) {
    const content = readFileSync(path.join(projectFolder, file));
    hash.update(`${file}\0${content.length}\0`).update(content);
  }
  return hash.digest('hex');
}

/**
 * @param {string} folder
 * @param {string} input
 * @returns {string[]}
 */
function listFiles(folder, input) {
  const stat = statSync(path.join(folder, input), { throwIfNoEntry: false });
  if (!stat) return [];
  if (!stat.isDirectory()) return [input];
  return readdirSync(path.join(folder, input)).flatMap((name) =>
    listFiles(folder, `${input}/${name}`),
  );
}
