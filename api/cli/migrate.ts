import { parseEnv } from '../env.ts';
import { installJobQueue } from '../jobs/job-queue.ts';
import { createOrm, queueSchema } from '../orm.ts';

/**
 * Brings the database to the state that this version needs: migrations and the job queue. Runs as
 * the role that owns the schema, and may run as often as one likes.
 */
const env = parseEnv(process.env);
const orm = await createOrm(env.DATABASE_OWNER_URL);
try {
  const done = await orm.migrator.up();
  await installJobQueue(env.DATABASE_OWNER_URL);
  await grantQueue(roleOf(env.DATABASE_URL), roleOf(env.DATABASE_OWNER_URL));
  console.log(done.length === 0 ? 'The database is up to date.' : `Migrated: ${done.length}.`);
} finally {
  await orm.close();
}

function roleOf(databaseUrl: string): string {
  return decodeURIComponent(new URL(databaseUrl).username);
}

/** The queue lies in a schema of its own, which the application's role cannot use by itself. */
async function grantQueue(appRole: string, ownerRole: string): Promise<void> {
  if (appRole === ownerRole) return;
  const role = `"${appRole.replaceAll('"', '""')}"`;
  const connection = orm.em.getConnection();
  await connection.execute(`grant usage on schema ${queueSchema} to ${role}`);
  await connection.execute(
    `grant select, insert, update, delete on all tables in schema ${queueSchema} to ${role}`,
  );
}
