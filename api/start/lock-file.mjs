import { linkSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';

import { parseJsonObject, readTextOrNull } from './files.mjs';
import { Problem, errorCode } from './problem.mjs';

/** @typedef {import('./lifetime.mjs').Lifetime} Lifetime */

/**
 * @typedef {object} LockOwner
 * @property {number} pid
 * @property {string} startedAtTicks of the process, so that a process id used anew isn't taken for it
 * @property {string} program such as `npm start`
 * @property {string} localUrl where it serves; empty for tests
 * @property {string} publicUrl
 */

/** @typedef {{ state: 'free' } | { state: 'stale' } | { state: 'taken', owner: LockOwner }} LockState */

/**
 * Takes the data folder for this process until it stops. A lock that a killed process left is removed.
 *
 * @param {Lifetime} lifetime
 * @param {string} dataFolder
 * @param {{ program: string, localUrl: string, publicUrl: string }} description
 */
export function lockDataFolder(lifetime, dataFolder, description) {
  const file = lockFileOf(dataFolder);
  const state = readLock(dataFolder);
  if (state.state === 'taken') {
    const { program, pid, localUrl } = state.owner;
    throw new Problem(
      `${program} is already running with the data folder ${dataFolder} ` +
        `(process ${pid}${localUrl && `, ${localUrl}`}). Stop it first: kill ${pid}`,
    );
  }
  if (state.state === 'stale') rmSync(file, { force: true });

  /** @type {LockOwner} */
  const owner = {
    pid: process.pid,
    startedAtTicks: startTicksOf(process.pid) ?? '',
    ...description,
  };
  const partialFile = `${file}.${process.pid}`;
  writeFileSync(partialFile, JSON.stringify(owner), { mode: 0o600 });
  try {
    // A link appears whole and fails when another start was quicker.
    linkSync(partialFile, file);
  } catch (error) {
    if (errorCode(error) !== 'EEXIST') throw error;
    throw new Problem('Another start has just taken this data folder.');
  } finally {
    rmSync(partialFile, { force: true });
  }
  lifetime.hold(() => rmSync(file, { force: true }));
}

/**
 * @param {string} dataFolder
 * @returns {LockState}
 */
export function readLock(dataFolder) {
  const text = readTextOrNull(lockFileOf(dataFolder));
  if (text === null) return { state: 'free' };
  const owner = parseOwner(text);
  if (!owner || startTicksOf(owner.pid) !== owner.startedAtTicks) return { state: 'stale' };
  return { state: 'taken', owner };
}

/**
 * @param {string} dataFolder
 * @returns {string}
 */
export function lockFileOf(dataFolder) {
  return path.join(dataFolder, 'running.json');
}

/**
 * @param {string} text
 * @returns {LockOwner | null}
 */
function parseOwner(text) {
  const { pid, startedAtTicks, program, localUrl, publicUrl } = parseJsonObject(text) ?? {};
  return typeof pid === 'number' &&
    typeof startedAtTicks === 'string' &&
    typeof program === 'string' &&
    typeof localUrl === 'string' &&
    typeof publicUrl === 'string'
    ? { pid, startedAtTicks, program, localUrl, publicUrl }
    : null;
}

/**
 * @param {number} pid
 * @returns {string | null} when the process started, in clock ticks since boot; null when it is gone
 */
export function startTicksOf(pid) {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8');
    // The command's name in brackets may hold spaces; what follows it is field 3 on, the start is field 22.
    const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ');
    // A zombie holds nothing any more.
    return fields[0] === 'Z' ? null : (fields[19] ?? null);
  } catch {
    return null;
  }
}
