import type { LedgerDay, SunLedger } from '../receptors/sun-ledger-schema.ts';
import type { CivilTimeFormat } from './civil-time-format.ts';
import type { FigureFormat } from './figure-format.ts';
import type { SheetPoint, SheetRing } from './frame.ts';
import { hatchLines } from './hatch.ts';
import { palette } from './palette.ts';
import { closedPath, segmentsPath } from './path-data.ts';
import { element, group, svgDocument, type Svg } from './svg.ts';

export interface LedgerOptions {
  /** px on screen, points on paper; the height follows from the number of days. */
  width: number;
  time: CivilTimeFormat;
  figures: FigureFormat;
  /** The judged windows: first and last instant, RFC 3339. */
  judged: readonly { fromAt: string; toAt: string }[];
  /** Hours of sun before, after and lost on the right of each day. */
  hasFigures: boolean;
}

type Sample = LedgerDay['samples'][number];

/** Smaller losses are thinner than a line. */
const leastLostShare = 0.005;

const rowHeight = 34;
const bandHeight = 10;
const headHeight = 20;

/**
 * Draws the sun ledger of one receptor: hours of the clock across, days down, for each day the sun
 * before over the sun after. A band is as high as the sunlit share of the receptor's open area, so
 * that its surface is the mean hours of sun; the lost part is hatched. The judged window is shaded.
 *
 * @returns an SVG document; the same input gives the same text
 */
export function drawLedger(ledger: SunLedger, options: LedgerOptions): string {
  const { time, width } = options;
  const days = ledger.days.filter((day) => day.samples.length > 1);
  const hours = days.flatMap((day) => day.samples.map((sample) => time.clockHours(sample.at)));
  const firstHour = Math.floor(Math.min(...hours, 24));
  const lastHour = Math.ceil(Math.max(...hours, 0));
  const left = 64;
  const right = width - (options.hasFigures ? 216 : 10);
  const toX = (hour: number) =>
    left + ((hour - firstHour) / (lastHour - firstHour)) * (right - left);
  const height = headHeight + ledger.days.length * rowHeight + 4;

  return svgDocument(
    { width, height },
    `Sun ledger of ${ledger.label}: sun before over sun after on each key date, the lost part hatched.`,
    [
      ...(days.length === 0 ? [] : [drawHours(firstHour, lastHour, toX, height, time)]),
      ...(options.hasFigures ? [drawFigureHeads(right)] : []),
      ...ledger.days.map((day, index) =>
        drawDay(day, headHeight + index * rowHeight, toX, right, options),
      ),
    ],
  );
}

function drawHours(
  firstHour: number,
  lastHour: number,
  toX: (hour: number) => number,
  height: number,
  time: CivilTimeFormat,
): Svg {
  const hours = Array.from({ length: lastHour - firstHour + 1 }, (_, index) => firstHour + index);
  const labelled = hours.filter((hour) => hour % 2 === 0);
  return group({ 'data-part': 'hours' }, [
    ...labelled.map((hour) =>
      element('line', {
        x1: toX(hour),
        y1: headHeight - 5,
        x2: toX(hour),
        y2: height,
        stroke: palette.hairline,
        'stroke-width': hour === 12 ? 0.9 : 0.4,
      }),
    ),
    ...labelled.map((hour) => text(time.hour(hour), toX(hour), headHeight - 9, 'middle', 8)),
  ]);
}

const figureColumns = { before: 76, after: 144, lost: 212 };

function drawFigureHeads(right: number): Svg {
  return group({ 'data-part': 'figure-heads' }, [
    text('sun now', right + figureColumns.before, headHeight - 9, 'end', 8),
    text('with proposal', right + figureColumns.after, headHeight - 9, 'end', 8),
    text('lost', right + figureColumns.lost, headHeight - 9, 'end', 8),
  ]);
}

