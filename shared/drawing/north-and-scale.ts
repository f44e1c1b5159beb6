import type { FigureFormat } from './figure-format.ts';
import { palette } from './palette.ts';
import { element, group, type Svg } from './svg.ts';

/** A round length for a scale bar: 1, 2 or 5 times a power of ten metres, at most `longestM`. */
export function roundScaleLength(longestM: number): number {
  const power = 10 ** Math.floor(Math.log10(longestM));
  const factor = [5, 2, 1].find((one) => one * power <= longestM) ?? 1;
  return factor * power;
}

/**
 * A scale bar of a round length, from 0 to its end with the middle marked.
 *
 * @param at left end of the bar on the sheet
 * @param pxPerM scale of the drawing
 * @param longest the bar's greatest length on the sheet
 */
export function drawScaleBar(
  at: readonly [number, number],
  pxPerM: number,
  longest: number,
  fontSize: number,
  figures: FigureFormat,
): Svg {
  const lengthM = roundScaleLength(longest / pxPerM);
  const length = lengthM * pxPerM;
  const [x, y] = at;
  const tick = fontSize * 0.35;
  return group({ 'data-part': 'scale-bar' }, [
    element('path', {
      d: `M${x} ${y}h${length}M${x} ${y - tick}v${2 * tick}M${x + length / 2} ${y - tick}v${2 * tick}M${x + length} ${y - tick}v${2 * tick}`,
      stroke: palette.ink,
      'stroke-width': 0.8,
      fill: 'none',
    }),
    label(x, y - tick - 3, 'middle', fontSize, '0'),
    label(x + length, y - tick - 3, 'middle', fontSize, `${figures.whole(lengthM)} m`),
  ]);
}

/**
 * The sign of true north: a vertical line crossed by a short bar, pointing up the sheet.
 *
 * @param at the foot of the line
 */
export function drawNorth(at: readonly [number, number], length: number, fontSize: number): Svg {
  const [x, y] = at;
  return group({ 'data-part': 'true-north' }, [
    element('path', {
      d: `M${x} ${y}V${y - length}M${x - length * 0.16} ${y - length * 0.5}h${length * 0.32}M${x - length * 0.09} ${y - length * 0.82}L${x} ${y - length}L${x + length * 0.09} ${y - length * 0.82}`,
      stroke: palette.ink,
      'stroke-width': 0.9,
      fill: 'none',
    }),
    label(x, y - length - 4, 'middle', fontSize, 'true north'),
  ]);
}

function label(
  x: number,
  y: number,
  anchor: 'start' | 'middle',
  fontSize: number,
  text: string,
): Svg {
  return element(
    'text',
    { x, y, 'font-size': fontSize, 'text-anchor': anchor, fill: palette.ink },
    text,
  );
}
