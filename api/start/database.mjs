import { POSTGRES_PROGRAMS, SUPERUSER, postgresEnvironment } from './cluster-files.mjs';
import { runCommand } from './commands.mjs';
import { Problem } from './problem.mjs';

/** @typedef {import('./lifetime.mjs').Lifetime} Lifetime */
/** @typedef {{ port: number, superuserPassword?: string }} Server on 127.0.0.1; no password where it trusts all */

export const DATABASE_NAME = 'noonmark';
export const OWNER_ROLE = 'noonmark_owner';
export const APP_ROLE = 'noonmark_app';

/**
 * Makes or mends the two roles: one owns the schema and migrates, one runs the application.
 *
 * @param {Lifetime} lifetime
 * @param {Server} server
 * @param {{ ownerPassword: string, appPassword: string }} passwords
 */
export async function makeRoles(lifetime, server, { ownerPassword, appPassword }) {
  const makeRole = (/** @type {string} */ role, /** @type {string} */ password) => `
    select 'create role ${role}'
      where not exists (select from pg_roles where rolname = '${role}') \\gexec
    alter role ${role} login nosuperuser nocreatedb nocreaterole password '${password}';`;
  await runSql(
    lifetime,
    server,
    'postgres',
    makeRole(OWNER_ROLE, ownerPassword) + makeRole(APP_ROLE, appPassword),
  );
}

/**
 * Makes or mends a database: PostGIS, which only a superuser can add, and what the application's
 * role may do with the tables that the owner makes. Migrations take single rights away again.
 *
 * @param {Lifetime} lifetime
 * @param {Server} server
 * @param {string} name
 */
export async function makeDatabase(lifetime, server, name) {
  await runSql(
    lifetime,
    server,
    'postgres',
    `select 'create database ${name} owner ${OWNER_ROLE} template template0'
      where not exists (select from pg_database where datname = '${name}') \\gexec`,
  );
  await runSql(
    lifetime,
    server,
    name,
    `set client_min_messages = warning;
    revoke all on database ${name} from public;
    grant connect, temporary on database ${name} to ${APP_ROLE};
    create extension if not exists postgis;
    grant usage on schema public to ${APP_ROLE};
    alter default privileges for role ${OWNER_ROLE} in schema public
      grant select, insert, update, delete on tables to ${APP_ROLE};
    alter default privileges for role ${OWNER_ROLE} in schema public
      grant usage, select on sequences to ${APP_ROLE};`,
  );
}

/**
 * @param {Lifetime} lifetime
 * @param {Server} server
 * @param {string} database
 * @param {string} sql goes in by standard input, so that no password shows in the list of processes
 */
async function runSql(lifetime, { port, superuserPassword = '' }, database, sql) {
  const result = await runCommand(
    lifetime,
    `${POSTGRES_PROGRAMS}/psql`,
    [
      ...['--no-psqlrc', '--quiet', '--no-password', '--set=ON_ERROR_STOP=1'],
      ...['--host=127.0.0.1', `--port=${port}`, `--username=${SUPERUSER}`, `--dbname=${database}`],
    ],
    { input: sql, env: postgresEnvironment({ PGPASSWORD: superuserPassword }) },
  );
  if (!result.isOk) {
    throw new Problem(`The database ${database} could not be set up:`, result.output);
  }
}

/**
 * @param {{ role: string, password?: string, port: number, database?: string }} parts
 * @returns {string}
 */
export function databaseUrl({ role, password, port, database = DATABASE_NAME }) {
  return `postgresql://${role}${password ? `:${password}` : ''}@127.0.0.1:${port}/${database}`;
}
