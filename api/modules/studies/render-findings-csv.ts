import type { FindingRow } from '../../../shared/contracts/studies.ts';

const columns: { title: string; value: (row: FindingRow) => string | number | null }[] = [
  { title: 'receptor', value: (row) => row.receptor },
  { title: 'label', value: (row) => row.label },
  { title: 'class', value: (row) => row.class },
  { title: 'clause', value: (row) => row.clause },
  { title: 'clause_title', value: (row) => row.clauseTitle },
  { title: 'day', value: (row) => row.day },
  { title: 'finding', value: (row) => row.finding },
  { title: 'close', value: (row) => (row.close ? 'yes' : 'no') },
  { title: 'measure', value: (row) => row.measure },
  { title: 'unit', value: (row) => row.unit },
  { title: 'before', value: (row) => row.before },
  { title: 'after', value: (row) => row.after },
  { title: 'lost', value: (row) => row.lost },
  { title: 'limit', value: (row) => row.limit },
  { title: 'margin', value: (row) => row.margin },
  { title: 'loss', value: (row) => row.loss },
  { title: 'band', value: (row) => row.band },
  // Rows of earlier studies do not have these two.
  { title: 'days_not_met', value: (row) => row.daysNotMet ?? null },
  { title: 'spacing_m', value: (row) => row.spacingM ?? null },
  { title: 'sentence', value: (row) => row.sentence },
];

/** The findings table as CSV (RFC 4180: CRLF, quotes doubled), in UTF-8 with the mark that spreadsheets look for. */
export function renderFindingsCsv(rows: readonly FindingRow[]): string {
  const lines = [
    columns.map(({ title }) => title),
    ...rows.map((row) => columns.map(({ value }) => writeCell(value(row)))),
  ];
  return `\uFEFF${lines.map((cells) => `${cells.join(',')}\r\n`).join('')}`;
}

function writeCell(value: string | number | null): string {
  if (value === null) return '';
  if (typeof value === 'number') return String(value);
  // A spreadsheet would run text that begins like this as a formula; an apostrophe keeps it text.
  const text = /^[=+\-@\t\r]/.test(value) ? `'${value}` : value;
  return /[",\r\n]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}
