import { pino } from 'pino';
import type { DestinationStream, Logger } from 'pino';
import type { Env } from './env.ts';

/** The log of one process: JSON lines, on stdout if nowhere else. */
export function createLogger(
  env: Pick<Env, 'LOG_LEVEL'>,
  destination: DestinationStream = pino.destination(),
): Logger {
  return pino(
    {
      level: env.LOG_LEVEL,
      base: null,
      timestamp: pino.stdTimeFunctions.isoTime,
      serializers: { err: serializeError },
    },
    destination,
  );
}

/**
 * An error without the values that people sent: the message of a database error repeats the query
 * with its parameters, so its code, constraint and frames stand for it.
 */
export function serializeError(error: unknown): Record<string, unknown> {
  if (!(error instanceof Error)) return { type: typeof error };
  const code = readString(error, 'code');
  const constraint = readString(error, 'constraint');
  const isFromDatabase = readString(error, 'severity') !== undefined || 'sqlMessage' in error;
  const frames = (error.stack ?? '').split('\n').filter((line) => /^\s+at /.test(line));
  return {
    type: error.name === 'Error' ? error.constructor.name : error.name,
    ...(isFromDatabase ? {} : { message: error.message }),
    ...(code === undefined ? {} : { code }),
    ...(constraint === undefined ? {} : { constraint }),
    stack: frames.join('\n'),
  };
}

function readString(error: Error, name: string): string | undefined {
  const value: unknown = Reflect.get(error, name);
  return typeof value === 'string' ? value : undefined;
}
