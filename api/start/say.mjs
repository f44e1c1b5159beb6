import { performance } from 'node:perf_hooks';

import { Stopped } from './lifetime.mjs';

/**
 * What the launcher tells the person at the terminal.
 * A step is one line: its name at once, its result and duration when it is done.
 */
export class Say {
  #stream;
  #isLineOpen = false;

  /** @param {{ write(text: string): unknown }} stream */
  constructor(stream = process.stdout) {
    this.#stream = stream;
  }

  /** @param {string} text */
  line(text) {
    this.#stream.write(`${this.#isLineOpen ? '\n' : ''}${text}\n`);
    this.#isLineOpen = false;
  }

  /** @param {string} text printed indented, without empty lines at its ends; nothing when empty */
  block(text) {
    const trimmed = text.replace(/^\s*\n/, '').trimEnd();
    if (trimmed !== '') this.line(trimmed.replace(/^(?=.)/gm, '    '));
  }

  /**
   * @template T
   * @param {string} name
   * @param {() => Promise<T>} work
   * @param {(result: T) => string} describe the result in a few words
   * @param {{ isShownAtOnce: boolean }} options false where the work itself prints to the terminal
   * @returns {Promise<T>}
   */
  async step(name, work, describe, { isShownAtOnce } = { isShownAtOnce: true }) {
    if (isShownAtOnce) this.#openStep(name);
    const startedMs = performance.now();
    try {
      const result = await work();
      this.#endStep(name, describe(result), startedMs);
      return result;
    } catch (error) {
      if (!(error instanceof Stopped)) this.#endStep(name, 'failed', startedMs);
      throw error;
    }
  }

  /** @param {string} name */
  #openStep(name) {
    this.#stream.write(`${this.#isLineOpen ? '\n' : ''}  ${name.padEnd(14)}`);
    this.#isLineOpen = true;
  }

  /**
   * @param {string} name
   * @param {string} result
   * @param {number} startedMs
   */
  #endStep(name, result, startedMs) {
    // Another line may have come in between.
    if (!this.#isLineOpen) this.#openStep(name);
    this.#stream.write(`${result} (${formatSeconds(performance.now() - startedMs)})\n`);
    this.#isLineOpen = false;
  }
}

/**
 * @param {number} durationMs
 * @returns {string} such as `3.4 s`
 */
export function formatSeconds(durationMs) {
  return `${(durationMs / 1000).toFixed(1)} s`;
}

/**
 * @param {string} output
 * @param {number} lines
 * @returns {string} the last lines that are not empty
 */
export function tailOf(output, lines = 15) {
  return output
    .split('\n')
    .filter((line) => line.trim() !== '')
    .slice(-lines)
    .join('\n');
}
