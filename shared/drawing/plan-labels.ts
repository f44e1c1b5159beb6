import type { Polygonal } from '../geometry/geojson-schema.ts';
import type { FigureFormat } from './figure-format.ts';
import type { Frame, SheetPoint, SheetRing } from './frame.ts';
import { boxAround, placeBeside, placeInside, type LabelBox } from './label-placement.ts';
import { palette } from './palette.ts';
import { element, type Svg } from './svg.ts';
import { estimateTextWidth } from './text-width.ts';

/** A street, a water or an open space. */
export interface NamedArea {
  name: string;
  geometry: Polygonal;
}

/** Labels that found a place, and the boxes that they take. */
export interface PlacedLabels {
  drawn: Svg[];
  boxes: LabelBox[];
}

/** The top heights of the proposal's blocks, `+44.0 m`: inside each block where it has room, else beside it with a line. */
export function drawBlockHeights(
  blocks: readonly { rings: SheetRing[]; topM: number }[],
  frame: Frame,
  figures: FigureFormat,
  taken: readonly LabelBox[],
  fontSize: number,
): PlacedLabels {
  const visible = blocks.filter(({ rings }) => rings.length > 0);
  const site = boxAround(visible.flatMap(({ rings }) => rings));
  const boxes: LabelBox[] = [];
  const drawn = visible.flatMap(({ rings, topM }) => {
    const text = figures.height(topM);
    const size = { width: estimateTextWidth(text, fontSize) + 4, height: fontSize * 1.4 };
    const higher = visible.filter((other) => other.topM > topM).map((other) => other.rings);
    const busy = [...taken, ...boxes];
    const inside = placeInside(rings, size, busy, higher);
    if (inside !== null) {
      boxes.push(inside);
      return [boxedText(inside, text, fontSize, 400, palette.ink)];
    }
    const outside = [cornersOf(site)];
    const box = placeBeside(outside, size, busy, frame);
    boxes.push(box);
    return [
      leader(middleOf(placeInside(rings, dot, [], higher) ?? boxAround(rings)), box),
      boxedText(box, text, fontSize, 400, palette.ink),
    ];
  });
  return { drawn, boxes };
}

/** The marks of receptors that don't meet a clause: a number in each, as in the list beside. */
export function drawKeys(
  keys: readonly { rings: SheetRing[]; mark: string }[],
  frame: Frame,
  taken: readonly LabelBox[],
  fontSize: number,
): PlacedLabels {
  const boxes: LabelBox[] = [];
  const marked = new Set<string>();
  const drawn = keys.flatMap(({ rings, mark }) => {
    if (rings.length === 0 || marked.has(mark)) return [];
    marked.add(mark);
    const size = { width: estimateTextWidth(mark, fontSize, 600) + 4, height: fontSize * 1.3 };
    const busy = [...taken, ...boxes];
    const box = placeInside(rings, size, busy) ?? placeBeside(rings, size, busy, frame);
    boxes.push(box);
    return [boxedText(box, mark, fontSize, 600, palette.madder)];
  });
  return { drawn, boxes };
}

/** Names of waters and open spaces inside them, where there is room. */
export function drawAreaNames(
  areas: readonly NamedArea[],
  frame: Frame,
  taken: readonly LabelBox[],
  fontSize: number,
): PlacedLabels {
  const boxes: LabelBox[] = [];
  const drawn = areas.flatMap(({ name, geometry }) => {
    const rings = frame.cutRings(geometry);
    if (rings.length === 0) return [];
    const size = { width: estimateTextWidth(name, fontSize) + 6, height: fontSize * 1.5 };
    const box = placeInside(rings, size, [...taken, ...boxes]);
    if (box === null) return [];
    boxes.push(box);
    return [boxedText(box, name, fontSize, 400, palette.inkLight)];
  });
  return { drawn, boxes };
}

const dot = { width: 3, height: 3 };

/** A line from a block to its label outside, with a dot on the block. */
function leader(from: SheetPoint, to: LabelBox): Svg {
  const [x, y] = from;
  const end: SheetPoint = [x < to.x ? to.x : Math.min(x, to.x + to.width), to.y + to.height / 2];
  return element(
    'g',
    {},
    element('path', {
      d: `M${x} ${y}L${end[0]} ${end[1]}`,
      stroke: palette.ink,
      'stroke-width': 0.6,
      fill: 'none',
    }),
    element('circle', { cx: x, cy: y, r: 1.4, fill: palette.ink }),
  );
}

function middleOf(box: LabelBox): SheetPoint {
  return [box.x + box.width / 2, box.y + box.height / 2];
}

function cornersOf({ x, y, width, height }: LabelBox): SheetRing {
  return [
    [x, y],
    [x + width, y],
    [x + width, y + height],
    [x, y + height],
  ];
}

function boxedText(
  box: LabelBox,
  text: string,
  fontSize: number,
  weight: 400 | 600,
  color: string,
): Svg {
  return element(
    'g',
    {},
    element('rect', {
      x: box.x,
      y: box.y,
      width: box.width,
      height: box.height,
      fill: palette.paper,
      'fill-opacity': 0.85,
    }),
    element(
      'text',
      {
        x: box.x + box.width / 2,
        y: box.y + box.height / 2 + fontSize * 0.36,
        'text-anchor': 'middle',
        'font-size': fontSize,
        'font-weight': weight,
        fill: color,
      },
      text,
    ),
  );
}
