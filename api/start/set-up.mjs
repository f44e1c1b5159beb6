import { appEnvironment, withOwner } from './app-environment.mjs';
import { runCommand } from './commands.mjs';
import { DATABASE_PACKAGES, installMissingPackages } from './debian-packages.mjs';
import { installNodeModules } from './node-modules.mjs';
import { startOwnDatabase } from './own-database.mjs';
import { Problem } from './problem.mjs';
import { readOrMakeSecrets, readSecrets } from './secrets.mjs';
import { describeDatabase } from './settings.mjs';

/** @typedef {import('./lifetime.mjs').Lifetime} Lifetime */
/** @typedef {import('./say.mjs').Say} Say */
/** @typedef {import('./settings.mjs').Settings} Settings */

/**
 * @typedef {object} ReadyDatabase
 * @property {import('./settings.mjs').Connection} connection
 * @property {Promise<unknown>} ended never, for a database that isn't ours
 */

/**
 * All that `npm start` and `npm run dev` share: packages, node modules, database, migrations and
 * the demo data, or in production the link for the first administrator.
 *
 * @param {Lifetime} lifetime
 * @param {Say} say
 * @param {Settings} settings
 * @returns {Promise<{ environment: NodeJS.ProcessEnv, databaseEnded: Promise<unknown> }>}
 */
export async function setUp(lifetime, say, settings) {
  const { projectFolder, dataFolder } = settings;
  if (readSecrets(dataFolder) === null) say.line('The first start takes a few minutes.');
  if (!settings.operatorDatabase) {
    await installPackagesStep(lifetime, say, DATABASE_PACKAGES);
  }
  await installNodeModulesStep(lifetime, say, projectFolder);
  const { connection, ended } = await startDatabaseStep(lifetime, say, settings);

  const sessionSecret =
    settings.sessionSecret ?? readOrMakeSecrets(dataFolder, () => false).sessionSecret;
  const environment = appEnvironment(settings, connection, sessionSecret);
  const runCli = (/** @type {string} */ name) =>
    runCliProgram(lifetime, projectFolder, name, withOwner(environment, connection));

  await say.step(
    'Migrations',
    () => runCli('migrate'),
    () => 'up to date',
  );
  if (settings.isProduction) {
    const invitation = () => runCli('invite-first-administrator');
    say.block(await say.step('Administrator', invitation, () => 'looked after'));
  } else {
    say.block(
      await say.step(
        'Demo data',
        () => runCli('seed-demo'),
        () => 'ready',
      ),
    );
  }
  return { environment, databaseEnded: ended };
}

/**
 * @param {Lifetime} lifetime
 * @param {Say} say
 * @param {import('./debian-packages.mjs').DebianPackage[]} packages
 */
export async function installPackagesStep(lifetime, say, packages) {
  await say.step(
    'Packages',
    () => installMissingPackages(lifetime, packages),
    (installed) => (installed.length === 0 ? 'present' : `installed ${installed.join(', ')}`),
  );
}

/**
 * @param {Lifetime} lifetime
 * @param {Say} say
 * @param {string} projectFolder
 */
export async function installNodeModulesStep(lifetime, say, projectFolder) {
  const install = () => installNodeModules(lifetime, projectFolder);
  await say.step('Node modules', install, (state) => state);
}

/**
 * @param {Lifetime} lifetime
 * @param {Say} say
 * @param {Settings} settings
 * @returns {Promise<ReadyDatabase>}
 */
async function startDatabaseStep(lifetime, say, { operatorDatabase, dataFolder }) {
  if (operatorDatabase) {
    say.line(`  Database      given by DATABASE_URL, ${describeDatabase(operatorDatabase.appUrl)}`);
    return { connection: operatorDatabase, ended: new Promise(() => undefined) };
  }
  return say.step(
    'Database',
    () => startOwnDatabase(lifetime, dataFolder),
    ({ port, isNew }) => `${isNew ? 'made and ' : ''}started on 127.0.0.1:${port}`,
  );
}

/**
 * @param {Lifetime} lifetime
 * @param {string} projectFolder
 * @param {string} name of a file in api/cli
 * @param {NodeJS.ProcessEnv} env
 * @returns {Promise<string>} what it printed to standard output
 */
export async function runCliProgram(lifetime, projectFolder, name, env) {
  const args = ['--import', 'tsx', `api/cli/${name}.ts`];
  const result = await runCommand(lifetime, process.execPath, args, { cwd: projectFolder, env });
  if (!result.isOk) throw new Problem(`api/cli/${name}.ts failed; its last lines:`, result.output);
  return result.stdout;
}
