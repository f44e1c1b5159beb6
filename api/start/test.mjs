import './node-version.mjs';

import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';

import { Stopped } from './lifetime.mjs';
import { Problem } from './problem.mjs';
import { runProgram } from './program.mjs';
import { tailOf } from './say.mjs';
import { installNodeModulesStep, installPackagesStep } from './set-up.mjs';
import { readSettings } from './settings.mjs';
import { startTestDatabase } from './test-database.mjs';
import { readTestEnvironment } from './test-environment.mjs';
import { chooseParts } from './test-parts.mjs';
import { renderSummary } from './test-summary.mjs';

/** @typedef {import('./test-parts.mjs').Part} Part */
/** @typedef {import('./test-parts.mjs').PartContext} PartContext */
/** @typedef {import('./test-summary.mjs').PartResult} PartResult */

/** `npm test [-- PART… FILTER…]`: sets up what the parts need, runs them one after another, sums up. */
await runProgram(
  async (lifetime, say) => {
    const { parts, filters } = chooseParts(process.argv.slice(2));
    const { projectFolder } = readSettings({});
    const { dataFolder, environment } = readTestEnvironment(process.env, projectFolder);
    say.line('Noonmark, tests');
    await installNodeModulesStep(lifetime, say, projectFolder);
    const packages = [...new Set(parts.flatMap((part) => part.packages))];
    if (packages.length > 0) await installPackagesStep(lifetime, say, packages);
    const reportFolder = mkdtempSync(path.join(tmpdir(), 'noonmark-reports-'));
    lifetime.hold(() => rmSync(reportFolder, { recursive: true, force: true }));

    /** @type {PartContext} */
    const context = {
      lifetime,
      projectFolder,
      reportFolder,
      distFolder: path.join(dataFolder, 'dist'),
      filters,
      environment,
    };
    const databaseProblem = parts.some((part) => part.needsDatabase)
      ? await startDatabaseStep(context, say, dataFolder)
      : null;

    /** @type {PartResult[]} */
    const results = [];
    for (const part of parts) {
      say.line(`\n== ${part.name}`);
      const startedMs = Date.now();
      const missing = describeMissing(part, results, databaseProblem);
      if (missing) say.line(missing);
      const counts = missing ? { passed: 0, failed: 1, note: missing } : await part.run(context);
      results.push({ name: part.name, ...counts, durationMs: Date.now() - startedMs });
    }
    say.line(`\n${renderSummary(results)}`);
    return results.some((result) => result.failed > 0) ? 1 : 0;
  },
  { signalExitCode: 130 },
);

/**
 * Puts the database's variables into the context. Its failure fails the parts that need it, not the others.
 *
 * @param {PartContext} context
 * @param {import('./say.mjs').Say} say
 * @param {string} dataFolder
 * @returns {Promise<string | null>} what went wrong
 */
async function startDatabaseStep(context, say, dataFolder) {
  const { lifetime, projectFolder, environment } = context;
  try {
    const variables = await say.step(
      'Test database',
      () => startTestDatabase(lifetime, projectFolder, dataFolder, environment),
      () => 'migrated',
    );
    context.environment = { ...environment, ...variables, WEB_DIST: context.distFolder };
    return null;
  } catch (error) {
    if (error instanceof Stopped || !(error instanceof Problem)) throw error;
    say.line(error.message);
    say.block(tailOf(error.output));
    return error.message;
  }
}

/**
 * @param {Part} part
 * @param {PartResult[]} results of the parts before
 * @param {string | null} databaseProblem
 * @returns {string | null} why the part can't run
 */
function describeMissing(part, results, databaseProblem) {
  const before = results.find((result) => result.name === part.needsPart);
  if (before && before.failed > 0) return `${before.name} failed`;
  return part.needsDatabase ? databaseProblem : null;
}
