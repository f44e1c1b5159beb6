import { formatSeconds } from './say.mjs';

/** @typedef {{ name: string, passed: number, failed: number, note: string, durationMs: number }} PartResult */

/**
 * @param {PartResult[]} results
 * @returns {string} a table, and as its last line the two sums
 */
export function renderSummary(results) {
  const rows = results.map(({ name, passed, failed, note, durationMs }) =>
    row(name, String(passed), String(failed), formatSeconds(durationMs), note),
  );
  const passed = results.reduce((sum, result) => sum + result.passed, 0);
  const failed = results.reduce((sum, result) => sum + result.failed, 0);
  return [
    row('part', 'passed', 'failed', 'duration', ''),
    ...rows,
    '',
    `${passed} passed, ${failed} failed`,
  ].join('\n');
}

/**
 * @param {string} name
 * @param {string} passed
 * @param {string} failed
 * @param {string} duration
 * @param {string} note
 * @returns {string}
 */
function row(name, passed, failed, duration, note) {
  const columns = [name.padEnd(12), passed.padStart(7), failed.padStart(7), duration.padStart(10)];
  return `${columns.join(' ')}  ${note}`.trimEnd();
}
