import { isObject, parseJsonObject } from './files.mjs';

/** @typedef {{ passed: number, failed: number, note: string }} Counts */

/**
 * Counts the tests in a report of vitest's JSON reporter. A skipped test counts as failed, and so
 * does a file that could not be run, and a run in which no test was found.
 *
 * @param {string | null} reportText null when vitest ended before it wrote one
 * @param {number} exitCode of vitest
 * @returns {Counts}
 */
export function countTests(reportText, exitCode) {
  const files = parseJsonObject(reportText ?? '')?.testResults;
  const results = Array.isArray(files) ? files.filter(isObject).map(countFile) : [];
  const passed = sum(results.map((file) => file.passed));
  const skipped = sum(results.map((file) => file.skipped));
  const brokenFiles = results.filter((file) => file.isBroken).length;
  const failed = sum(results.map((file) => file.failed)) + skipped + brokenFiles;
  const notes = [
    skipped > 0 ? `${skipped} skipped` : '',
    brokenFiles > 0 ? `${brokenFiles} files could not be run` : '',
  ].filter((note) => note !== '');
  if (passed + failed === 0) return { passed, failed: 1, note: 'no test was run' };
  if (exitCode !== 0 && failed === 0) {
    return { passed, failed: 1, note: `vitest ended with exit code ${exitCode}` };
  }
  return { passed, failed, note: notes.join(', ') };
}

/**
 * @param {Record<string, unknown>} file
 * @returns {{ passed: number, failed: number, skipped: number, isBroken: boolean }}
 */
function countFile(file) {
  const tests = Array.isArray(file.assertionResults) ? file.assertionResults.filter(isObject) : [];
  const passed = tests.filter((test) => test.status === 'passed').length;
  const failed = tests.filter((test) => test.status === 'failed').length;
  const skipped = tests.length - passed - failed;
  return { passed, failed, skipped, isBroken: file.status === 'failed' && failed + skipped === 0 };
}

/**
 * @param {number[]} numbers
 * @returns {number}
 */
function sum(numbers) {
  return numbers.reduce((total, number) => total + number, 0);
}
