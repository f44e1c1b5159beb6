import type { EntityManager } from '@mikro-orm/postgresql';
import type PgBoss from 'pg-boss';
import { AppError } from '../../errors.ts';
import { enqueueJob } from '../../jobs/enqueue-job.ts';
import { runStudyJob } from '../../jobs/job-definitions.ts';
import type { Actor } from '../../policy.ts';
import { getCaseFor } from '../cases/get-case.ts';
import { lockCaseFor } from '../cases/lock-case.ts';
import { findCurrentMassing } from '../massings/get-massing.ts';
import { Person } from '../people/person.entity.ts';
import { findRuleInForce } from '../rules/find-rule-in-force.ts';
import { civilDateIn, getMunicipality } from '../settings/get-municipality.ts';
import { Study } from './study.entity.ts';

/**
 * Asks for a study of the case's current massing under the rule in force today. The study and its job
 * are written in one transaction. Throws MASSING_MISSING, MASSING_UNSOUND, STUDY_RUNNING or RULE_MISSING.
 */
export async function requestStudy(
  em: EntityManager,
  queue: PgBoss,
  actor: Actor,
  reference: string,
): Promise<Study> {
  const seen = await getCaseFor(em, actor, reference, 'request-study');
  return em.transactional(async (tx) => {
    const reviewCase = await lockCaseFor(tx, actor, seen.id, 'request-study');
    const massing = await findCurrentMassing(tx, reviewCase);
    if (massing === null) throw new AppError('MASSING_MISSING');
    if (!massing.sound) throw new AppError('MASSING_UNSOUND');
    const underWay = await tx.count(Study, {
      reviewCase: reviewCase.id,
      status: { $in: ['queued', 'running'] },
    });
    if (underWay > 0) throw new AppError('STUDY_RUNNING');

    const municipality = await getMunicipality(tx);
    const requestedAt = new Date();
    const ruleVersion = await findRuleInForce(tx, civilDateIn(municipality, requestedAt));
    if (ruleVersion === null) throw new AppError('RULE_MISSING');
    const study = tx.create(Study, {
      reviewCase,
      massing,
      ruleVersion,
      year: municipality.studyYear,
      requestedBy: await tx.findOneOrFail(Person, actor.id),
      requestedAt,
      status: 'queued',
      instantsDone: 0,
      instantsTotal: 0,
      attempts: 0,
    });
    await tx.flush();
    await enqueueJob(tx, queue, runStudyJob, { version: 1, studyId: study.id });
    return study;
  });
}
