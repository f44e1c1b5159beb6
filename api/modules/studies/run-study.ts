import type { EntityManager, MikroORM } from '@mikro-orm/postgresql';
import type PgBoss from 'pg-boss';
import type { Logger } from 'pino';
import type { Clipper } from '../../../shared/shadow/clipper.ts';
import { computeStudy } from '../../../shared/study/compute-study.ts';
import type { StudyInput } from '../../../shared/study/evidence-schema.ts';
import { getMunicipality } from '../settings/get-municipality.ts';
import { buildStudyInput, StudyInputError } from './build-study-input.ts';
import { saveStudyResults } from './save-study-results.ts';
import { claimStudy, failStudy, handBackStudy, reportProgress } from './study-run.ts';
import type { StudyRun } from './study-run.ts';
import { Study } from './study.entity.ts';

/** Progress is written, and the run looked after, at most so often. */
const progressEveryMs = 250;

interface RunStudyOptions {
  orm: MikroORM;
  queue: PgBoss;
  clipper: Clipper;
  logger: Logger;
  /** Aborted when this worker has to stop. */
  stopping: AbortSignal;
}

/** The study was cancelled, or another worker has it. */
class StudyLost extends Error {}
class WorkerStopping extends Error {}

/**
 * Computes a study that was requested and stores its result, once however often it is called. An
 * error ends the study with a sentence that the planner reads.
 */
export async function runStudy(
  studyId: string,
  { orm, queue, clipper, logger, stopping }: RunStudyOptions,
): Promise<void> {
  const run = await claimStudy(orm.em.fork(), studyId);
  if (run === null) return;
  const log = logger.child({ studyId });
  log.info('study begun');
  try {
    const input = await loadStudyInput(orm.em.fork(), studyId);
    const onProgress = createProgressReporter(orm, run, stopping);
    const computed = await computeStudy(input, { clipper, onProgress });
    const isSaved = await saveStudyResults(orm.em.fork(), run, computed);
    log.info(isSaved ? 'study finished' : 'study was cancelled or taken over at its end');
  } catch (error) {
    if (error instanceof StudyLost) {
      log.info('study was cancelled or taken over');
    } else if (error instanceof WorkerStopping) {
      await handBackStudy(orm.em.fork(), queue, run);
      log.info('study handed back');
    } else {
      log.error({ err: error }, 'study failed');
      await failStudy(orm.em.fork(), run, describeFailure(error));
    }
  }
}

async function loadStudyInput(em: EntityManager, studyId: string): Promise<StudyInput> {
  const study = await em.findOneOrFail(Study, studyId, {
    populate: ['reviewCase', 'ruleVersion', 'massing', 'massing.blocks'],
  });
  return buildStudyInput(em, {
    site: study.reviewCase.site,
    siteParcels: study.reviewCase.siteParcels,
    blocks: study.massing.blocks,
    municipality: await getMunicipality(em),
    rule: study.ruleVersion.rule,
    year: study.year,
  });
}

/** Writes progress, each time in a small transaction of its own, so that everybody sees it at once. */
function createProgressReporter(orm: MikroORM, run: StudyRun, stopping: AbortSignal) {
  let lastMs = -Infinity;
  return async (done: number, total: number): Promise<void> => {
    if (performance.now() - lastMs < progressEveryMs && done < total) return;
    if (stopping.aborted) throw new WorkerStopping();
    if (!(await reportProgress(orm.em.fork(), run, done, total))) throw new StudyLost();
    lastMs = performance.now();
  };
}

function describeFailure(error: unknown): string {
  if (error instanceof StudyInputError) return error.message;
  return 'The computation ended with an unexpected error. Run it again; if it fails again, tell the operator: the log has it under this study.';
}
