import { closeSync, fsyncSync, openSync, readFileSync, renameSync, writeSync } from 'node:fs';

import { errorCode } from './problem.mjs';

/**
 * @param {string} file
 * @returns {string | null} null when there is no such file
 */
export function readTextOrNull(file) {
  try {
    return readFileSync(file, 'utf8');
  } catch (error) {
    if (errorCode(error) === 'ENOENT') return null;
    throw error;
  }
}

/**
 * Writes the file whole or not at all, readable by its owner alone.
 *
 * @param {string} file
 * @param {unknown} value
 */
export function writePrivateJson(file, value) {
  const partialFile = `${file}.partial`;
  const descriptor = openSync(partialFile, 'w', 0o600);
  try {
    writeSync(descriptor, `${JSON.stringify(value, null, 2)}\n`);
    fsyncSync(descriptor);
  } finally {
    closeSync(descriptor);
  }
  renameSync(partialFile, file);
}

/**
 * @param {string} text
 * @returns {Record<string, unknown> | null} null when the text is no JSON object
 */
export function parseJsonObject(text) {
  try {
    /** @type {unknown} */
    const value = JSON.parse(text);
    return isObject(value) ? value : null;
  } catch {
    return null;
  }
}

/**
 * @param {unknown} value
 * @returns {value is Record<string, unknown>}
 */
export function isObject(value) {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}
