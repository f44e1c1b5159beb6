import PgBoss from 'pg-boss';
import { queueSchema } from '../orm.ts';
import { jobDefinitions } from './job-definitions.ts';

/**
 * The queue as the servers and the workers use it: its tables are there already, and nothing is
 * scheduled by the clock. The caller starts and stops it.
 */
export function createJobQueue(connectionString: string, options: { supervise: boolean }): PgBoss {
  return new PgBoss({
    connectionString,
    schema: queueSchema,
    migrate: false,
    schedule: false,
    supervise: options.supervise,
    maintenanceIntervalSeconds: 30,
    max: 4,
  });
}

/** Makes or upgrades the queue's schema and one queue for each kind of job; run by the schema's owner. */
export async function installJobQueue(ownerConnectionString: string): Promise<void> {
  const boss = new PgBoss({
    connectionString: ownerConnectionString,
    schema: queueSchema,
    migrate: true,
    schedule: false,
    supervise: false,
    max: 1,
  });
  await boss.start();
  try {
    for (const { id, queue } of jobDefinitions) {
      await boss.createQueue(id, { name: id, ...queue });
      await boss.updateQueue(id, { name: id, ...queue });
    }
  } finally {
    await boss.stop({ graceful: false });
  }
}
