import type { MikroORM } from '@mikro-orm/postgresql';
import type { Store } from 'express-session';
import type PgBoss from 'pg-boss';
import type { Logger } from 'pino';
import type { Clipper } from '../shared/shadow/clipper.ts';
import type { Env } from './env.ts';

/** What the application is wired from. */
export interface AppDeps {
  orm: MikroORM;
  env: Env;
  queue: PgBoss;
  clipper: Clipper;
  logger: Logger;
  sessionStore: Store;
}
