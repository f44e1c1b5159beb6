import { Link } from 'react-router-dom';
import type { CaseState } from '../../../shared/contracts/case-life.ts';
import type { CaseSummary } from '../../../shared/contracts/cases.ts';
import { EmptyState } from '../../components/empty-state.tsx';
import { PageHeading } from '../../components/page-heading.tsx';
import { QueryView } from '../../components/query-view.tsx';
import { useCases } from '../../features/cases/api/list-cases.ts';
import { CaseList } from '../../features/cases/components/case-list.tsx';
import { useReports } from '../../features/reports/api/list-reports.ts';
import { ReportList } from '../../features/reports/components/report-list.tsx';
import { paths } from '../paths.ts';

const beforeTheBoard: readonly CaseState[] = ['report-issued', 'continued', 'heard'];
const decided: readonly CaseState[] = [
  'approved',
  'approved-with-conditions',
  'refused',
  'appealed',
  'remanded',
];

/** The board's packet: the cases that come before it, each with its report. */
export function HearingsPage() {
  const cases = useCases({ view: 'public', pageSize: 200 });
  return (
    <div className="sheet-width grid gap-8 py-8">
      <div className="grid gap-2">
        <PageHeading>Hearings</PageHeading>
        <p className="measure">
          The cases that come before the board, each with its issued staff report. The findings
          stand on the report’s first page.
        </p>
      </div>
      <QueryView query={cases} what="the cases">
        {({ rows }) => (
          <>
            <HearingSection
              title="Before the board"
              cases={rows.filter(({ state }) => beforeTheBoard.includes(state))}
              empty="No case is before the board. One comes here when its staff report is sent to the board."
            />
            <HearingSection
              title="Decided"
              cases={rows.filter(({ state }) => decided.includes(state))}
              empty="No decision is recorded yet."
            />
          </>
        )}
      </QueryView>
    </div>
  );
}

interface HearingSectionProps {
  title: string;
  cases: readonly CaseSummary[];
  empty: string;
}

function HearingSection({ title, cases, empty }: HearingSectionProps) {
  return (
    <section className="grid gap-3" aria-label={title}>
      <h2>{title}</h2>
      {cases.length === 0 ? (
        <EmptyState title={empty} />
      ) : (
        <CaseList
          cases={cases}
          hrefOf={({ reference }) => paths.publicCase.href(reference)}
          below={({ reference }) => (
            <>
              <p>
                <Link to={paths.deskCase.href(reference, 'findings')} className="link">
                  Findings, study and comments of the case
                </Link>
              </p>
              <CaseReports reference={reference} />
            </>
          )}
        />
      )}
    </section>
  );
}

function CaseReports({ reference }: { reference: string }) {
  const reports = useReports(reference);
  return (
    <QueryView query={reports} what="the reports">
      {({ rows }) =>
        rows.length === 0 ? (
          <p className="text-small">No staff report is issued.</p>
        ) : (
          <ReportList reports={rows} />
        )
      }
    </QueryView>
  );
}
