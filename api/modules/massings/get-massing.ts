import type { EntityManager } from '@mikro-orm/postgresql';
import { AppError } from '../../errors.ts';
import type { Actor } from '../../policy.ts';
import { getCase } from '../cases/get-case.ts';
import type { ReviewCase } from '../cases/review-case.entity.ts';
import { MassingRevision } from './massing-revision.entity.ts';

/** One massing revision of a case that the person may see; throws NOT_FOUND. */
export async function getMassing(
  em: EntityManager,
  actor: Actor | null,
  reference: string,
  revision: number,
  content: 'blocks' | 'original',
): Promise<MassingRevision> {
  const reviewCase = await getCase(em, actor, reference);
  const massing = await em.findOne(
    MassingRevision,
    { reviewCase: reviewCase.id, revision },
    { populate: ['uploadedBy', content] },
  );
  if (massing === null) {
    throw new AppError('NOT_FOUND', { title: `The case has no massing revision ${revision}.` });
  }
  return massing;
}

/** The revisions of a case that the person may see, the latest first. */
export async function listMassings(
  em: EntityManager,
  actor: Actor | null,
  reference: string,
): Promise<MassingRevision[]> {
  const reviewCase = await getCase(em, actor, reference);
  return em.find(
    MassingRevision,
    { reviewCase: reviewCase.id },
    { populate: ['uploadedBy'], orderBy: { revision: 'desc' } },
  );
}

/** The case's current massing revision, or null where it has none. */
export async function findCurrentMassing(
  em: EntityManager,
  reviewCase: ReviewCase,
): Promise<MassingRevision | null> {
  return em.findOne(
    MassingRevision,
    { reviewCase: reviewCase.id },
    { populate: ['uploadedBy'], orderBy: { revision: 'desc' } },
  );
}
