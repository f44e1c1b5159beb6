import type { CaseDetail } from '../../../../shared/contracts/cases.ts';
import { EmptyState } from '../../../components/empty-state.tsx';
import { QueryView } from '../../../components/query-view.tsx';
import { useToast } from '../../../components/toast.tsx';
import { useReports } from '../../../features/reports/api/list-reports.ts';
import { ReportEditor } from '../../../features/reports/components/report-editor.tsx';
import { ReportList } from '../../../features/reports/components/report-list.tsx';
import { useDeskCase } from './desk-case-page.tsx';

/** The staff report: written here, issued here, and every one that was issued. */
export function DeskReportPage() {
  const reviewCase = useDeskCase();
  const reports = useReports(reviewCase.reference);
  return (
    <div className="grid items-start gap-x-12 gap-y-8 lg:grid-cols-2">
      <WriteSection reviewCase={reviewCase} />
      <section className="grid gap-3" aria-labelledby="reports-heading">
        <h2 id="reports-heading">Issued reports</h2>
        <QueryView query={reports} what="the reports">
          {({ rows }) =>
            rows.length === 0 ? (
              <EmptyState title="No staff report is issued yet." />
            ) : (
              <ReportList reports={rows} />
            )
          }
        </QueryView>
      </section>
    </div>
  );
}

function WriteSection({ reviewCase }: { reviewCase: CaseDetail }) {
  const showToast = useToast();
  const { reference, latestRevision, latestStudy, abilities } = reviewCase;
  const isStudied = latestStudy?.status === 'finished' && latestStudy.revision === latestRevision;
  return (
    <section className="grid gap-3" aria-labelledby="write-heading">
      <h2 id="write-heading">Staff report</h2>
      {!abilities.includes('issue-report') ? (
        <p className="measure">
          A report is written by a planner while the case is open for comment, continued, or before
          the board.
        </p>
      ) : latestRevision === null || !isStudied ? (
        <EmptyState title="The current massing has not been studied.">
          <p>Run the study in the part “Study” first; the report is drawn from it.</p>
        </EmptyState>
      ) : (
        <ReportEditor
          reference={reference}
          revision={latestRevision}
          onIssued={(report) => showToast(`Report ${report.number} is issued.`)}
        />
      )}
    </section>
  );
}
