import { closeSync, openSync, readFileSync, renameSync, rmSync, statSync } from 'node:fs';
import path from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';

import { startChild } from './children.mjs';
import { POSTGRES_PROGRAMS, SUPERUSER, postgresEnvironment } from './cluster-files.mjs';
import { runCommand } from './commands.mjs';
import { readTextOrNull } from './files.mjs';
import { startTicksOf } from './lock-file.mjs';
import { findFreePort, isPortFree } from './ports.mjs';
import { Problem, errorCode } from './problem.mjs';

/** @typedef {import('./lifetime.mjs').Lifetime} Lifetime */
/** @typedef {import('./cluster-place.mjs').ClusterPlace} ClusterPlace */

/**
 * @typedef {object} RunningCluster
 * @property {number} port on 127.0.0.1
 * @property {number} pid of the postmaster
 * @property {Promise<import('./children.mjs').Ending>} ended
 * @property {() => Promise<void>} stop
 */

/** Fast shutdown (as `pg_ctl -m fast`), then an immediate one, which the next start recovers from. */
const STOP_STEPS = /** @type {import('./children.mjs').StopStep[]} */ ([
  { signal: 'SIGINT', waitMs: 60_000 },
  { signal: 'SIGQUIT', waitMs: 10_000 },
]);
const START_ATTEMPTS = 20;
/** Recovery after a crash may take its time; it goes on as long as the process lives. */
const READY_WITHIN_MS = 300_000;
const LOG_LIMIT_BYTES = 10 * 1024 * 1024;

/**
 * Starts the cluster as a child on its remembered port, or on another where that is taken.
 *
 * @param {Lifetime} lifetime
 * @param {ClusterPlace} place
 * @param {{ logFile: string, isTest?: boolean }} options
 * @returns {Promise<RunningCluster>}
 */
export async function startCluster(lifetime, place, { logFile, isTest = false }) {
  await clearPostmasterFile(place.folder);
  let port = place.port ?? (await findFreePort());
  for (let attempt = 1; attempt <= START_ATTEMPTS; attempt += 1) {
    if (!(await isPortFree(port))) port = await findFreePort();
    const log = openLog(logFile);
    const child = startPostmaster(lifetime, place, port, log.descriptor, isTest);
    closeSync(log.descriptor);
    if (await becomesReady(lifetime, child, port)) {
      return { port, pid: child.pid, ended: child.ended, stop: child.stop };
    }
    lifetime.checkpoint();
    const output = readFileSync(logFile).subarray(log.startBytes).toString();
    // Somebody took the port in between: the next round finds another. After a crash the old
    // server's last processes may need a moment to go.
    const isWorthRetrying =
      /could not bind|Address already in use|could not create any TCP/i.test(output) ||
      /pre-existing shared memory block/.test(output);
    if (!isWorthRetrying || attempt === START_ATTEMPTS) {
      throw new Problem(
        `The database in ${place.folder} did not start. Its log, ${logFile}:`,
        output,
      );
    }
    await wait(500);
  }
  throw new Problem(`The database in ${place.folder} did not start; see ${logFile}.`);
}

/**
 * @param {Lifetime} lifetime
 * @param {ClusterPlace} place
 * @param {number} port
 * @param {number} logDescriptor
 * @param {boolean} isTest
 */
function startPostmaster(lifetime, { folder, asUser }, port, logDescriptor, isTest) {
  const settings = [
    `port=${port}`,
    'listen_addresses=127.0.0.1',
    // TCP alone: a socket's path in a deep folder would be too long for the system.
    'unix_socket_directories=',
    ...(isTest ? ['fsync=off', 'synchronous_commit=off', 'full_page_writes=off'] : []),
  ];
  return startChild(
    lifetime,
    `${POSTGRES_PROGRAMS}/postgres`,
    ['-D', folder, ...settings.flatMap((setting) => ['-c', setting])],
    {
      cwd: '/',
      asUser,
      env: postgresEnvironment(),
      stdio: ['ignore', logDescriptor, logDescriptor],
      stopSteps: STOP_STEPS,
      isGroupSignalled: false,
    },
  );
}

/**
 * @param {Lifetime} lifetime
 * @param {import('./children.mjs').Child} child
 * @param {number} port
 * @returns {Promise<boolean>} false when the process has ended instead
 */
async function becomesReady(lifetime, child, port) {
  const deadlineMs = Date.now() + READY_WITHIN_MS;
  while (!child.hasEnded()) {
    const args = ['-q', '-h', '127.0.0.1', '-p', String(port), '-U', SUPERUSER, '-d', 'postgres'];
    const probe = await runCommand(lifetime, `${POSTGRES_PROGRAMS}/pg_isready`, args, {
      env: postgresEnvironment(),
    });
    // The process is looked at once more: another server might answer on the port.
    if (probe.isOk && !child.hasEnded()) return true;
    if (Date.now() > deadlineMs) {
      await child.stop();
      throw new Problem('The database has not become ready within five minutes.');
    }
    await Promise.race([child.ended, wait(50)]);
  }
  return false;
}

/**
 * Looks after the process file of an earlier run. PostgreSQL itself removes that of a dead process,
 * but not when an unrelated process has its number now, as happens after a restart of the machine.
 *
 * @param {string} folder
 */
async function clearPostmasterFile(folder) {
  const file = path.join(folder, 'postmaster.pid');
  // A launcher that was killed a moment ago may still have its database shutting down.
  const deadlineMs = Date.now() + 30_000;
  for (;;) {
    const pid = Number(readTextOrNull(file)?.split('\n')[0]);
    if (!Number.isInteger(pid) || pid <= 0 || startTicksOf(pid) === null) return;
    if (!isPostmasterOf(pid, folder)) {
      rmSync(file, { force: true });
      return;
    }
    if (Date.now() > deadlineMs) {
      throw new Problem(
        `The database in ${folder} is already running (process ${pid}), without a Noonmark that ` +
          `this data folder knows of. End it first: kill -INT ${pid}`,
      );
    }
    await wait(200);
  }
}

/**
 * @param {number} pid
 * @param {string} folder
 * @returns {boolean} whether the process is a PostgreSQL server of this cluster
 */
export function isPostmasterOf(pid, folder) {
  try {
    const commandLine = readFileSync(`/proc/${pid}/cmdline`, 'utf8').split('\0');
    return commandLine.some((part) => part.endsWith('postgres')) && commandLine.includes(folder);
  } catch {
    return false;
  }
}

/**
 * @param {string} file
 * @returns {{ descriptor: number, startBytes: number }} opened at its end; a long one is put aside first
 */
function openLog(file) {
  if (sizeOf(file) > LOG_LIMIT_BYTES) renameSync(file, `${file}.old`);
  return { startBytes: sizeOf(file), descriptor: openSync(file, 'a', 0o600) };
}

/**
 * @param {string} file
 * @returns {number}
 */
function sizeOf(file) {
  try {
    return statSync(file).size;
  } catch (error) {
    if (errorCode(error) === 'ENOENT') return 0;
    throw error;
  }
}
