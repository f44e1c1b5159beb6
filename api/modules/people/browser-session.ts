import type { Request } from 'express';

/** Begins a session for this person under a new id: one that was planted before is worth nothing. */
export async function beginSession(request: Request, personId: string): Promise<void> {
  const { session } = request;
  await new Promise<void>((resolve, reject) => {
    session.regenerate((error: unknown) => settle(error, resolve, reject));
  });
  request.session.personId = personId;
  await new Promise<void>((resolve, reject) => {
    request.session.save((error: unknown) => settle(error, resolve, reject));
  });
}

/** Ends the session here and in the database. */
export async function endSession(request: Request): Promise<void> {
  await new Promise<void>((resolve, reject) => {
    request.session.destroy((error: unknown) => settle(error, resolve, reject));
  });
}

function settle(error: unknown, resolve: () => void, reject: (error: Error) => void): void {
  if (error === undefined || error === null) resolve();
  else reject(error instanceof Error ? error : new Error('The session could not be kept.'));
}
