import path from 'node:path';

/** @typedef {import('./settings.mjs').Settings} Settings */
/** @typedef {import('./settings.mjs').Connection} Connection */

/**
 * The environment of the server, the workers and the commands in api/cli; api/env.ts reads it.
 *
 * @param {Settings} settings
 * @param {Connection} connection
 * @param {string} sessionSecret
 * @returns {NodeJS.ProcessEnv} without the schema owner's connection, see {@link withOwner}
 */
export function appEnvironment(settings, connection, sessionSecret) {
  return {
    ...process.env,
    // The running application must not be able to change the schema.
    DATABASE_OWNER_URL: undefined,
    DATABASE_URL: connection.appUrl,
    HOST: settings.host,
    PORT: String(settings.port),
    PUBLIC_URL: settings.publicUrl,
    SESSION_SECRET: sessionSecret,
    NOONMARK_DATA: settings.dataFolder,
    WEB_DIST: path.join(settings.projectFolder, 'dist'),
  };
}

/**
 * @param {NodeJS.ProcessEnv} environment
 * @param {Connection} connection
 * @returns {NodeJS.ProcessEnv} for commands that change the schema or the roles' rights
 */
export function withOwner(environment, { ownerUrl }) {
  return { ...environment, DATABASE_OWNER_URL: ownerUrl };
}
