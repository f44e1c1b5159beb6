import type { FindingRow } from '../../shared/contracts/studies.ts';

/** A row of a findings table that is met; parts can be put in its place. */
export function makeFindingRow(change: Partial<FindingRow> = {}): FindingRow {
  return {
    receptor: 'N-1',
    label: '1 Test Row',
    class: 'parcel',
    clause: 'winter-noon-hours',
    clauseTitle: 'Two hours',
    day: '2026-12-21',
    finding: 'met',
    close: false,
    measure: 'sun-hours',
    unit: 'h',
    before: 4,
    after: 3,
    lost: 1,
    limit: 2,
    margin: 1,
    loss: 0.25,
    band: 'moderate',
    sentence: 'It is met.',
    ...change,
  };
}
