import path from 'node:path';
import { Migrator } from '@mikro-orm/migrations';
import { defineConfig, MikroORM } from '@mikro-orm/postgresql';
import type { Options } from '@mikro-orm/postgresql';
import { entities } from './entities.ts';

const migrationsFolder = path.join(import.meta.dirname, 'migrations');

/** The table in which connect-pg-simple keeps sessions; made by the first migration. */
export const sessionTable = 'session';

/** The schema of the job queue; made by `api/cli/migrate.ts`. */
export const queueSchema = 'pgboss';

/** The options of the ORM for one connection; the command line and the servers share them. */
export function ormOptions(clientUrl: string): Options {
  return defineConfig({
    clientUrl,
    entities,
    extensions: [Migrator],
    forceUtcTimezone: true,
    discovery: { warnWhenNoEntities: true },
    migrations: {
      path: migrationsFolder,
      pathTs: migrationsFolder,
      emit: 'ts',
      // Without a name the snapshot is called after the database and differs on each machine.
      snapshotName: '.snapshot-noonmark',
      silent: true,
    },
    schemaGenerator: {
      ignoreSchema: [queueSchema, 'tiger', 'tiger_data', 'topology'],
      skipTables: [sessionTable, 'spatial_ref_sys'],
    },
  });
}

/** Opens the database; the caller closes it. */
export async function createOrm(clientUrl: string): Promise<MikroORM> {
  const options = ormOptions(clientUrl);
  // The snapshot is for writing migrations; applying them must not touch the source tree.
  return MikroORM.init({ ...options, migrations: { ...options.migrations, snapshot: false } });
}
