import { LockMode } from '@mikro-orm/core';
import type { EntityManager } from '@mikro-orm/postgresql';
import type { z } from 'zod';
import type { updateCaseInputSchema } from '../../../shared/contracts/cases.ts';
import type { Actor } from '../../policy.ts';
import { getCaseFor, requireOnCase } from './get-case.ts';
import { pickSite } from './pick-site.ts';
import { ReviewCase } from './review-case.entity.ts';

/** Changes what the applicant wrote; fields that are left out stay. */
export async function updateCase(
  em: EntityManager,
  actor: Actor,
  reference: string,
  { title, description, siteParcels }: z.output<typeof updateCaseInputSchema>,
): Promise<ReviewCase> {
  const seen = await getCaseFor(em, actor, reference, 'edit');
  return em.transactional(async (tx) => {
    const reviewCase = await tx.findOneOrFail(ReviewCase, seen.id, {
      lockMode: LockMode.PESSIMISTIC_WRITE,
      refresh: true,
    });
    // It may have been submitted since it was looked at.
    requireOnCase(actor, 'edit', reviewCase);
    if (title !== undefined) reviewCase.title = title;
    if (description !== undefined) reviewCase.description = description;
    if (siteParcels !== undefined && isOtherSite(reviewCase.siteParcels, siteParcels)) {
      tx.assign(reviewCase, { ...(await pickSite(tx, siteParcels)), siteSince: new Date() });
    }
    return reviewCase;
  });
}

function isOtherSite(before: readonly string[], after: readonly string[]): boolean {
  return [...new Set(before)].sort().join('\n') !== [...new Set(after)].sort().join('\n');
}
