import type { z } from 'zod';
import type {
  FindingPage,
  FindingRow,
  listFindingsQuerySchema,
} from '../../../shared/contracts/studies.ts';

export type FindingsQuery = z.output<typeof listFindingsQuerySchema>;

/** What a person needs to see first. */
const findingOrder = { 'not-met': 0, disregarded: 1, met: 2, 'not-affected': 3 } as const;

type Compare = (one: FindingRow, other: FindingRow) => number;

const byText = (one: string, other: string) => one.localeCompare(other, 'en', { numeric: true });
/** Nothing comes after every number, in whichever direction the column is sorted. */
const byLoss =
  (direction: 1 | -1): Compare =>
  (one, other) => {
    if (one.loss === null || other.loss === null) {
      return Number(one.loss === null) - Number(other.loss === null);
    }
    return direction * (one.loss - other.loss);
  };

const comparisons: Record<string, Compare> = {
  receptor: (one, other) => byText(one.receptor, other.receptor),
  label: (one, other) => byText(one.label, other.label),
  class: (one, other) => byText(one.class, other.class),
  clause: (one, other) => byText(one.clauseTitle, other.clauseTitle),
  day: (one, other) => byText(one.day ?? '', other.day ?? ''),
  finding: (one, other) => findingOrder[one.finding] - findingOrder[other.finding],
  before: (one, other) => one.before - other.before,
  after: (one, other) => one.after - other.after,
  lost: (one, other) => one.lost - other.lost,
  margin: (one, other) => one.margin - other.margin,
};

/** The columns by which the findings table can be sorted. */
export const findingSortFields: readonly string[] = [...Object.keys(comparisons), 'loss'];

/** Filters and sorts the findings table; by itself what is not met comes first, the smallest margin first. */
export function selectFindingRows(
  rows: readonly FindingRow[],
  { finding, clause, q, sort }: Omit<FindingsQuery, 'page' | 'pageSize'>,
): FindingRow[] {
  const wanted = q?.toLowerCase() ?? '';
  const selected = rows.filter(
    (row) =>
      (finding === undefined || row.finding === finding) &&
      (clause === undefined || row.clause === clause) &&
      (wanted === '' || `${row.receptor} ${row.label}`.toLowerCase().includes(wanted)),
  );
  return selected.sort(chooseComparison(sort));
}

function chooseComparison(sort: string | undefined): Compare {
  const direction = sort?.startsWith('-') === true ? -1 : 1;
  const field = sort?.replace(/^-/, '') ?? '';
  if (field === 'loss') return byLoss(direction);
  const compare = comparisons[field];
  if (compare !== undefined) return (one, other) => direction * compare(one, other);
  return (one, other) =>
    findingOrder[one.finding] - findingOrder[other.finding] ||
    one.margin - other.margin ||
    byText(one.label, other.label);
}

/** One page of a list that is whole in memory. */
export function pageFindingRows(
  rows: readonly FindingRow[],
  { page, pageSize }: Pick<FindingsQuery, 'page' | 'pageSize'>,
): FindingPage {
  const start = (page - 1) * pageSize;
  return { rows: rows.slice(start, start + pageSize), page, pageSize, total: rows.length };
}
