import type { MikroORM } from '@mikro-orm/postgresql';
import type PgBoss from 'pg-boss';
import type { Logger } from 'pino';
import type { Clipper } from '../../shared/shadow/clipper.ts';

/** What handlers are given. */
export interface JobContext {
  orm: MikroORM;
  queue: PgBoss;
  clipper: Clipper;
  logger: Logger;
  /** Aborted when the worker has to stop: long work is then handed back. */
  stopping: AbortSignal;
}
