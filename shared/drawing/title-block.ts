import type { CivilTimeFormat } from './civil-time-format.ts';
import type { FigureFormat } from './figure-format.ts';
import { palette } from './palette.ts';
import { element, group, type Svg } from './svg.ts';
import { estimateTextWidth } from './text-width.ts';

/** What the title block of a map states. */
export interface TitleBlock {
  /** The case number, or the draft's key. */
  caseReference: string;
  revision: number;
  /** `sha256:…`; null where the drawing belongs to no finished study. */
  studyDigest: string | null;
  /** RFC 3339; null for a plan without a sun. */
  at: string | null;
  /** Clockwise from true north. */
  azimuthDeg: number | null;
  /** Apparent. */
  altitudeDeg: number | null;
}

/** A digest as people compare it: its first eight hexadecimal digits, `7f3a 91c2`. */
export function shortDigest(digest: string): string {
  const digits = digest.replace(/^sha256:/, '');
  return `${digits.slice(0, 4)} ${digits.slice(4, 8)}`;
}

/** The rows of a title block, two cells each; the same on screen, in SVG, PNG and PDF. */
export function titleBlockRows(
  block: TitleBlock,
  time: CivilTimeFormat,
  figures: FigureFormat,
): [string, string][] {
  const rows: [string, string][] = [
    [
      `${block.caseReference} · revision ${block.revision}`,
      block.studyDigest === null ? 'no study yet' : `study ${shortDigest(block.studyDigest)}`,
    ],
  ];
  if (block.at !== null) rows.push([time.date(block.at), time.clockWithZone(block.at)]);
  if (block.azimuthDeg !== null && block.altitudeDeg !== null) {
    rows.push([
      `sun ${figures.angle(block.azimuthDeg)} from north`,
      `${figures.angle(block.altitudeDeg)} high`,
    ]);
  }
  return rows;
}

/** Width and height that `drawTitleBlock` takes. */
export function measureTitleBlock(
  rows: readonly (readonly [string, string])[],
  fontSize: number,
): { width: number; height: number; firstColumn: number } {
  const column = (index: 0 | 1) =>
    Math.max(...rows.map((row) => estimateTextWidth(row[index], fontSize))) + fontSize * 1.4;
  const firstColumn = column(0);
  return { width: firstColumn + column(1), height: rows.length * fontSize * 1.8, firstColumn };
}

/** @param at the block's upper left corner */
export function drawTitleBlock(
  rows: readonly (readonly [string, string])[],
  at: readonly [number, number],
  fontSize: number,
): Svg {
  const { width, height, firstColumn } = measureTitleBlock(rows, fontSize);
  const [x, y] = at;
  const rowHeight = height / rows.length;
  const lines = rows.map((_, index) =>
    index === 0 ? '' : `M${x} ${y + index * rowHeight}h${width}`,
  );
  const cell = (text: string, left: number, index: number) =>
    element(
      'text',
      {
        x: left + fontSize * 0.7,
        y: y + index * rowHeight + rowHeight * 0.5 + fontSize * 0.36,
        'font-size': fontSize,
        fill: palette.ink,
      },
      text,
    );
  return group({ 'data-part': 'title-block' }, [
    element('rect', {
      x,
      y,
      width,
      height,
      fill: palette.paper,
      stroke: palette.ink,
      'stroke-width': 0.8,
    }),
    element('path', {
      d: `${lines.join('')}M${x + firstColumn} ${y}v${height}`,
      stroke: palette.ink,
      'stroke-width': 0.5,
      fill: 'none',
    }),
    ...rows.flatMap(([first, second], index) => [
      cell(first, x, index),
      cell(second, x + firstColumn, index),
    ]),
  ]);
}
