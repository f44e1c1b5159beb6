import { Link } from 'react-router-dom';
import { caseStateWords } from '../../../../shared/contracts/case-life.ts';
import type { CaseSummary } from '../../../../shared/contracts/cases.ts';
import { paths } from '../../../app/paths.ts';
import { DataTable, type TableColumn } from '../../../components/data-table.tsx';
import type { Formats } from '../../../lib/formats.ts';
import { useFormats } from '../../../lib/place-context.ts';
import { daysSince, nextStepOf } from '../next-step.ts';
import { describeProposal } from '../proposal-in-words.ts';
import { CaseFinding } from './case-finding.tsx';

export interface CaseQueueProps {
  cases: readonly CaseSummary[];
  nowMs: number;
  sort: string;
  onSort: (sort: string) => void;
}

/** The planner's queue: where each case stands, since when, and what comes next. */
export function CaseQueue({ cases, nowMs, sort, onSort }: CaseQueueProps) {
  const formats = useFormats();
  return (
    <DataTable
      caption="Cases on the desk"
      hideCaption
      columns={queueColumns(formats, nowMs)}
      rows={cases}
      rowKey={(row) => row.reference}
      sort={sort}
      onSort={onSort}
    />
  );
}

function queueColumns(formats: Formats, nowMs: number): TableColumn<CaseSummary>[] {
  return [
    {
      id: 'case',
      header: 'Case',
      sortKey: 'number',
      isRowHeader: true,
      className: 'min-w-40 sm:min-w-52',
      cell: (row) => (
        <>
          <Link to={paths.deskCase.href(row.reference)} className="link font-strong">
            {row.title}
          </Link>
          <span className="block text-label text-ink-soft">
            {row.reference} · {row.address}
          </span>
        </>
      ),
    },
    {
      id: 'proposal',
      header: 'Proposal',
      className: 'hidden min-w-36 md:table-cell',
      cell: (row) => (
        <>
          {describeProposal(row, formats)}
          <span className="block text-label text-ink-soft">{row.applicantName}</span>
        </>
      ),
    },
    {
      id: 'state',
      header: 'State',
      sortKey: 'state',
      cell: (row) => caseStateWords[row.state],
    },
    {
      id: 'since',
      header: 'Since',
      sortKey: 'stateSince',
      className: 'whitespace-nowrap',
      cell: (row) => {
        const days = daysSince(row.stateSince, nowMs);
        return (
          <>
            {formats.shortDateOfInstant(row.stateSince)}
            <span className="block text-label text-ink-soft">
              {days === 0 ? 'today' : days === 1 ? '1 day' : `${days} days`}
            </span>
          </>
        );
      },
    },
    {
      id: 'finding',
      header: 'Study',
      className: 'whitespace-nowrap',
      cell: (row) => <CaseFinding study={row.latestStudy} />,
    },
    {
      id: 'next',
      header: 'What next',
      className: 'min-w-40',
      cell: (row) => {
        const { words, part, isWaiting = false } = nextStepOf(row);
        return isWaiting ? (
          <span className="text-ink-soft">{words}</span>
        ) : (
          <Link to={paths.deskCase.href(row.reference, part)} className="link">
            {words}
          </Link>
        );
      },
    },
  ];
}
