import type { Report as ReportDetail } from '../../../shared/contracts/reports.ts';
import type { Report } from './report.entity.ts';

/** `isSuperseded`: a later report or a later massing revision has taken its place. */
export function presentReport(report: Report, isSuperseded: boolean): ReportDetail {
  return {
    number: report.number,
    revision: report.massing.revision,
    studyId: report.study.id,
    studyDigest: report.studyDigest,
    issuedAt: report.issuedAt.toISOString(),
    issuedByName: report.issuedBy.name,
    sizeBytes: report.sizeBytes,
    pages: report.pages,
    sha256: report.sha256,
    superseded: isSuperseded,
  };
}
