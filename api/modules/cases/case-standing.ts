import type { EntityManager } from '@mikro-orm/postgresql';
import { MassingRevision } from '../massings/massing-revision.entity.ts';
import { Report } from '../reports/report.entity.ts';
import { Study } from '../studies/study.entity.ts';
import type { ReviewCase } from './review-case.entity.ts';

/** How far a case has come: what its guards ask and its summary shows. */
export interface CaseStanding {
  latestMassing: MassingRevision | null;
  /** The latest massing was uploaded before the site was picked anew. */
  isSiteNewer: boolean;
  /** The latest first. */
  studies: readonly Study[];
  /** A finished study of the latest massing. */
  hasFinishedStudy: boolean;
  /** A report on the latest massing. */
  hasReport: boolean;
}

/** The standing of each of these cases, by the case's id. */
export async function loadCaseStandings(
  em: EntityManager,
  reviewCases: readonly ReviewCase[],
): Promise<Map<string, CaseStanding>> {
  const reviewCase = { $in: reviewCases.map(({ id }) => id) };
  const massings = await em.find(
    MassingRevision,
    { reviewCase },
    { orderBy: { revision: 'desc' } },
  );
  const studies = await em.find(Study, { reviewCase }, { orderBy: { requestedAt: 'desc' } });
  const reports = await em.find(Report, { reviewCase });
  return new Map(
    reviewCases.map((one) => {
      const latestMassing = massings.find((massing) => massing.reviewCase.id === one.id) ?? null;
      const own = studies.filter((study) => study.reviewCase.id === one.id);
      return [
        one.id,
        {
          latestMassing,
          isSiteNewer: latestMassing !== null && latestMassing.createdAt < one.siteSince,
          studies: own,
          hasFinishedStudy: own.some(
            (study) => study.status === 'finished' && study.massing.id === latestMassing?.id,
          ),
          hasReport: reports.some((report) => report.massing.id === latestMassing?.id),
        },
      ];
    }),
  );
}

/** The standing of one case. */
export async function loadCaseStanding(
  em: EntityManager,
  reviewCase: ReviewCase,
): Promise<CaseStanding> {
  const standing = (await loadCaseStandings(em, [reviewCase])).get(reviewCase.id);
  if (standing === undefined) throw new Error('A case has a standing.');
  return standing;
}
