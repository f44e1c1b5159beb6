import type { EntityManager } from '@mikro-orm/postgresql';
import type PgBoss from 'pg-boss';
import type { JobDefinition } from './job-definitions.ts';

/**
 * Puts a job into the queue on the transaction of `em`: it is there when the transaction commits,
 * and was never there when it rolls back.
 */
export async function enqueueJob<Payload extends object>(
  em: EntityManager,
  queue: PgBoss,
  definition: JobDefinition<Payload>,
  payload: Payload,
): Promise<void> {
  if (!em.isInTransaction()) throw new Error('A job is enqueued inside a transaction.');
  const id = await queue.send(definition.id, definition.payload.parse(payload), {
    db: { executeSql: (text, values) => execute(em, text, values) },
  });
  if (id === null) throw new Error(`The queue took no job ${definition.id}.`);
}

/** Runs a statement with the placeholders $1, $2 … by way of the ORM, which writes them as question marks. */
async function execute(
  em: EntityManager,
  text: string,
  values: unknown[],
): Promise<{ rows: unknown[] }> {
  const ordered: unknown[] = [];
  const sql = text.replace(/\?/g, '\\?').replace(/\$(\d+)/g, (_, position: string) => {
    ordered.push(values[Number(position) - 1] ?? null);
    return '?';
  });
  return { rows: await em.execute<unknown[]>(sql, ordered) };
}
