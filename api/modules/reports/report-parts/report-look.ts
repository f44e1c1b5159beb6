import type { Content, CustomTableLayout, StyleDictionary } from 'pdfmake/interfaces';
import { palette } from '../../../../shared/drawing/palette.ts';

/** Points. The text block is as wide on Letter as on A4, so that every map has the same scale on both. */
export const page = { textWidth: 487, top: 56, bottom: 50 } as const;
export const pageWidths = { LETTER: 612, A4: 595.28 } as const;
export type ReportPageSize = keyof typeof pageWidths;

export const fontFamily = 'Public Sans';

export const styles: StyleDictionary = {
  plain: { bold: false },
  strong: { bold: true },
  title: { fontSize: 25, bold: true, lineHeight: 1.05 },
  heading: { fontSize: 15, bold: true, margin: [0, 0, 0, 8] },
  subheading: { fontSize: 10.5, bold: true, margin: [0, 10, 0, 4] },
  label: { fontSize: 6.8, color: palette.inkLight, characterSpacing: 0.55 },
  small: { fontSize: 7.5, color: palette.inkLight, lineHeight: 1.25 },
  cell: { fontSize: 8.5, lineHeight: 1.15 },
  /** With a unit of several signs. */
  longFigure: { fontSize: 7, lineHeight: 1.3, alignment: 'right', fontFeatures: ['tnum'] },
  figure: { fontSize: 8.5, lineHeight: 1.15, alignment: 'right', fontFeatures: ['tnum'] },
};

/** Table rules as on a drawing: hairlines between rows, ink under the head. */
export const hairlineTable: CustomTableLayout = {
  hLineWidth: (row, node) => {
    if (row === 0) return 0;
    return row === node.table.headerRows || row === node.table.body.length ? 0.8 : 0.3;
  },
  vLineWidth: () => 0,
  hLineColor: (row, node) =>
    row === node.table.headerRows || row === node.table.body.length
      ? palette.ink
      : palette.hairline,
  paddingLeft: (column) => (column === 0 ? 0 : 5),
  paddingRight: (column, node) => (column === (node.table.widths?.length ?? 0) - 1 ? 0 : 5),
  paddingTop: () => 3.2,
  paddingBottom: () => 2.6,
};

/** Small capitals for labels: the font has none, so capitals set small and wide. */
export function label(text: string): Content {
  return { text: text.toUpperCase(), style: 'label' };
}

/** A part of the report: on a new page, with a line above and an entry in the PDF's outline. */
export function heading(text: string, isOnNewPage = true): Content {
  return {
    stack: [
      rule(0.8),
      { text, style: 'heading', margin: [0, 7, 0, 8], outline: true, outlineExpanded: false },
    ],
    headlineLevel: 1,
    unbreakable: true,
    ...(isOnNewPage ? { pageBreak: 'before' } : { margin: [0, 16, 0, 0] }),
  };
}

export function subheading(text: string): Content {
  return { text, style: 'subheading', headlineLevel: 2 };
}

/** A horizontal line over the whole text block. */
export function rule(lineWidth: number): Content {
  return {
    canvas: [
      { type: 'line', x1: 0, y1: 0, x2: page.textWidth, y2: 0, lineWidth, lineColor: palette.ink },
    ],
  };
}

/** Paragraphs from plain text, which are separated by empty lines. */
export function paragraphs(text: string): Content[] {
  return text
    .split(/\n\s*\n/)
    .map((paragraph) => paragraph.trim())
    .filter((paragraph) => paragraph !== '')
    .map((paragraph) => ({ text: paragraph, margin: [0, 0, 0, 6] }));
}

/** Terms on the left, what they say on the right. */
export function definitions(rows: readonly (readonly [string, Content])[]): Content {
  return {
    table: {
      widths: [96, '*'],
      dontBreakRows: true,
      body: rows.map(([term, said]) => [{ stack: [label(term)], margin: [0, 2.5, 0, 0] }, said]),
    },
    layout: {
      ...hairlineTable,
      hLineWidth: (row, node) => (row === 0 || row === node.table.body.length ? 0 : 0.3),
      hLineColor: () => palette.hairline,
    },
    fontSize: 8.8,
    margin: [0, 0, 0, 8],
  };
}
