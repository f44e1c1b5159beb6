import { existsSync, mkdirSync, rmSync, writeFileSync } from 'node:fs';

import { runCommand } from './commands.mjs';
import { Problem } from './problem.mjs';

/** @typedef {import('./lifetime.mjs').Lifetime} Lifetime */
/** @typedef {{ name: string, provides: string }} DebianPackage the package and a file that shows it is there */

/** @type {DebianPackage[]} */
export const DATABASE_PACKAGES = [
  { name: 'postgresql-15', provides: '/usr/lib/postgresql/15/bin/postgres' },
  {
    name: 'postgresql-15-postgis-3',
    provides: '/usr/share/postgresql/15/extension/postgis.control',
  },
];

/** @type {DebianPackage[]} */
export const PDF_PACKAGES = [{ name: 'poppler-utils', provides: '/usr/bin/pdftoppm' }];

/** @type {DebianPackage[]} */
export const BROWSER_PACKAGES = [{ name: 'chromium', provides: '/usr/bin/chromium' }];

/** Read by postgresql-common while it installs; a system-wide server isn't wanted. */
const NO_SYSTEM_CLUSTER_FOLDER = '/etc/postgresql-common/createcluster.d';
const NO_SYSTEM_CLUSTER_FILE = `${NO_SYSTEM_CLUSTER_FOLDER}/noonmark.conf`;

/** Being ended in the middle of dpkg's work leaves packages half installed, so it gets its time. */
const STOP_STEPS = /** @type {import('./children.mjs').StopStep[]} */ ([
  { signal: 'SIGINT', waitMs: 120_000 },
  { signal: 'SIGKILL', waitMs: 5_000 },
]);

/**
 * Installs with apt those packages that are missing: as root by itself, otherwise it says how.
 *
 * @param {Lifetime} lifetime
 * @param {DebianPackage[]} wanted
 * @returns {Promise<string[]>} the names of those that were missing
 */
export async function installMissingPackages(lifetime, wanted) {
  const missing = await listMissingPackages(lifetime, wanted);
  if (missing.length === 0) return [];
  if (!existsSync('/usr/bin/apt-get')) {
    throw new Problem(`Missing, and this is no Debian: install ${missing.join(', ')} yourself.`);
  }
  if (process.getuid?.() !== 0) {
    throw new Problem(`Debian packages are missing. Run: ${describeInstallCommand(missing)}`);
  }
  const hadFolder = existsSync(NO_SYSTEM_CLUSTER_FOLDER);
  mkdirSync(NO_SYSTEM_CLUSTER_FOLDER, { recursive: true });
  writeFileSync(NO_SYSTEM_CLUSTER_FILE, 'create_main_cluster = false\n');
  const takeAway = () =>
    rmSync(hadFolder ? NO_SYSTEM_CLUSTER_FILE : NO_SYSTEM_CLUSTER_FOLDER, {
      recursive: true,
      force: true,
    });
  const forget = lifetime.hold(takeAway);
  try {
    // Finishes what an interrupted installation left half done.
    await runApt(lifetime, 'dpkg', ['--configure', '-a']);
    await runApt(lifetime, 'apt-get', ['update']);
    await runApt(lifetime, 'apt-get', ['install', '-y', '--no-install-recommends', ...missing]);
  } finally {
    forget();
    takeAway();
  }
  const stillMissing = await listMissingPackages(lifetime, wanted);
  if (stillMissing.length > 0) {
    throw new Problem(`apt-get installed ${stillMissing.join(', ')}, but their files are missing.`);
  }
  return missing;
}

/**
 * @param {string[]} names
 * @returns {string} one command line for a person to run
 */
export function describeInstallCommand(names) {
  return (
    'sudo apt-get update && ' + `sudo apt-get install -y --no-install-recommends ${names.join(' ')}`
  );
}

/**
 * @param {Lifetime} lifetime
 * @param {DebianPackage[]} wanted
 * @returns {Promise<string[]>}
 */
async function listMissingPackages(lifetime, wanted) {
  const missing = wanted.filter(({ provides }) => !existsSync(provides)).map(({ name }) => name);
  if (missing.length === wanted.length || !existsSync('/usr/bin/dpkg-query')) return missing;
  const { stdout } = await runCommand(lifetime, 'dpkg-query', [
    '--show',
    '--showformat=${Package} ${db:Status-Status}\n',
    ...wanted.map(({ name }) => name),
  ]);
  return [...missing, ...namesOfHalfInstalled(stdout).filter((name) => !missing.includes(name))];
}

/**
 * @param {string} list lines of a package's name and its state, as dpkg-query shows them
 * @returns {string[]} those whose installation was interrupted
 */
export function namesOfHalfInstalled(list) {
  return list
    .split('\n')
    .map((line) => line.split(' '))
    .filter(([, state]) => state === 'unpacked' || state?.startsWith('half-'))
    .flatMap(([name]) => name ?? []);
}

/**
 * @param {Lifetime} lifetime
 * @param {string} command
 * @param {string[]} args
 */
async function runApt(lifetime, command, args) {
  const waitForOthers = command === 'apt-get' ? ['-o', 'DPkg::Lock::Timeout=180'] : [];
  const result = await runCommand(lifetime, command, [...waitForOthers, ...args], {
    env: {
      ...process.env,
      PATH: `${process.env.PATH ?? '/usr/bin:/bin'}:/usr/local/sbin:/usr/sbin:/sbin`,
      DEBIAN_FRONTEND: 'noninteractive',
      LC_ALL: 'C.UTF-8',
    },
    stopSteps: STOP_STEPS,
  });
  if (!result.isOk) {
    throw new Problem(`${command} ${args.join(' ')} failed; its last lines:`, result.output);
  }
}
