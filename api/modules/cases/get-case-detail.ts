import type { EntityManager } from '@mikro-orm/postgresql';
import type { CaseDetail } from '../../../shared/contracts/cases.ts';
import type { Actor } from '../../policy.ts';
import { Parcel } from '../base-data/parcel.entity.ts';
import { loadCaseStanding } from './case-standing.ts';
import { CaseTransition } from './case-transition.entity.ts';
import { presentCaseDetail } from './case.presenter.ts';
import type { ReviewCase } from './review-case.entity.ts';

/** The case's page for this person. */
export async function getCaseDetail(
  em: EntityManager,
  actor: Actor | null,
  reviewCase: ReviewCase,
): Promise<CaseDetail> {
  await em.populate(reviewCase, ['applicant']);
  const history = await em.find(
    CaseTransition,
    { reviewCase: reviewCase.id },
    { orderBy: { position: 'asc' } },
  );
  const parcels = await em.find(Parcel, { number: { $in: reviewCase.siteParcels } });
  return presentCaseDetail(actor, reviewCase, {
    standing: await loadCaseStanding(em, reviewCase),
    history,
    parcelAddresses: new Map(parcels.map(({ number, address }) => [number, address])),
  });
}
