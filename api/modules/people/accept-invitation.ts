import { LockMode, UniqueConstraintViolationException } from '@mikro-orm/core';
import type { EntityManager } from '@mikro-orm/postgresql';
import type { AcceptInvitationInput } from '../../../shared/contracts/people.ts';
import { AppError } from '../../errors.ts';
import { hashInvitationToken } from './invitation-token.ts';
import { Invitation } from './invitation.entity.ts';
import { hashPassword } from './passwords.ts';
import { Person } from './person.entity.ts';

/** Makes the invited person, once for each link. Throws NOT_FOUND for a link that is used up, too old or made up. */
export async function acceptInvitation(
  em: EntityManager,
  input: AcceptInvitationInput,
  now: Date,
): Promise<Person> {
  const passwordHash = await hashPassword(input.password);
  try {
    return await em.transactional(async (tx) => {
      const invitation = await tx.findOne(
        Invitation,
        { tokenHash: hashInvitationToken(input.token), acceptedAt: null, expiresAt: { $gt: now } },
        { lockMode: LockMode.PESSIMISTIC_WRITE },
      );
      if (invitation === null) {
        throw new AppError('NOT_FOUND', {
          title: 'This invitation is used up or too old. Ask for a new one.',
        });
      }
      invitation.acceptedAt = now;
      return tx.create(Person, {
        email: input.email.trim().toLowerCase(),
        name: input.name,
        role: invitation.role,
        passwordHash,
        createdAt: now,
      });
    });
  } catch (error) {
    if (!(error instanceof UniqueConstraintViolationException)) throw error;
    throw new AppError('INPUT_INVALID', {
      errors: [{ path: 'email', message: 'Somebody has an account with this e-mail address.' }],
    });
  }
}
