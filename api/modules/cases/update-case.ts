import type { EntityManager } from '@mikro-orm/postgresql';
import type { z } from 'zod';
import type { updateCaseInputSchema } from '../../../shared/contracts/cases.ts';
import type { Actor } from '../../policy.ts';
import { getCaseFor } from './get-case.ts';
import { lockCaseFor } from './lock-case.ts';
import { pickSite } from './pick-site.ts';
import type { ReviewCase } from './review-case.entity.ts';

/** Changes what the applicant wrote; fields that are left out stay. */
export async function updateCase(
  em: EntityManager,
  actor: Actor,
  reference: string,
  { title, description, siteParcels }: z.output<typeof updateCaseInputSchema>,
): Promise<ReviewCase> {
  const seen = await getCaseFor(em, actor, reference, 'edit');
  return em.transactional(async (tx) => {
    const reviewCase = await lockCaseFor(tx, actor, seen.id, 'edit');
    if (title !== undefined) reviewCase.title = title;
    if (description !== undefined) reviewCase.description = description;
    if (siteParcels !== undefined && isOtherSite(reviewCase.siteParcels, siteParcels)) {
      Object.assign(reviewCase, await pickSite(tx, siteParcels));
      reviewCase.siteSince = new Date();
    }
    return reviewCase;
  });
}

function isOtherSite(before: readonly string[], after: readonly string[]): boolean {
  return [...new Set(before)].sort().join('\n') !== [...new Set(after)].sort().join('\n');
}
