import type { EntityManager } from '@mikro-orm/postgresql';
import { AppError } from '../../errors.ts';
import type { Actor } from '../../policy.ts';
import { caseFacts, getCase, requireOnCase } from '../cases/get-case.ts';
import { Study } from './study.entity.ts';
import { maySeeStudy } from './study.policy.ts';

type Content = 'evidence' | 'findingRows';

/** The study, where the person may see it; throws NOT_FOUND. */
export async function getStudy(
  em: EntityManager,
  actor: Actor | null,
  id: string,
  content: readonly Content[] = [],
): Promise<Study> {
  const study = await em.findOne(Study, id, {
    populate: ['reviewCase', 'massing', 'ruleVersion', ...content],
  });
  if (study === null || !maySeeStudy(actor, caseFacts(study.reviewCase), study.status)) {
    throw new AppError('NOT_FOUND', { title: 'There is no such study, or it is not public.' });
  }
  return study;
}

/** The same for what only a finished study has; throws STUDY_NOT_FINISHED. */
export async function getFinishedStudy(
  em: EntityManager,
  actor: Actor | null,
  id: string,
  content: readonly Content[] = [],
): Promise<Study> {
  const study = await getStudy(em, actor, id, content);
  if (study.status !== 'finished') throw new AppError('STUDY_NOT_FINISHED');
  return study;
}

/** The studies of a case that the person may see, the latest first. */
export async function listStudies(
  em: EntityManager,
  actor: Actor | null,
  reference: string,
): Promise<Study[]> {
  const reviewCase = await getCase(em, actor, reference);
  requireOnCase(actor, 'read-study', reviewCase);
  const studies = await em.find(
    Study,
    { reviewCase: reviewCase.id },
    {
      populate: ['reviewCase', 'massing', 'ruleVersion'],
      orderBy: { requestedAt: 'desc', id: 'desc' },
    },
  );
  const facts = caseFacts(reviewCase);
  return studies.filter(({ status }) => maySeeStudy(actor, facts, status));
}
