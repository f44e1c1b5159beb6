import path from 'node:path';
import { z } from 'zod';

const rootFolder = path.resolve(import.meta.dirname, '..');

const envSchema = z
  .object({
    NODE_ENV: z.enum(['development', 'test', 'production']).default('development'),
    DATABASE_URL: z.url(),
    /** The role that owns the schema: migrations and the seed. */
    DATABASE_OWNER_URL: z.url().optional(),
    HOST: z.string().default('127.0.0.1'),
    PORT: z.coerce.number().int().min(0).max(65535).default(8080),
    /** The address at which people open this server; links and the origin check follow it. */
    PUBLIC_URL: z.url().default('http://127.0.0.1:8080'),
    SESSION_SECRET: z.string().min(32, 'Use at least 32 random characters.'),
    /** The folder for files that the server writes. */
    NOONMARK_DATA: z.string().default(path.join(rootFolder, '.noonmark')),
    WEB_DIST: z.string().default('dist'),
    LOG_LEVEL: z
      .enum(['fatal', 'error', 'warn', 'info', 'debug', 'trace', 'silent'])
      .default('info'),
    /** How many reverse proxies stand in front and set X-Forwarded-For. */
    TRUSTED_PROXIES: z.coerce.number().int().min(0).max(5).default(0),
  })
  .transform((env) => ({
    ...env,
    DATABASE_OWNER_URL: env.DATABASE_OWNER_URL ?? env.DATABASE_URL,
    WEB_DIST: path.resolve(rootFolder, env.WEB_DIST),
  }));

export type Env = z.output<typeof envSchema>;

/** The settings of this process, read once at its start; says all that is wrong with them. */
export function parseEnv(variables: NodeJS.ProcessEnv): Env {
  const result = envSchema.safeParse(variables);
  if (result.success) return result.data;
  const lines = result.error.issues.map((issue) => `  ${issue.path.join('.')}: ${issue.message}`);
  throw new Error(`The environment is not complete:\n${lines.join('\n')}`);
}
