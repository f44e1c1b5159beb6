import connectPgSimple from 'connect-pg-simple';
import type { RequestHandler } from 'express';
import session from 'express-session';
import type { Store } from 'express-session';
import type { Env } from '../env.ts';
import { sessionTable } from '../orm.ts';

const dayMs = 86_400_000;

declare module 'express-session' {
  interface SessionData {
    personId: string;
  }
}

/** A store of sessions in PostgreSQL; the caller closes it. */
export function createSessionStore(databaseUrl: string): Store & { close(): void } {
  const PostgresStore = connectPgSimple(session);
  return new PostgresStore({
    conObject: { connectionString: databaseUrl, max: 4 },
    tableName: sessionTable,
    createTableIfMissing: false,
  });
}

export const sessionCookie = 'noonmark.session';

/** Reads and writes the session; nobody has one before signing in. */
export function sessions(env: Env, store: Store): RequestHandler {
  return session({
    store,
    name: sessionCookie,
    secret: env.SESSION_SECRET,
    resave: false,
    saveUninitialized: false,
    cookie: {
      httpOnly: true,
      sameSite: 'lax',
      secure: env.PUBLIC_URL.startsWith('https:'),
      maxAge: 14 * dayMs,
    },
  });
}
