import { Link } from 'react-router-dom';
import { caseStateWords, editableCaseStates } from '../../../shared/contracts/case-life.ts';
import type { CaseSummary } from '../../../shared/contracts/cases.ts';
import { ButtonLink } from '../../components/button-link.tsx';
import { DataTable, type TableColumn } from '../../components/data-table.tsx';
import { EmptyState } from '../../components/empty-state.tsx';
import { PageHeading } from '../../components/page-heading.tsx';
import { QueryView } from '../../components/query-view.tsx';
import { useCases } from '../../features/cases/api/list-cases.ts';
import { describeProposal } from '../../features/cases/proposal-in-words.ts';
import type { Formats } from '../../lib/formats.ts';
import { useFormats } from '../../lib/place-context.ts';
import { paths } from '../paths.ts';

/** The applicant's own cases and what each waits for. */
export function ApplicationsPage() {
  const formats = useFormats();
  const cases = useCases({ view: 'mine', pageSize: 200 });
  return (
    <div className="sheet-width grid gap-6 py-8">
      <div className="flex flex-wrap items-baseline justify-between gap-4">
        <PageHeading>My applications</PageHeading>
        <ButtonLink to={paths.newApplication.href()} kind="primary">
          Start an application
        </ButtonLink>
      </div>
      <QueryView query={cases} what="your applications">
        {(page) =>
          page.rows.length === 0 ? (
            <EmptyState title="You have no application yet.">
              <p>
                Start one: give it a name, pick the site’s parcels, then upload the massing. You see
                at once how the file was read, and nothing is sent to the planning department until
                you submit it.
              </p>
              <ButtonLink to={paths.newApplication.href()}>Start an application</ButtonLink>
            </EmptyState>
          ) : (
            <DataTable
              caption="My applications"
              hideCaption
              columns={applicationColumns(formats)}
              rows={page.rows}
              stacksWhenNarrow
              rowKey={(row) => row.reference}
            />
          )
        }
      </QueryView>
    </div>
  );
}

function applicationColumns(formats: Formats): TableColumn<CaseSummary>[] {
  return [
    {
      id: 'title',
      header: 'Application',
      isRowHeader: true,
      className: 'min-w-48',
      cell: (row) => (
        <>
          <Link to={paths.application.href(row.reference)} className="link text-body">
            {row.title}
          </Link>
          <span className="block text-ink-soft">{row.address}</span>
        </>
      ),
    },
    {
      id: 'number',
      header: 'Case number',
      className: 'whitespace-nowrap',
      cell: (row) => row.number ?? 'at submission',
    },
    {
      id: 'state',
      header: 'State',
      cell: (row) => (
        <>
          {caseStateWords[row.state]}
          <span className="block text-ink-soft">
            since {formats.shortDateOfInstant(row.stateSince)}
          </span>
        </>
      ),
    },
    {
      id: 'proposal',
      header: 'Massing',
      cell: (row) => (
        <>
          {describeProposal(row, formats)}
          {row.latestRevision === null ? null : (
            <span className="block text-ink-soft">revision {row.latestRevision}</span>
          )}
        </>
      ),
    },
    { id: 'next', header: 'Next', className: 'min-w-40', cell: nextStep },
  ];
}

/** What the applicant has to do, if anything. */
function nextStep(row: CaseSummary): string {
  if (row.state === 'sent-back') return 'Correct what the planner asked for';
  if (!editableCaseStates.includes(row.state)) return 'Nothing: it is with the planning department';
  return row.latestRevision === null ? 'Upload the massing' : 'Check it and submit';
}
