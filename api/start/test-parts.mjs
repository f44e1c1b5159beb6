import path from 'node:path';

import { showCommand } from './commands.mjs';
import { BROWSER_PACKAGES, DATABASE_PACKAGES, PDF_PACKAGES } from './debian-packages.mjs';
import { readTextOrNull } from './files.mjs';
import { templateConnectionOf } from './test-database.mjs';
import { countTests } from './vitest-counts.mjs';
import { VITE_PROGRAM } from './web-build.mjs';

/** @typedef {import('./vitest-counts.mjs').Counts} Counts */

/**
 * @typedef {object} PartContext
 * @property {import('./lifetime.mjs').Lifetime} lifetime
 * @property {string} projectFolder
 * @property {string} reportFolder for vitest's reports
 * @property {string} distFolder where the client is built for the browser tests
 * @property {string[]} filters for the names of test files
 * @property {NodeJS.ProcessEnv} environment
 */

/**
 * @typedef {object} Part
 * @property {string} name
 * @property {import('./debian-packages.mjs').DebianPackage[]} packages
 * @property {boolean} needsDatabase
 * @property {string} [needsPart] a part that must have passed before
 * @property {(context: PartContext) => Promise<Counts>} run
 */

/** A part that hangs is ended, so that the others still run. */
const LONGEST_PART_MS = 40 * 60_000;

const API_PACKAGES = [...DATABASE_PACKAGES, ...PDF_PACKAGES];

/** @type {Part[]} in the order in which `npm test` runs them */
export const PARTS = [
  check('typecheck', ['node_modules/typescript/bin/tsc', '--noEmit']),
  check('lint', ['node_modules/eslint/bin/eslint.js', '.', '--max-warnings', '0']),
  check('format', ['node_modules/prettier/bin/prettier.cjs', '--check', '.']),
  {
    name: 'unit',
    // The launcher's own tests start small clusters.
    packages: DATABASE_PACKAGES,
    needsDatabase: false,
    run: (context) => runVitest(context, 'unit', ['unit', 'web']),
  },
  {
    name: 'reference',
    packages: [],
    needsDatabase: false,
    run: (context) => runVitest(context, 'reference', ['reference']),
  },
  {
    name: 'api',
    packages: API_PACKAGES,
    needsDatabase: true,
    run: (context) => runVitest(context, 'api', ['api']),
  },
  {
    name: 'build',
    packages: [],
    needsDatabase: false,
    run: (context) =>
      runCheck({ ...context, environment: { ...context.environment, NODE_ENV: 'production' } }, [
        VITE_PROGRAM,
        'build',
        '--outDir',
        context.distFolder,
        '--emptyOutDir',
      ]),
  },
  {
    name: 'e2e',
    packages: [...API_PACKAGES, ...BROWSER_PACKAGES],
    needsDatabase: true,
    needsPart: 'build',
    run: (context) => runVitest(context, 'e2e', ['e2e']),
  },
  {
    name: 'migrations',
    packages: DATABASE_PACKAGES,
    needsDatabase: true,
    run: (context) => {
      const adminUrl = context.environment.TEST_DATABASE_ADMIN_URL ?? '';
      const environment = { ...context.environment, ...templateConnectionOf(adminUrl) };
      const program = 'node_modules/@mikro-orm/cli/cli.js';
      return runCheck({ ...context, environment }, ['--import', 'tsx', program, 'migration:check']);
    },
  },
];

/** @type {Part} too slow for every run; asked for by name */
const LONG_PART = {
  name: 'long',
  packages: API_PACKAGES,
  needsDatabase: true,
  run: (context) => runVitest(context, 'long', ['long'], Infinity),
};

/**
 * @param {string[]} args part names, and filters for the names of test files
 * @returns {{ parts: Part[], filters: string[] }} all parts but `long` when none is named, with what they need
 */
export function chooseParts(args) {
  const all = [...PARTS, LONG_PART];
  const named = all.filter((part) => args.includes(part.name));
  const filters = args.filter((arg) => !all.some((part) => part.name === arg));
  const needed = named.flatMap((part) => part.needsPart ?? []);
  const parts =
    named.length === 0
      ? PARTS
      : all.filter((part) => named.includes(part) || needed.includes(part.name));
  return { parts, filters };
}

/**
 * @param {string} name
 * @param {string[]} nodeArguments
 * @returns {Part}
 */
function check(name, nodeArguments) {
  return {
    name,
    packages: [],
    needsDatabase: false,
    run: (context) => runCheck(context, nodeArguments),
  };
}

/**
 * @param {PartContext} context
 * @param {string[]} nodeArguments
 * @returns {Promise<Counts>}
 */
async function runCheck({ lifetime, projectFolder, environment }, nodeArguments) {
  const exitCode = await showCommand(lifetime, process.execPath, nodeArguments, {
    cwd: projectFolder,
    env: environment,
    longestMs: LONGEST_PART_MS,
  });
  return exitCode === 0
    ? { passed: 1, failed: 0, note: '' }
    : { passed: 0, failed: 1, note: `exit code ${exitCode}` };
}

/**
 * @param {PartContext} context
 * @param {string} partName
 * @param {string[]} projects of vitest.config.ts
 * @param {number} longestMs
 * @returns {Promise<Counts>}
 */
async function runVitest(context, partName, projects, longestMs = LONGEST_PART_MS) {
  const { lifetime, projectFolder, reportFolder, filters, environment } = context;
  const reportFile = path.join(reportFolder, `${partName}.json`);
  const args = [
    'node_modules/vitest/vitest.mjs',
    'run',
    ...projects.map((project) => `--project=${project}`),
    '--reporter=default',
    '--reporter=json',
    `--outputFile.json=${reportFile}`,
    ...filters,
  ];
  const exitCode = await showCommand(lifetime, process.execPath, args, {
    cwd: projectFolder,
    env: environment,
    longestMs,
  });
  return countTests(readTextOrNull(reportFile), exitCode);
}
