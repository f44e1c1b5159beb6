import type { z } from 'zod';
import type {
  FindingPage,
  FindingRow,
  listFindingsQuerySchema,
} from '../../../shared/contracts/studies.ts';
import { parseSort } from '../../paging.ts';

export type FindingsQuery = z.output<typeof listFindingsQuerySchema>;

/** What a person needs to see first. */
const findingOrder = { 'not-met': 0, disregarded: 1, met: 2, 'not-affected': 3 } as const;

type Compare = (one: FindingRow, other: FindingRow) => number;

const byText = (one: string, other: string) => one.localeCompare(other, 'en', { numeric: true });

/** Hours and square metres are not held against each other: rows of one unit stay together. */
const byFigure =
  (figure: 'before' | 'after' | 'lost' | 'limit' | 'margin'): Compare =>
  (one, other) =>
    byText(one.unit, other.unit) || one[figure] - other[figure];

const comparisons = {
  receptor: (one, other) => byText(one.receptor, other.receptor),
  label: (one, other) => byText(one.label, other.label),
  class: (one, other) => byText(one.class, other.class),
  clause: (one, other) => byText(one.clauseTitle, other.clauseTitle),
  day: (one, other) => byText(one.day ?? '', other.day ?? ''),
  finding: (one, other) => findingOrder[one.finding] - findingOrder[other.finding],
  before: byFigure('before'),
  after: byFigure('after'),
  lost: byFigure('lost'),
  limit: byFigure('limit'),
  margin: byFigure('margin'),
  // A receptor that had no sun before has lost nothing.
  loss: (one, other) => (one.loss ?? 0) - (other.loss ?? 0),
} satisfies Record<string, Compare>;

type SortField = keyof typeof comparisons;

const sortFields = [
  'receptor',
  'label',
  'class',
  'clause',
  'day',
  'finding',
  'before',
  'after',
  'lost',
  'limit',
  'margin',
  'loss',
] as const satisfies readonly SortField[];

/** Filters and sorts the findings table; by itself what is not met comes first, the worst margin first. */
export function selectFindingRows(
  rows: readonly FindingRow[],
  { finding, clause, class: receptorClass, q, sort }: Omit<FindingsQuery, 'page' | 'pageSize'>,
): FindingRow[] {
  const order = parseSort(sort, sortFields, { field: 'finding', direction: 'asc' });
  const sign = order.direction === 'asc' ? 1 : -1;
  const compare = comparisons[order.field];
  const wanted = q?.toLowerCase() ?? '';
  return rows
    .filter(
      (row) =>
        (finding === undefined || row.finding === finding) &&
        (clause === undefined || row.clause === clause) &&
        (receptorClass === undefined || row.class === receptorClass) &&
        (wanted === '' || textOf(row).includes(wanted)),
    )
    .sort(
      (one, other) =>
        sign * compare(one, other) ||
        comparisons.margin(one, other) ||
        comparisons.label(one, other),
    );
}

/** What a search looks through. */
function textOf({ receptor, label, clauseTitle, band, sentence }: FindingRow): string {
  return [receptor, label, clauseTitle, band ?? '', sentence].join(' ').toLowerCase();
}

/** One page of a list that is whole in memory. */
export function pageFindingRows(
  rows: readonly FindingRow[],
  { page, pageSize }: Pick<FindingsQuery, 'page' | 'pageSize'>,
): FindingPage {
  const start = (page - 1) * pageSize;
  return { rows: rows.slice(start, start + pageSize), page, pageSize, total: rows.length };
}
