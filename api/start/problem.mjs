/** Something expected that a person can mend: shown as one line, with the end of a program's output where it helps. */
export class Problem extends Error {
  /**
   * @param {string} message a sentence that says what to do
   * @param {string} [output] what the failing program printed
   */
  constructor(message, output = '') {
    super(message);
    this.name = 'Problem';
    this.output = output;
  }
}

/**
 * @param {unknown} error
 * @returns {string} the system's error code such as `ENOENT`, or an empty string
 */
export function errorCode(error) {
  return error instanceof Error && 'code' in error && typeof error.code === 'string'
    ? error.code
    : '';
}
