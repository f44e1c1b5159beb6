import type { Polygonal } from '../geometry/geojson-schema.ts';
import type { FigureFormat } from './figure-format.ts';
import type { Frame, SheetRing } from './frame.ts';
import {
  boxAround,
  boxesMeet,
  isInside,
  placeBeside,
  placeInside,
  type LabelBox,
} from './label-placement.ts';
import { palette } from './palette.ts';
import { element, type Svg } from './svg.ts';
import { estimateTextWidth } from './text-width.ts';

/** A street, a water or an open space. */
export interface NamedArea {
  name: string;
  geometry: Polygonal;
}

/** Labels that found a place, and the boxes that they take. */
interface PlacedLabels {
  drawn: Svg[];
  boxes: LabelBox[];
}

/** The top heights of the proposal's blocks, `+44.0 m`, inside each block where it has room. */
export function drawBlockHeights(
  blocks: readonly { rings: SheetRing[]; topM: number }[],
  frame: Frame,
  figures: FigureFormat,
  taken: readonly LabelBox[],
): PlacedLabels {
  const fontSize = 8.5;
  const visible = blocks.filter(({ rings }) => rings.length > 0);
  const boxes: LabelBox[] = [];
  const drawn = visible.map(({ rings, topM }) => {
    const text = figures.height(topM);
    const size = { width: estimateTextWidth(text, fontSize) + 6, height: fontSize * 1.5 };
    const higher = visible
      .filter((other) => other.topM > topM)
      .map((other) => boxAround(other.rings));
    const busy = [...taken, ...boxes];
    const box =
      placeInside(rings, size, [...busy, ...higher]) ?? placeBeside(rings, size, busy, frame);
    boxes.push(box);
    return boxedText(box, text, fontSize, 400, palette.ink);
  });
  return { drawn, boxes };
}

/** The marks of receptors that don't meet a clause: a number in each, as in the list beside. */
export function drawKeys(
  keys: readonly { rings: SheetRing[]; mark: string }[],
  frame: Frame,
  taken: readonly LabelBox[],
): PlacedLabels {
  const fontSize = 7.5;
  const boxes: LabelBox[] = [];
  const marked = new Set<string>();
  const drawn = keys.flatMap(({ rings, mark }) => {
    if (rings.length === 0 || marked.has(mark)) return [];
    marked.add(mark);
    const size = { width: estimateTextWidth(mark, fontSize, 600) + 4, height: fontSize * 1.35 };
    const busy = [...taken, ...boxes];
    const box = placeInside(rings, size, busy) ?? placeBeside(rings, size, busy, frame);
    boxes.push(box);
    return [boxedText(box, mark, fontSize, 600, palette.madder)];
  });
  return { drawn, boxes };
}

/** Names of streets along them, and of water and open space inside them, where there is room. */
export function drawNames(
  content: {
    streets: readonly NamedArea[];
    water: readonly NamedArea[];
    openSpace: readonly NamedArea[];
  },
  frame: Frame,
  taken: readonly LabelBox[],
): PlacedLabels {
  const drawn: Svg[] = [];
  const boxes: LabelBox[] = [];
  for (const { name, geometry } of content.streets) {
    const placed = placeAlong(frame.cutRings(geometry), name, [...taken, ...boxes]);
    if (placed === null) continue;
    boxes.push(placed.box);
    drawn.push(placed.label);
  }
  for (const { name, geometry } of [...content.water, ...content.openSpace]) {
    const rings = frame.cutRings(geometry);
    if (rings.length === 0) continue;
    const size = { width: estimateTextWidth(name, nameSize) + 6, height: nameSize * 1.5 };
    const box = placeInside(rings, size, [...taken, ...boxes]);
    if (box === null) continue;
    boxes.push(box);
    drawn.push(boxedText(box, name, nameSize, 400, palette.inkLight));
  }
  return { drawn, boxes };
}

const nameSize = 7;

/** A street's name on its middle line, turned to its direction, never upside down. */
function placeAlong(
  rings: readonly SheetRing[],
  name: string,
  taken: readonly LabelBox[],
): { label: Svg; box: LabelBox } | null {
  const longest = longestEdge(rings);
  if (longest === null) return null;
  const { angleRad, length } = longest;
  const width = estimateTextWidth(name, nameSize);
  if (length < width * 1.3) return null;
  const along: [number, number] = [Math.cos(angleRad), Math.sin(angleRad)];
  const across: [number, number] = [-along[1], along[0]];
  // From the edge inward by half the street's width, found by probing both sides.
  for (const share of [0.5, 0.3, 0.7, 0.15, 0.85]) {
    const onEdge: [number, number] = [
      longest.from[0] + along[0] * length * share,
      longest.from[1] + along[1] * length * share,
    ];
    const middle = middleOfStreet(onEdge, across, rings);
    if (middle === null) continue;
    const halfX = (Math.abs(along[0]) * width + nameSize * 1.2) / 2;
    const halfY = (Math.abs(along[1]) * width + nameSize * 1.2) / 2;
    const box = { x: middle[0] - halfX, y: middle[1] - halfY, width: halfX * 2, height: halfY * 2 };
    if (taken.some((other) => boxesMeet(box, other))) continue;
    const ends = [-0.5, 0.5].map(
      (end) => [middle[0] + along[0] * width * end, middle[1] + along[1] * width * end] as const,
    );
    if (!ends.every((end) => isInside(end, rings))) continue;
    const label = element(
      'text',
      {
        transform: `translate(${middle[0].toFixed(1)} ${middle[1].toFixed(1)}) rotate(${((angleRad * 180) / Math.PI).toFixed(1)})`,
        y: nameSize * 0.35,
        'text-anchor': 'middle',
        'font-size': nameSize,
        fill: palette.inkLight,
      },
      name,
    );
    return { label, box };
  }
  return null;
}

function longestEdge(
  rings: readonly SheetRing[],
): { from: readonly [number, number]; length: number; angleRad: number } | null {
  let longest: { from: readonly [number, number]; length: number; angleRad: number } | null = null;
  for (const ring of rings) {
    ring.forEach((a, index) => {
      const b = ring[(index + 1) % ring.length] ?? a;
      // Left to right, so that the name reads the right way up; upright ones read upward.
      const isForward = b[0] > a[0] + 0.01 || (Math.abs(b[0] - a[0]) <= 0.01 && b[1] < a[1]);
      const [from, to] = isForward ? [a, b] : [b, a];
      const length = Math.hypot(to[0] - from[0], to[1] - from[1]);
      if (longest === null || length > longest.length) {
        longest = { from, length, angleRad: Math.atan2(to[1] - from[1], to[0] - from[0]) };
      }
    });
  }
  return longest;
}

function middleOfStreet(
  onEdge: readonly [number, number],
  across: readonly [number, number],
  rings: readonly SheetRing[],
): [number, number] | null {
  for (const side of [1, -1]) {
    let depth = 0;
    const at = (distance: number): [number, number] => [
      onEdge[0] + across[0] * side * distance,
      onEdge[1] + across[1] * side * distance,
    ];
    while (depth < 60 && isInside(at(depth + 0.5), rings)) depth += 0.5;
    if (depth >= nameSize * 0.9 && depth < 60) return at(depth / 2);
  }
  return null;
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