function drawDay(
  day: LedgerDay,
  top: number,
  toX: (hour: number) => number,
  right: number,
  options: LedgerOptions,
): Svg {
  const { time, figures } = options;
  const beforeFoot = top + 3 + bandHeight;
  const afterFoot = beforeFoot + 3 + bandHeight;
  const baseline = afterFoot + 3;
  const places = day.samples.map((sample) => ({ x: toX(time.clockHours(sample.at)), sample }));
  const firstX = places[0]?.x;
  const lastX = places[places.length - 1]?.x;
  const area = (foot: number, share: (sample: Sample) => number): SheetPoint[] => [
    [firstX ?? 0, foot],
    ...places.map(({ x, sample }): SheetPoint => [x, foot - share(sample) * bandHeight]),
    [lastX ?? 0, foot],
  ];
  const before = (sample: Sample) => sample.shareBefore;
  const after = (sample: Sample) => sample.shareAfter;
  const firstSample = day.samples[0];
  const judged = options.judged.filter(({ fromAt }) => time.civilDateOf(fromAt) === day.date);

  return group({ 'data-part': 'day' }, [
    text(time.shortMonthAndDay(day.date), 0, beforeFoot, 'start', 9),
    ...(firstSample === undefined
      ? [text('the sun does not rise', toX(12), beforeFoot, 'middle', 8)]
      : [text(time.zone(firstSample.at), 0, afterFoot, 'start', 7.5, palette.inkLight)]),
    ...judged.map(({ fromAt, toAt }) =>
      element('rect', {
        'data-part': 'window',
        x: toX(time.clockHours(fromAt)),
        y: top,
        width: toX(time.clockHours(toAt)) - toX(time.clockHours(fromAt)),
        height: baseline - top,
        fill: palette.street,
        stroke: palette.hairline,
        'stroke-width': 0.4,
      }),
    ),
    wholeBand(firstX, lastX, beforeFoot),
    wholeBand(firstX, lastX, afterFoot),
    sunBand(area(beforeFoot, before)),
    sunBand(area(afterFoot, after)),
    ...lostBands(places, afterFoot),
    ...(firstX === undefined || lastX === undefined
      ? []
      : [
          element('line', {
            x1: firstX,
            y1: baseline,
            x2: lastX,
            y2: baseline,
            stroke: palette.ink,
            'stroke-width': 0.8,
          }),
        ]),
    ...(options.hasFigures
      ? [
          text(
            figures.duration(day.sunHours.before),
            right + figureColumns.before,
            afterFoot - 4,
            'end',
            9,
          ),
          text(
            figures.duration(day.sunHours.after),
            right + figureColumns.after,
            afterFoot - 4,
            'end',
            9,
          ),
          text(
            day.sunHours.lost < 0
              ? `gains ${figures.duration(-day.sunHours.lost)}`
              : figures.duration(day.sunHours.lost),
            right + figureColumns.lost,
            afterFoot - 4,
            'end',
            9,
            palette.ink,
            day.sunHours.lost > 0 ? 600 : 400,
          ),
        ]
      : []),
  ]);
}

/** How high a band is when the whole open area lies in sun. */
function wholeBand(firstX: number | undefined, lastX: number | undefined, foot: number): Svg {
  return element('rect', {
    x: firstX ?? 0,
    y: foot - bandHeight,
    width: (lastX ?? 0) - (firstX ?? 0),
    height: bandHeight,
    fill: 'none',
    stroke: palette.hairline,
    'stroke-width': 0.3,
  });
}

function sunBand(points: readonly SheetPoint[]): Svg {
  return element('path', {
    'data-part': 'sun',
    d: closedPath([points]),
    fill: palette.sunFill,
    stroke: palette.sunLine,
    'stroke-width': 0.4,
  });
}

/** The stretches in which sun is lost, between the curve after and the curve before. */
function lostBands(places: readonly { x: number; sample: Sample }[], foot: number): Svg[] {
  const isLost = ({ sample }: { sample: Sample }) =>
    sample.shareBefore - sample.shareAfter > leastLostShare;
  const runs: { x: number; sample: Sample }[][] = [];
  places.forEach((place, index) => {
    if (!isLost(place)) return;
    const previous = places[index - 1];
    const next = places[index + 1];
    if (previous === undefined || !isLost(previous)) {
      runs.push(previous === undefined ? [place] : [previous, place]);
    } else {
      runs[runs.length - 1]?.push(place);
    }
    if (next !== undefined && !isLost(next)) runs[runs.length - 1]?.push(next);
  });
  return runs.flatMap((run) => {
    const ring: SheetRing = [
      ...run.map(({ x, sample }): SheetPoint => [
        x,
        foot - Math.max(sample.shareBefore, sample.shareAfter) * bandHeight,
      ]),
      ...run
        .map(({ x, sample }): SheetPoint => [x, foot - sample.shareAfter * bandHeight])
        .reverse(),
    ];
    return [
      element('path', {
        'data-part': 'lost',
        d: closedPath([ring]),
        fill: palette.madder,
        'fill-opacity': 0.1,
        stroke: palette.madder,
        'stroke-width': 0.4,
      }),
      element('path', {
        'data-part': 'lost-hatch',
        d: segmentsPath(hatchLines([ring], 3, 45)),
        fill: 'none',
        stroke: palette.madder,
        'stroke-width': 0.8,
      }),
    ];
  });
}

function text(
  words: string,
  x: number,
  y: number,
  anchor: 'start' | 'middle' | 'end',
  fontSize: number,
  fill: string = palette.ink,
  weight: 400 | 600 = 400,
): Svg {
  return element(
    'text',
    { x, y, 'text-anchor': anchor, 'font-size': fontSize, 'font-weight': weight, fill },
    words,
  );
}
