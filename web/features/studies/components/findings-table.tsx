import { Link } from 'react-router-dom';
import type { FindingRow } from '../../../../shared/contracts/studies.ts';
import { DataTable, type TableColumn } from '../../../components/data-table.tsx';
import { FindingMark } from '../../../components/finding-mark.tsx';
import type { Formats } from '../../../lib/formats.ts';
import { useFormats } from '../../../lib/place-context.ts';
import { wordOfClass } from '../receptor-words.ts';

export interface FindingsTableProps {
  rows: readonly FindingRow[];
  sort: string | undefined;
  onSort: (sort: string) => void;
  /** Where a receptor is shown on the map on its judged day. */
  hrefOf: (row: FindingRow) => string;
  /** Opens the sun ledger of a receptor. */
  onLedger: (receptor: string) => void;
}

/** Every receptor under every clause: what it had, what it keeps, what the rule allows. */
export function FindingsTable({ rows, sort, onSort, hrefOf, onLedger }: FindingsTableProps) {
  const formats = useFormats();
  return (
    <DataTable
      caption="Findings"
      hideCaption
      columns={findingColumns(formats, hrefOf, onLedger)}
      rows={rows}
      rowKey={(row) => `${row.receptor} ${row.clause} ${row.day ?? ''}`}
      sort={sort}
      onSort={onSort}
    />
  );
}

function findingColumns(
  formats: Formats,
  hrefOf: (row: FindingRow) => string,
  onLedger: (receptor: string) => void,
): TableColumn<FindingRow>[] {
  const figure = (id: 'before' | 'after' | 'lost' | 'limit' | 'margin', header: string) => ({
    id,
    header,
    sortKey: id,
    align: 'end' as const,
    cell: (row: FindingRow) => formats.inUnit(row[id], row.unit),
  });
  return [
    {
      id: 'receptor',
      header: 'Receptor',
      sortKey: 'label',
      isRowHeader: true,
      className: 'min-w-40',
      cell: (row) => <ReceptorCell row={row} href={hrefOf(row)} onLedger={onLedger} />,
    },
    {
      id: 'finding',
      header: 'Finding',
      sortKey: 'finding',
      className: 'min-w-28',
      cell: (row) => <FindingMark finding={row.finding} close={row.close} />,
    },
    figure('before', 'Before'),
    figure('after', 'After'),
    figure('lost', 'Lost'),
    figure('limit', 'Limit'),
    figure('margin', 'Margin'),
    {
      id: 'clause',
      header: 'Clause and day',
      sortKey: 'clause',
      className: 'min-w-44',
      cell: (row) => (
        <>
          {row.clauseTitle}
          <span className="block text-label text-ink-soft">
            {row.day === null ? 'over its days together' : formats.date(row.day)}
            {typeof row.daysNotMet === 'number'
              ? `, the worst; ${row.daysNotMet} ${row.daysNotMet === 1 ? 'day' : 'days'} not met`
              : ''}
          </span>
        </>
      ),
    },
    {
      id: 'sentence',
      header: 'In a sentence',
      className: 'min-w-80',
      cell: (row) => row.sentence,
    },
  ];
}

interface ReceptorCellProps {
  row: FindingRow;
  href: string;
  onLedger: (receptor: string) => void;
}

/** A ring is no place of the map's and has no ledger; every other receptor has both. */
function ReceptorCell({ row, href, onLedger }: ReceptorCellProps) {
  const kind = (
    <span className="block text-label text-ink-soft">
      {wordOfClass(row.class)} {row.receptor}
    </span>
  );
  if (row.class === 'ring') {
    return (
      <>
        {row.label}
        {kind}
      </>
    );
  }
  return (
    <>
      <Link to={href} className="link">
        {row.label}
      </Link>
      {kind}
      <button
        type="button"
        className="link no-print min-h-6"
        aria-label={`Sun ledger of ${row.label}`}
        onClick={() => onLedger(row.receptor)}
      >
        Sun ledger
      </button>
    </>
  );
}
