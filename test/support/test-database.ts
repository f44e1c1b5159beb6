import { execFile } from 'node:child_process';
import { randomBytes } from 'node:crypto';
import { promisify } from 'node:util';
import { POSTGRES_PROGRAMS, postgresEnvironment } from '../../api/start/cluster-files.mjs';
import { APP_ROLE, OWNER_ROLE, databaseUrl } from '../../api/start/database.mjs';

const run = promisify(execFile);

/** A database of its own for a test file: migrated, empty, with the two roles of the real one. */
export interface TestDatabase {
  name: string;
  /** As the role that runs the application. */
  appUrl: string;
  /** As the role that owns the schema. */
  ownerUrl: string;
  /** Ends its connections and removes it. */
  drop: () => Promise<void>;
}

/** Copies the template database, which takes a fraction of a second. */
export async function createTestDatabase(): Promise<TestDatabase> {
  const template = readVariable('TEST_DATABASE_TEMPLATE');
  const port = Number(new URL(readVariable('TEST_DATABASE_ADMIN_URL')).port);
  const name = `test_${randomBytes(6).toString('hex')}`;
  await runSql(`create database ${name} template ${template} owner ${OWNER_ROLE}`);
  return {
    name,
    appUrl: databaseUrl({ role: APP_ROLE, port, database: name }),
    ownerUrl: databaseUrl({ role: OWNER_ROLE, port, database: name }),
    drop: () => runSql(`drop database if exists ${name} with (force)`),
  };
}

async function runSql(sql: string): Promise<void> {
  const adminUrl = readVariable('TEST_DATABASE_ADMIN_URL');
  const args = ['--no-psqlrc', '--quiet', '--no-password', '--set=ON_ERROR_STOP=1'];
  await run(`${POSTGRES_PROGRAMS}/psql`, [...args, `--dbname=${adminUrl}`, `--command=${sql}`], {
    env: postgresEnvironment(),
  });
}

/** A variable that `npm test` sets for tests. */
export function readVariable(name: string): string {
  const value = process.env[name];
  if (!value) {
    throw new Error(
      `${name} is not set. Tests with a database run by npm run test:api -- FILE, which starts one.`,
    );
  }
  return value;
}
