import { randomBytes } from 'node:crypto';
import type { EntityManager } from '@mikro-orm/postgresql';
import type { z } from 'zod';
import type { createCaseInputSchema } from '../../../shared/contracts/cases.ts';
import type { Actor } from '../../policy.ts';
import { Person } from '../people/person.entity.ts';
import { pickSite } from './pick-site.ts';
import { ReviewCase } from './review-case.entity.ts';

/** Starts an application as a draft of this applicant. */
export async function createCase(
  em: EntityManager,
  actor: Actor,
  { title, description, siteParcels }: z.output<typeof createCaseInputSchema>,
): Promise<ReviewCase> {
  return em.transactional(async (tx) => {
    const now = new Date();
    return tx.create(ReviewCase, {
      draftKey: `draft-${randomBytes(8).toString('hex')}`,
      title,
      description,
      state: 'draft',
      stateSince: now,
      applicant: await tx.findOneOrFail(Person, actor.id),
      ...(await pickSite(tx, siteParcels)),
      siteSince: now,
      createdAt: now,
    });
  });
}
