import { createHash } from 'node:crypto';
import type { EntityManager } from '@mikro-orm/postgresql';
import type { z } from 'zod';
import type { issueReportInputSchema } from '../../../shared/contracts/reports.ts';
import { AppError } from '../../errors.ts';
import type { Actor } from '../../policy.ts';
import { getCaseFor } from '../cases/get-case.ts';
import { lockCaseFor } from '../cases/lock-case.ts';
import type { ReviewCase } from '../cases/review-case.entity.ts';
import { findCurrentMassing } from '../massings/get-massing.ts';
import { Person } from '../people/person.entity.ts';
import { getMunicipality } from '../settings/get-municipality.ts';
import { Study } from '../studies/study.entity.ts';
import { collectReport } from './collect-report.ts';
import { renderReportApart } from './render-report-apart.ts';
import { Report } from './report.entity.ts';

interface IssueReportOptions {
  actor: Actor;
  reference: string;
  input: z.output<typeof issueReportInputSchema>;
  publicUrl: string;
}

/**
 * Draws and stores the case's next staff report, from the latest finished study of the current massing.
 * The case stays locked while it is drawn, so that the numbers have no gap. Throws STUDY_MISSING.
 */
export async function issueReport(
  em: EntityManager,
  { actor, reference, input, publicUrl }: IssueReportOptions,
): Promise<Report> {
  const seen = await getCaseFor(em, actor, reference, 'issue-report');
  return em.transactional(async (tx) => {
    const reviewCase = await lockCaseFor(tx, actor, seen.id, 'issue-report');
    await tx.populate(reviewCase, ['applicant']);
    const study = await findReportableStudy(tx, reviewCase);
    if (study === null) throw new AppError('STUDY_MISSING');

    const issuedBy = await tx.findOneOrFail(Person, actor.id);
    const issuedAt = new Date();
    const ordinal = (await tx.count(Report, { reviewCase: reviewCase.id })) + 1;
    const number = `${reviewCase.number ?? reviewCase.draftKey}-R${ordinal}`;
    const payload = await collectReport(tx, {
      number,
      issuedAt,
      issuedByName: issuedBy.name,
      reviewCase,
      study,
      municipality: await getMunicipality(tx),
      publicUrl: publicUrl.replace(/\/$/, ''),
      ...input,
    });
    const { bytes, pages } = await renderReportApart(payload);
    const report = tx.create(Report, {
      number,
      reviewCase,
      ordinal,
      massing: study.massing,
      study,
      studyDigest: payload.study.digest,
      issuedBy,
      issuedAt,
      pdf: bytes,
      sizeBytes: bytes.length,
      pages,
      sha256: createHash('sha256').update(bytes).digest('hex'),
      payload,
    });
    await tx.flush();
    return report;
  });
}

async function findReportableStudy(
  em: EntityManager,
  reviewCase: ReviewCase,
): Promise<Study | null> {
  const massing = await findCurrentMassing(em, reviewCase);
  if (massing === null) return null;
  return em.findOne(
    Study,
    { massing: massing.id, status: 'finished' },
    {
      orderBy: { finishedAt: 'desc' },
      populate: ['massing', 'massing.blocks', 'evidence', 'findingRows'],
    },
  );
}
