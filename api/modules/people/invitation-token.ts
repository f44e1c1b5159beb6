import { createHash, randomBytes } from 'node:crypto';

/** A token that nobody guesses: 256 random bits. */
export function createInvitationToken(): string {
  return randomBytes(32).toString('base64url');
}

/** What the database keeps of a token. */
export function hashInvitationToken(token: string): string {
  return createHash('sha256').update(token).digest('hex');
}
