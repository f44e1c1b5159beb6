import { expect, it } from 'vitest';
import { chooseLedgers } from '../../../api/modules/reports/choose-ledgers.ts';
import type { FindingRow } from '../../../shared/contracts/studies.ts';

function makeRow(
  receptor: string,
  finding: FindingRow['finding'],
  loss: number | null,
): FindingRow {
  return {
    receptor,
    label: receptor,
    class: 'parcel',
    clause: 'c',
    clauseTitle: 'C',
    day: null,
    finding,
    close: false,
    measure: 'sun-hours',
    unit: 'h',
    before: 1,
    after: 1,
    lost: 0,
    limit: 1,
    margin: 0,
    loss,
    band: null,
    sentence: '',
  };
}

it('takes every receptor that does not meet a clause, the largest loss first, however many', () => {
  const rows = Array.from({ length: 40 }, (_, index) =>
    makeRow(`r${index}`, 'not-met', index / 40),
  );
  const chosen = chooseLedgers(rows);
  expect(chosen).toHaveLength(40);
  expect(chosen.slice(0, 2)).toEqual(['r39', 'r38']);
});

it('adds at most six others, those that lose most, and none that loses little', () => {
  const rows = [
    makeRow('bad', 'not-met', 0.2),
    ...Array.from({ length: 9 }, (_, index) => makeRow(`m${index}`, 'met', 0.3 + index / 100)),
    makeRow('little', 'met', 0.05),
    makeRow('none', 'not-affected', null),
  ];
  expect(chooseLedgers(rows)).toEqual(['bad', 'm8', 'm7', 'm6', 'm5', 'm4', 'm3']);
  expect(chooseLedgers(rows.slice(-2))).toEqual([]);
});

it('takes a receptor once that fails under two clauses, by its largest loss', () => {
  const rows = [
    makeRow('a', 'not-met', 0.1),
    makeRow('b', 'not-met', 0.3),
    makeRow('a', 'not-met', 0.5),
  ];
  expect(chooseLedgers(rows)).toEqual(['a', 'b']);
});
