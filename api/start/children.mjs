import { spawn } from 'node:child_process';
import { setTimeout as wait } from 'node:timers/promises';

/** @typedef {import('./lifetime.mjs').Lifetime} Lifetime */

/**
 * @typedef {object} ChildOptions
 * @property {string} [cwd]
 * @property {NodeJS.ProcessEnv} [env]
 * @property {string | null} [asUser] run as this user (only root can)
 * @property {import('node:child_process').StdioOptions} [stdio]
 * @property {StopStep[]} [stopSteps]
 * @property {boolean} [isGroupSignalled] signals go to all that the child has started too
 */

/** @typedef {{ signal: NodeJS.Signals, waitMs: number }} StopStep */
/** @typedef {{ code: number | null, signal: NodeJS.Signals | null }} Ending */

/**
 * @typedef {object} Child
 * @property {number} pid
 * @property {import('node:child_process').ChildProcess} process
 * @property {Promise<Ending>} ended
 * @property {() => boolean} hasEnded
 * @property {() => Promise<void>} stop
 */

/** @type {StopStep[]} */
const DEFAULT_STOP_STEPS = [
  { signal: 'SIGTERM', waitMs: 20_000 },
  { signal: 'SIGKILL', waitMs: 5_000 },
];

/**
 * Starts a child that can't outlive the launcher: `lifetime.stop()` ends it, and when the launcher
 * itself is killed, the system sends the first stop signal (setpriv's `--pdeathsig`).
 * It gets its own session, so Ctrl-C reaches the launcher alone, which then stops things in order.
 *
 * @param {Lifetime} lifetime
 * @param {string} command
 * @param {string[]} args
 * @param {ChildOptions} options
 * @returns {Child}
 */
export function startChild(lifetime, command, args, options = {}) {
  lifetime.checkpoint();
  const stopSteps = options.stopSteps ?? DEFAULT_STOP_STEPS;
  const isGroupSignalled = options.isGroupSignalled ?? true;
  const child = spawn(
    'setpriv',
    [
      ...identityArguments(options.asUser),
      '--pdeathsig',
      (stopSteps[0]?.signal ?? 'SIGTERM').replace('SIG', ''),
      '--',
      command,
      ...args,
    ],
    { cwd: options.cwd, env: options.env, stdio: options.stdio ?? 'inherit', detached: true },
  );
  const pid = child.pid ?? 0;
  let hasEnded = false;

  /** @type {Promise<Ending>} */
  const ended = new Promise((resolve) => {
    child.once('error', () => resolve({ code: 127, signal: null }));
    child.once('exit', (code, signal) => resolve({ code, signal }));
  });

  const stop = async () => {
    for (const { signal, waitMs } of stopSteps) {
      if (hasEnded) break;
      sendSignal(isGroupSignalled ? -pid : pid, signal);
      await Promise.race([ended, wait(waitMs, undefined, { ref: false })]);
    }
    // The child is gone; what it may have left behind in its group goes too.
    if (isGroupSignalled) sendSignal(-pid, 'SIGKILL');
  };
  const forget = lifetime.hold(stop);
  void ended.then(() => {
    hasEnded = true;
    forget();
  });
  return { pid, process: child, ended, hasEnded: () => hasEnded, stop };
}

/**
 * @param {string | null | undefined} user
 * @returns {string[]}
 */
function identityArguments(user) {
  return user ? [`--reuid=${user}`, `--regid=${user}`, '--init-groups'] : [];
}

/**
 * @param {number} pid of a process, or negative of a group
 * @param {NodeJS.Signals} signal
 */
function sendSignal(pid, signal) {
  if (pid === 0) return;
  try {
    process.kill(pid, signal);
  } catch {
    // Gone already: that is what was wanted.
  }
}

/**
 * @param {Ending} ending
 * @returns {string} such as `exit code 1` or `signal SIGKILL`
 */
export function describeEnding({ code, signal }) {
  return signal ? `signal ${signal}` : `exit code ${String(code)}`;
}
