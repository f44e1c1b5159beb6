import type { SheetRing } from './frame.ts';
import { hatchLines } from './hatch.ts';
import { palette } from './palette.ts';
import { closedPath, segmentsPath } from './path-data.ts';
import { element, group, svgDocument, type Svg } from './svg.ts';
import { estimateTextWidth } from './text-width.ts';

/** What a legend may explain; see `palette`. */
export const legendWords = {
  'standing-shadow': 'shadow that is there already',
  'net-new-shadow': 'net new shadow',
  proposal: 'the proposal',
  building: 'building',
  removed: 'removed by the proposal',
  site: 'site boundary',
  'not-met': 'a requirement is not met here',
  sun: 'sun',
  lost: 'sun lost',
  window: 'judged hours',
} as const;
export type LegendEntry = keyof typeof legendWords;

/**
 * Draws a legend as rows of samples with their words, broken where the width ends.
 *
 * @returns an SVG document
 */
export function drawLegend(entries: readonly LegendEntry[], width: number): string {
  const fontSize = 8;
  const sample = { width: 20, height: 9 };
  const rowHeight = 15;
  let x = 0;
  let row = 0;
  const drawn = entries.map((entry) => {
    const words = legendWords[entry];
    const needed = sample.width + 5 + estimateTextWidth(words, fontSize) + 16;
    if (x > 0 && x + needed - 16 > width) {
      x = 0;
      row += 1;
    }
    const y = row * rowHeight + 3;
    const place = group({}, [
      ...drawSample(entry, x + 0.5, y, sample.width, sample.height),
      element(
        'text',
        {
          x: x + sample.width + 5,
          y: y + sample.height - 1.5,
          'font-size': fontSize,
          fill: palette.ink,
        },
        words,
      ),
    ]);
    x += needed;
    return place;
  });
  return svgDocument({ width, height: (row + 1) * rowHeight }, 'Legend', drawn);
}

function drawSample(
  entry: LegendEntry,
  x: number,
  y: number,
  width: number,
  height: number,
): Svg[] {
  const box = (look: Record<string, string | number>) =>
    element('rect', { x, y, width, height, ...look });
  const hatched = (spacing: number): Svg => {
    const ring: SheetRing = [
      [x, y],
      [x + width, y],
      [x + width, y + height],
      [x, y + height],
    ];
    return group({}, [
      element('path', {
        d: closedPath([ring]),
        fill: palette.madder,
        'fill-opacity': 0.1,
        stroke: palette.madder,
        'stroke-width': 0.7,
      }),
      element('path', {
        d: segmentsPath(hatchLines([ring], spacing, 45)),
        fill: 'none',
        stroke: palette.madder,
        'stroke-width': 0.9,
      }),
    ]);
  };
  switch (entry) {
    case 'standing-shadow':
      return [
        box({ fill: palette.shadow, 'fill-opacity': 0.35 }),
        box({ fill: 'none', stroke: palette.shadow, 'stroke-width': 1 }),
      ];
    case 'net-new-shadow':
      return [hatched(4)];
    case 'lost':
      return [hatched(3)];
    case 'proposal':
      return [box({ fill: palette.paper, stroke: palette.ink, 'stroke-width': 1.6 })];
    case 'building':
      return [box({ fill: palette.building, stroke: palette.buildingLine, 'stroke-width': 0.7 })];
    case 'removed':
      return [
        box({ fill: 'none', stroke: palette.ink, 'stroke-width': 0.7, 'stroke-dasharray': '2 2' }),
      ];
    case 'site':
      return [
        element('line', {
          x1: x,
          y1: y + height / 2,
          x2: x + width,
          y2: y + height / 2,
          stroke: palette.ink,
          'stroke-width': 1.5,
          'stroke-dasharray': '8 2 2 2',
        }),
      ];
    case 'not-met':
      return [box({ fill: 'none', stroke: palette.madder, 'stroke-width': 1.6 })];
    case 'sun':
      return [box({ fill: palette.sunFill, stroke: palette.sunLine, 'stroke-width': 0.5 })];
    case 'window':
      return [box({ fill: palette.street, stroke: palette.hairline, 'stroke-width': 0.5 })];
  }
}
