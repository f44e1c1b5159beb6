import type { StudyDetail } from '../../../shared/contracts/studies.ts';
import { keyDatesOfYear } from '../../../shared/solar/key-dates.ts';
import { listJudgedDays } from '../../../shared/study/judged-days.ts';
import type { Municipality } from '../settings/municipality.entity.ts';
import type { StudyInstant } from './study-instant.entity.ts';
import { placeOf } from './study-place.ts';
import type { Study } from './study.entity.ts';

interface StudyContext {
  municipality: Municipality;
  instants: readonly StudyInstant[];
  /** It judges the case's current massing revision. */
  isCurrent: boolean;
}

export function presentStudy(
  study: Study,
  { municipality, instants, isCurrent }: StudyContext,
): StudyDetail {
  const { reviewCase, ruleVersion, year } = study;
  const { rule } = ruleVersion;
  return {
    id: study.id,
    caseReference: reviewCase.number ?? reviewCase.draftKey,
    revision: study.massing.revision,
    status: study.status,
    instantsDone: study.instantsDone,
    instantsTotal: study.instantsTotal,
    requestedAt: study.requestedAt.toISOString(),
    finishedAt: study.finishedAt?.toISOString() ?? null,
    failure: study.failure ?? null,
    engine: study.engine ?? null,
    digest: study.digest ?? null,
    isCurrent,
    year,
    timeZone: municipality.timeZone,
    rule: {
      title: rule.title,
      version: rule.version,
      citation: rule.citation,
      clauses: listJudgedDays(rule, placeOf(municipality), year).map(({ clause, title, days }) => ({
        id: clause,
        title,
        days,
      })),
    },
    keyDates: keyDatesOfYear(year, municipality.timeZone),
    findings: study.findings ?? null,
    instants: instants.map(({ atText, azimuthDeg, altitudeDeg, netNewM2, removedM2 }) => ({
      at: atText,
      azimuthDeg,
      altitudeDeg,
      netNewM2: netNewM2 ?? null,
      removedM2: removedM2 ?? null,
    })),
  };
}
