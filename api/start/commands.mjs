import { startChild } from './children.mjs';

/** @typedef {import('./lifetime.mjs').Lifetime} Lifetime */

/**
 * @typedef {object} CommandOptions
 * @property {string} [cwd]
 * @property {NodeJS.ProcessEnv} [env]
 * @property {string | null} [asUser]
 * @property {string} [input] for the command's standard input
 * @property {import('./children.mjs').StopStep[]} [stopSteps]
 */

/**
 * Runs a command to its end and collects what it prints.
 *
 * @param {Lifetime} lifetime
 * @param {string} command
 * @param {string[]} args
 * @param {CommandOptions} options
 * @returns {Promise<{ isOk: boolean, code: number | null, stdout: string, output: string }>}
 *   `output` is standard output and standard error as they came
 */
export async function runCommand(lifetime, command, args, options = {}) {
  const { input, ...childOptions } = options;
  const child = startChild(lifetime, command, args, { ...childOptions, stdio: 'pipe' });
  let stdout = '';
  let output = '';
  child.process.stdout?.setEncoding('utf8').on('data', (/** @type {string} */ text) => {
    stdout += text;
    output += text;
  });
  child.process.stderr?.setEncoding('utf8').on('data', (/** @type {string} */ text) => {
    output += text;
  });
  // A command that ends without reading its input is judged by its exit code.
  child.process.stdin?.on('error', () => undefined);
  child.process.stdin?.end(input ?? '');
  const closed = new Promise((resolve) => child.process.once('close', resolve));
  const { code } = await child.ended;
  if (child.pid !== 0) await closed;
  lifetime.checkpoint();
  return { isOk: code === 0, code, stdout, output };
}

/**
 * Runs a command to its end and lets it print to the terminal.
 *
 * @param {Lifetime} lifetime
 * @param {string} command
 * @param {string[]} args
 * @param {{ cwd: string, env: NodeJS.ProcessEnv, longestMs?: number }} options
 * @returns {Promise<number>} its exit code; 1 when a signal, or the time that it may take, has ended it
 */
export async function showCommand(lifetime, command, args, { cwd, env, longestMs = Infinity }) {
  const stdio = /** @type {const} */ (['ignore', 'inherit', 'inherit']);
  const child = startChild(lifetime, command, args, { cwd, env, stdio: [...stdio] });
  const timer = longestMs < Infinity ? setTimeout(() => void child.stop(), longestMs) : undefined;
  const { code } = await child.ended;
  clearTimeout(timer);
  lifetime.checkpoint();
  return code ?? 1;
}
