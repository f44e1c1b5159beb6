import { cleanup, fireEvent, render, screen } from '@testing-library/react';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { DataTable, type TableColumn } from '../../../web/components/data-table.tsx';

interface Row {
  id: string;
  lostMin: number;
}

const columns: TableColumn<Row>[] = [
  { id: 'id', header: 'Receptor', cell: (row) => row.id, isRowHeader: true, sortKey: 'label' },
  { id: 'lost', header: 'Lost', cell: (row) => row.lostMin, align: 'end' },
];
const rows = [{ id: '12 Tallowreed Row', lostMin: 105 }];

function show(sort: string | undefined, onSort = vi.fn()) {
  render(
    <DataTable
      caption="Who loses sun"
      columns={columns}
      rows={rows}
      rowKey={(row) => row.id}
      sort={sort}
      onSort={onSort}
    />,
  );
  return onSort;
}

afterEach(cleanup);

describe('a table', () => {
  it('has a caption and names its rows', () => {
    show(undefined);
    expect(screen.getByRole('table', { name: 'Who loses sun' })).toBeDefined();
    expect(screen.getByRole('rowheader', { name: '12 Tallowreed Row' })).toBeDefined();
  });

  it('sorts up first, then down, and says how it is sorted', () => {
    const onSort = show(undefined);
    fireEvent.click(screen.getByRole('button', { name: 'Receptor' }));
    expect(onSort).toHaveBeenLastCalledWith('label');
    cleanup();
    const onSortAgain = show('label');
    expect(screen.getByRole('columnheader', { name: 'Receptor' }).getAttribute('aria-sort')).toBe(
      'ascending',
    );
    fireEvent.click(screen.getByRole('button', { name: 'Receptor' }));
    expect(onSortAgain).toHaveBeenLastCalledWith('-label');
  });

  it('offers no sorting by a column that has none', () => {
    show(undefined);
    expect(screen.queryByRole('button', { name: 'Lost' })).toBeNull();
  });
});
