import fs from 'node:fs';
import path from 'node:path';

import { Problem, errorCode } from './problem.mjs';

/** A new cluster takes about 60 MB, its write-ahead log and uploads more. */
const NEEDED_BYTES = 300 * 1024 * 1024;

/**
 * Makes the data folder where it is missing and checks that it can be written.
 *
 * @param {string} folder
 * @param {number} neededBytes
 */
export function openDataFolder(folder, neededBytes = NEEDED_BYTES) {
  try {
    // Root's database runs as another user, who must be able to pass through, not to look around.
    makeFolder(folder, process.getuid?.() === 0 ? 0o711 : 0o700);
    makeFolder(path.join(folder, 'log'), 0o700);
    const probe = path.join(folder, '.writable');
    fs.writeFileSync(probe, 'probe');
    fs.rmSync(probe);
  } catch (error) {
    throw describeWriteError(folder, error);
  }
  const { bavail, bsize } = fs.statfsSync(folder);
  if (bavail * bsize < neededBytes) {
    const freeMb = Math.floor((bavail * bsize) / 1024 / 1024);
    throw new Problem(
      `The disk of ${folder} has ${freeMb} MB left; ` +
        `Noonmark needs ${Math.ceil(neededBytes / 1024 / 1024)} MB. ` +
        'Make room, or set NOONMARK_DATA to a folder elsewhere.',
    );
  }
}

/**
 * Makes the folder and its parents. (Node's own recursive way never ends in places such as /proc.)
 *
 * @param {string} folder
 * @param {number} mode
 */
function makeFolder(folder, mode) {
  if (fs.statSync(folder, { throwIfNoEntry: false })?.isDirectory()) return;
  makeFolder(path.dirname(folder), mode);
  fs.mkdirSync(folder, { mode });
}

/**
 * @param {string} folder
 * @param {unknown} error
 * @returns {unknown} a problem where a person can mend it
 */
export function describeWriteError(folder, error) {
  const reason = {
    EACCES: 'this user may not write there',
    EPERM: 'this user may not write there',
    EROFS: 'it is on a read-only file system',
    ENOSPC: 'the disk is full',
    EDQUOT: "this user's disk quota is used up",
    ENOENT: 'no folder can be made there',
    ENOTDIR: 'a file stands in its place',
    EEXIST: 'a file stands in its place',
  }[errorCode(error)];
  if (!reason) return error;
  return new Problem(
    `The data folder ${folder} can't be used: ${reason}. Mend it, or set NOONMARK_DATA to another folder.`,
  );
}
