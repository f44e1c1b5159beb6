import { cleanup, fireEvent, screen } from '@testing-library/react';
import { afterEach, describe, expect, it, vi } from 'vitest';
import type { FindingRow } from '../../../../shared/contracts/studies.ts';
import { FindingsTable } from '../../../../web/features/studies/components/findings-table.tsx';
import { renderInPlace, withPlainSpaces } from '../../support/render-in-place.tsx';

afterEach(cleanup);

function makeRow(change: Partial<FindingRow> = {}): FindingRow {
  return {
    receptor: 'N-1',
    label: '1 Test Row',
    class: 'parcel',
    clause: 'noon',
    clauseTitle: 'Noon hours',
    day: '2026-12-21',
    finding: 'not-met',
    close: true,
    measure: 'sun-hours',
    unit: 'h',
    before: 4,
    after: 1.5,
    lost: 2.5,
    limit: 2,
    margin: -0.5,
    loss: 0.625,
    band: 'substantial',
    sentence: 'It is not met.',
    ...change,
  };
}

function renderTable(rows: FindingRow[], sort?: string) {
  const onSort = vi.fn();
  const onLedger = vi.fn();
  const hrefOf = ({ receptor }: FindingRow) => `/map?receptor=${receptor}`;
  renderInPlace(
    <FindingsTable rows={rows} sort={sort} onSort={onSort} hrefOf={hrefOf} onLedger={onLedger} />,
  );
  return { onSort, onLedger };
}

describe('the table of findings', () => {
  it('has the values before and after, the limit, the margin and the sentence', () => {
    renderTable([makeRow()]);
    const words = withPlainSpaces(screen.getByRole('row', { name: /1 Test Row/ }).textContent);
    for (const part of [
      'not met (close)',
      '4 h 00 min',
      '1 h 30 min',
      '2 h 30 min',
      '2 h 00 min',
      '−30 min',
      'Noon hours',
      'December 21, 2026',
      'It is not met.',
    ]) {
      expect(words).toContain(part);
    }
  });

  it('says of a season which day is the worst and on how many it fails', () => {
    renderTable([makeRow({ daysNotMet: 12 })]);
    expect(screen.getByText(/the worst; 12 days not met/)).toBeDefined();
  });

  it('is sorted by any figure, and back, with the order told', () => {
    const { onSort } = renderTable([makeRow()], 'limit');
    const header = screen.getByRole('columnheader', { name: /Limit/ });
    expect(header.getAttribute('aria-sort')).toBe('ascending');
    fireEvent.click(screen.getByRole('button', { name: /Limit/ }));
    fireEvent.click(screen.getByRole('button', { name: 'Margin' }));
    expect(onSort.mock.calls).toEqual([['-limit'], ['margin']]);
  });

  it('leads to the map and to the sun ledger of a receptor, and of a ring to neither', () => {
    const { onLedger } = renderTable([
      makeRow(),
      makeRow({ receptor: 'ring:noon', class: 'ring', label: 'Ground around the site' }),
    ]);
    expect(screen.getAllByRole('link').map((one) => one.getAttribute('href'))).toEqual([
      '/map?receptor=N-1',
    ]);
    fireEvent.click(screen.getByRole('button', { name: 'Sun ledger of 1 Test Row' }));
    expect(onLedger).toHaveBeenCalledWith('N-1');
    expect(screen.queryByRole('button', { name: /ledger of Ground/ })).toBeNull();
  });
});
