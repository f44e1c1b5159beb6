import type { ReactNode } from 'react';

export interface TableColumn<Row> {
  id: string;
  header: ReactNode;
  cell: (row: Row) => ReactNode;
  /** Figures stand at the right. */
  align?: 'start' | 'end';
  /** The name under which the list is sorted by this column; absent: it cannot be. */
  sortKey?: string;
  /** This column names the row. */
  isRowHeader?: boolean;
  className?: string;
}

export interface DataTableProps<Row> {
  /** What the table shows; read aloud, and printed unless `hideCaption`. */
  caption: string;
  hideCaption?: boolean;
  columns: readonly TableColumn<Row>[];
  rows: readonly Row[];
  rowKey: (row: Row) => string;
  /** `name` or `-name`, as the API has it. */
  sort?: string | undefined;
  onSort?: (sort: string) => void;
  isRowSelected?: (row: Row) => boolean;
  /** On a narrow screen each row becomes a short list, its columns' headers as labels. */
  stacksWhenNarrow?: boolean;
  className?: string;
}

/** A table of hairlines. On a narrow screen it scrolls sideways within itself. */
export function DataTable<Row>({
  caption,
  hideCaption = false,
  columns,
  rows,
  rowKey,
  sort,
  onSort,
  isRowSelected = () => false,
  stacksWhenNarrow = false,
  className = '',
}: DataTableProps<Row>) {
  // A table that is shown as blocks keeps its meaning by its roles.
  const roleOf = (role: string) => (stacksWhenNarrow ? role : undefined);
  const stack = (classes: string) => (stacksWhenNarrow ? classes : '');
  return (
    <div className={`overflow-x-auto ${className}`} role="region" aria-label={caption} tabIndex={0}>
      <table
        role={roleOf('table')}
        className={`w-full border-collapse text-small ${stack('max-sm:block')}`}
      >
        <caption
          className={
            hideCaption
              ? 'sr-only'
              : `pb-2 text-start text-body font-strong ${stack('max-sm:block')}`
          }
        >
          {caption}
        </caption>
        <thead role={roleOf('rowgroup')} className={stack('max-sm:sr-only')}>
          <tr role={roleOf('row')} className="border-b border-ink">
            {columns.map((column) => (
              <HeaderCell
                key={column.id}
                column={column}
                sort={sort}
                onSort={onSort}
                role={roleOf('columnheader')}
              />
            ))}
          </tr>
        </thead>
        <tbody
          role={roleOf('rowgroup')}
          className={stack('max-sm:block max-sm:border-t max-sm:border-ink')}
        >
          {rows.map((row) => {
            const isSelected = isRowSelected(row);
            return (
              <tr
                key={rowKey(row)}
                role={roleOf('row')}
                aria-selected={isSelected || undefined}
                className={`border-b border-hairline ${isSelected ? 'bg-marigold-wash' : ''} ${stack('max-sm:block max-sm:py-2')}`}
              >
                {columns.map((column) => {
                  const isHeader = column.isRowHeader === true;
                  const Cell = isHeader ? 'th' : 'td';
                  return (
                    <Cell
                      key={column.id}
                      role={roleOf(isHeader ? 'rowheader' : 'cell')}
                      scope={isHeader ? 'row' : undefined}
                      className={`px-2 py-2 align-top font-normal first:ps-0 last:pe-0 ${
                        column.align === 'end' ? 'text-end whitespace-nowrap' : 'text-start'
                      } ${column.className ?? ''} ${stack('max-sm:block max-sm:px-0 max-sm:py-0.5 max-sm:text-start')}`}
                    >
                      {stacksWhenNarrow && !isHeader ? (
                        <span aria-hidden="true" className="label-caps me-2 sm:hidden">
                          {column.header}
                        </span>
                      ) : null}
                      {column.cell(row)}
                    </Cell>
                  );
                })}
              </tr>
            );
          })}
        </tbody>
      </table>
    </div>
  );
}

interface HeaderCellProps<Row> {
  column: TableColumn<Row>;
  sort: string | undefined;
  onSort: ((sort: string) => void) | undefined;
  role: string | undefined;
}

function HeaderCell<Row>({ column, sort, onSort, role }: HeaderCellProps<Row>) {
  const { sortKey, align } = column;
  const classes = `label-caps px-2 py-1.5 align-bottom first:ps-0 last:pe-0 ${
    align === 'end' ? 'text-end' : 'text-start'
  } ${column.className ?? ''}`;
  if (sortKey === undefined || onSort === undefined) {
    return (
      <th role={role} scope="col" className={classes}>
        {column.header}
      </th>
    );
  }
  const direction = sort === sortKey ? 'ascending' : sort === `-${sortKey}` ? 'descending' : 'none';
  return (
    <th role={role} scope="col" aria-sort={direction} className={classes}>
      <button
        type="button"
        className="label-caps min-h-6 cursor-pointer hover:underline"
        onClick={() => {
          onSort(direction === 'ascending' ? `-${sortKey}` : sortKey);
        }}
      >
        {column.header}
        <span aria-hidden="true">
          {direction === 'ascending' ? ' ↑' : direction === 'descending' ? ' ↓' : ''}
        </span>
      </button>
    </th>
  );
}
