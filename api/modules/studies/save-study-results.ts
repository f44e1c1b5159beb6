import { LockMode } from '@mikro-orm/core';
import type { EntityManager } from '@mikro-orm/postgresql';
import type { InstantShadows } from '../../../shared/contracts/studies.ts';
import type { ComputedStudy } from '../../../shared/study/compute-study.ts';
import { presentShadows } from '../../../shared/study/present-shadows.ts';
import { makeShadowsValid } from '../../valid-polygons.ts';
import { listFindingRows } from './list-finding-rows.ts';
import { StudyInstant } from './study-instant.entity.ts';
import type { StudyRun } from './study-run.ts';
import { Study } from './study.entity.ts';

/** Stores all that a study has come to, in one transaction; false where it is no longer this run's. */
export async function saveStudyResults(
  em: EntityManager,
  { studyId, claim }: StudyRun,
  { evidence, shadows }: ComputedStudy,
): Promise<boolean> {
  const shadowsAt = new Map<string, InstantShadows>();
  for (const drawn of shadows) {
    shadowsAt.set(drawn.at, presentShadows(await makeShadowsValid(drawn)));
  }
  return em.transactional(async (tx) => {
    const study = await tx.findOne(
      Study,
      { id: studyId, claim, status: 'running' },
      { lockMode: LockMode.PESSIMISTIC_WRITE, refresh: true },
    );
    if (study === null) return false;
    tx.assign(study, {
      status: 'finished',
      claim: null,
      instantsDone: study.instantsTotal,
      finishedAt: new Date(),
      engine: evidence.engine,
      digest: evidence.digest,
      findings: evidence.results.findings,
      findingRows: listFindingRows(evidence),
      evidence: JSON.stringify(evidence),
    });
    evidence.results.instants.forEach((instant, position) => {
      tx.create(StudyInstant, {
        study,
        position,
        at: new Date(instant.at),
        atText: instant.at,
        azimuthDeg: instant.azimuth,
        altitudeDeg: instant.altitude,
        netNewM2: instant.netNew ?? null,
        removedM2: instant.removed ?? null,
        shadows: shadowsAt.get(instant.at) ?? null,
      });
    });
    return true;
  });
}
