import type { EntityManager } from '@mikro-orm/postgresql';
import { createInvitationToken, hashInvitationToken } from './invitation-token.ts';
import { Invitation } from './invitation.entity.ts';
import { Person } from './person.entity.ts';

const invitationLastsMs = 48 * 3_600_000;

/**
 * The token of a one-time link for the first administrator; an earlier link that was not used ends.
 * Null when there is an administrator already.
 */
export async function inviteFirstAdministrator(
  em: EntityManager,
  now: Date,
): Promise<string | null> {
  return em.transactional(async (tx) => {
    if ((await tx.count(Person, { role: 'administrator' })) > 0) return null;
    await tx.nativeDelete(Invitation, { role: 'administrator', acceptedAt: null });
    const token = createInvitationToken();
    tx.create(Invitation, {
      role: 'administrator',
      tokenHash: hashInvitationToken(token),
      createdAt: now,
      expiresAt: new Date(now.getTime() + invitationLastsMs),
    });
    return token;
  });
}
