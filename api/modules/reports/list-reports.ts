import type { EntityManager } from '@mikro-orm/postgresql';
import type { Report as ReportDetail } from '../../../shared/contracts/reports.ts';
import { AppError } from '../../errors.ts';
import type { Actor } from '../../policy.ts';
import { getCase, requireOnCase } from '../cases/get-case.ts';
import { findCurrentMassing } from '../massings/get-massing.ts';
import { Report } from './report.entity.ts';
import { presentReport } from './report.presenter.ts';

/** The reports of a case that the person may read, the latest first. */
export async function listReports(
  em: EntityManager,
  actor: Actor | null,
  reference: string,
): Promise<ReportDetail[]> {
  const reviewCase = await getCase(em, actor, reference);
  requireOnCase(actor, 'read-report', reviewCase);
  const reports = await em.find(
    Report,
    { reviewCase: reviewCase.id },
    { orderBy: { ordinal: 'desc' }, populate: ['massing', 'study', 'issuedBy'] },
  );
  const current = await findCurrentMassing(em, reviewCase);
  return reports.map((report, index) =>
    presentReport(report, index > 0 || report.massing.id !== current?.id),
  );
}

/** The PDF under this number, with its own SHA-256; throws NOT_FOUND. */
export async function getReportPdf(
  em: EntityManager,
  actor: Actor | null,
  number: string,
): Promise<{ pdf: Uint8Array; sha256: string }> {
  const report = await em.findOne(Report, { number }, { populate: ['reviewCase', 'pdf'] });
  if (report === null) throw new AppError('NOT_FOUND', { title: 'There is no such report.' });
  const reference = report.reviewCase.number ?? report.reviewCase.draftKey;
  requireOnCase(actor, 'read-report', await getCase(em, actor, reference));
  return { pdf: report.pdf, sha256: report.sha256 };
}
