import { appEnvironment, withOwner } from './app-environment.mjs';
import { readLock } from './lock-file.mjs';
import { readOwnConnection } from './own-database.mjs';
import { Problem } from './problem.mjs';
import { readSecrets } from './secrets.mjs';

/** @typedef {import('./settings.mjs').Settings} Settings */

/**
 * The environment of a further program beside a running start, or beside the database that DATABASE_URL names.
 *
 * @param {Settings} settings
 * @returns {{ environment: NodeJS.ProcessEnv, ownerEnvironment: NodeJS.ProcessEnv }}
 */
export function readRunningEnvironment(settings) {
  const { dataFolder, operatorDatabase } = settings;
  const lock = readLock(dataFolder);
  const secrets = readSecrets(dataFolder);
  const isRunning = lock.state === 'taken';
  const connection =
    operatorDatabase ?? (isRunning && secrets ? readOwnConnection(dataFolder, secrets) : null);
  const sessionSecret = settings.sessionSecret ?? secrets?.sessionSecret;
  if (!connection) {
    throw new Problem(
      `Noonmark isn't running with the data folder ${dataFolder}. Start it first with npm start, or set DATABASE_URL.`,
    );
  }
  if (!sessionSecret) {
    throw new Problem(
      'Set SESSION_SECRET to that of the running server: this data folder has none.',
    );
  }
  // Links in mails shall point to the running server, wherever it was started.
  const publicUrl =
    isRunning && !process.env.PUBLIC_URL ? lock.owner.publicUrl : settings.publicUrl;
  const environment = appEnvironment({ ...settings, publicUrl }, connection, sessionSecret);
  return { environment, ownerEnvironment: withOwner(environment, connection) };
}
