import { Link } from 'react-router-dom';
import type { CaseDetail } from '../../../shared/contracts/cases.ts';
import { EmptyState } from '../../components/empty-state.tsx';
import { QueryView } from '../../components/query-view.tsx';
import { useReports } from '../../features/reports/api/list-reports.ts';
import { ReportList } from '../../features/reports/components/report-list.tsx';
import { useStudy } from '../../features/studies/api/get-study.ts';
import { paths } from '../paths.ts';

/** What can be taken home: the staff reports, and the study to recompute. */
export function CaseDocumentsSection({ reviewCase }: { reviewCase: CaseDetail }) {
  const { reference, latestStudy } = reviewCase;
  const reports = useReports(reference);
  const finished = latestStudy?.status === 'finished' ? latestStudy : null;
  return (
    <section id="documents" className="grid scroll-mt-4 gap-4" aria-labelledby="documents-heading">
      <h2 id="documents-heading">Documents</h2>
      <div className="measure grid gap-4">
        <QueryView query={reports} what="the reports">
          {({ rows }) =>
            rows.length === 0 ? (
              <EmptyState title="No staff report is issued yet.">
                <p>It is written after the comments are read, and stays here for good.</p>
              </EmptyState>
            ) : (
              <ReportList reports={rows} />
            )
          }
        </QueryView>
        {finished === null ? null : <StudyDownloads reference={reference} studyId={finished.id} />}
      </div>
    </section>
  );
}

function StudyDownloads({ reference, studyId }: { reference: string; studyId: string }) {
  const study = useStudy(studyId);
  return (
    <div className="grid gap-1">
      <p>
        <Link to={paths.caseFindings.href(reference)} className="link">
          What the rule says, place by place
        </Link>
        : every finding, to sort and to search.
      </p>
      <p>
        <a href={`/api/studies/${studyId}/evidence`} className="link">
          Evidence file of the study
        </a>{' '}
        (JSON): inputs, rule and results, for anybody to recompute.
      </p>
      <p>
        <a href={`/api/studies/${studyId}/receptors.csv`} className="link">
          All findings as a table
        </a>{' '}
        (CSV)
      </p>
      {study.data?.digest === undefined || study.data.digest === null ? null : (
        <p className="font-mono text-[0.75rem] break-all text-ink-soft">
          study {study.data.digest}
        </p>
      )}
    </div>
  );
}
