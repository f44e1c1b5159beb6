import { publicCaseStates } from '../../../shared/contracts/case-life.ts';
import type { CaseDetail, CaseSummary } from '../../../shared/contracts/cases.ts';
import { abilitiesOnCase, transitionsOnCase } from '../../policy.ts';
import type { Actor } from '../../policy.ts';
import type { Study } from '../studies/study.entity.ts';
import { maySeeStudy } from '../studies/study.policy.ts';
import type { CaseStanding } from './case-standing.ts';
import type { CaseTransition } from './case-transition.entity.ts';
import { caseFacts } from './get-case.ts';
import type { ReviewCase } from './review-case.entity.ts';
import { findObstacle } from './transition-guards.ts';

/** A case as a row of a list, as this person may see it. Its applicant is loaded. */
export function presentCaseSummary(
  actor: Actor | null,
  reviewCase: ReviewCase,
  standing: CaseStanding,
): CaseSummary {
  const { latestMassing, studies } = standing;
  const [longitude = 0, latitude = 0] = reviewCase.sitePoint.coordinates;
  const facts = caseFacts(reviewCase);
  const latestStudy = studies.find(({ status }) => maySeeStudy(actor, facts, status));
  return {
    reference: reviewCase.number ?? reviewCase.draftKey,
    number: reviewCase.number ?? null,
    title: reviewCase.title,
    address: reviewCase.address,
    state: reviewCase.state,
    stateSince: reviewCase.stateSince.toISOString(),
    applicantName: reviewCase.applicant.name,
    sitePoint: [longitude, latitude],
    latestRevision: latestMassing?.revision ?? null,
    heightM: latestMassing?.figures.heightM ?? null,
    storeys: latestMassing?.figures.storeys ?? null,
    latestStudy: latestStudy === undefined ? null : presentStudyInBrief(latestStudy),
  };
}

/** What the case page needs beyond the summary. */
export interface CaseBackground {
  standing: CaseStanding;
  /** In the order in which they happened. */
  history: readonly CaseTransition[];
  parcelAddresses: ReadonlyMap<string, string>;
}

/** A case with its history and what this person may do with it. */
export function presentCaseDetail(
  actor: Actor | null,
  reviewCase: ReviewCase,
  { standing, history, parcelAddresses }: CaseBackground,
): CaseDetail {
  const facts = caseFacts(reviewCase);
  // What staff and applicant write to each other before publication is not for the public.
  const isInside = actor !== null && (actor.role !== 'applicant' || actor.id === facts.applicantId);
  const sentBack = reviewCase.state === 'sent-back' ? history.at(-1) : undefined;
  return {
    ...presentCaseSummary(actor, reviewCase, standing),
    description: reviewCase.description,
    siteParcels: reviewCase.siteParcels.map((number) => ({
      number,
      address: parcelAddresses.get(number) ?? '',
    })),
    site: reviewCase.site,
    correction:
      sentBack === undefined
        ? null
        : { reason: sentBack.reason ?? '', dueDate: sentBack.dueDate ?? null },
    history: history.map(({ from, to, at, byRole, reason }) => ({
      from,
      to,
      at: at.toISOString(),
      byRole,
      reason: isInside || publicCaseStates.includes(to) ? (reason ?? null) : null,
    })),
    abilities: abilitiesOnCase(actor, facts),
    transitions: transitionsOnCase(actor, facts).map((transition) => ({
      to: transition.to,
      label: transition.label,
      needsReason: transition.needsReason,
      obstacle: findObstacle(transition, standing)?.title ?? null,
    })),
  };
}

function presentStudyInBrief(study: Study): NonNullable<CaseSummary['latestStudy']> {
  const findings = study.findings ?? null;
  const notMet = new Set(findings?.clauses.flatMap(({ receptorsNotMet }) => receptorsNotMet));
  return {
    id: study.id,
    revision: study.massing.revision,
    status: study.status,
    met: findings?.met ?? null,
    receptorsNotMet: findings === null ? null : notMet.size,
    lossIndex: findings?.lossIndex ?? null,
  };
}
