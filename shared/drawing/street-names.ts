import type { Frame, SheetPoint } from './frame.ts';
import { boxesMeet, type LabelBox } from './label-placement.ts';
import { palette } from './palette.ts';
import { element, type Svg } from './svg.ts';
import { estimateTextWidth } from './text-width.ts';

/** The middle line of a street; longitude and latitude. */
export interface StreetLine {
  name: string;
  lines: readonly (readonly [number, number])[][];
}

/** How much shorter than the street a chord may be for a name to follow it. */
const leastStraightness = 0.985;

/**
 * Writes the names of streets along their middle lines, once each, where a line is straight enough
 * and nothing is in the way; never upside down. A name that finds no place is left out.
 */
export function drawStreetNames(
  streets: readonly { name: string; lines: readonly (readonly SheetPoint[])[] }[],
  frame: Frame,
  taken: readonly LabelBox[],
  fontSize: number,
): { drawn: Svg[]; boxes: LabelBox[] } {
  const drawn: Svg[] = [];
  const boxes: LabelBox[] = [];
  const named = new Set<string>();
  for (const { name, lines } of streets) {
    if (named.has(name)) continue;
    const width = estimateTextWidth(name, fontSize);
    const place = lines
      .flatMap((line) => listPlaces(line, width, fontSize))
      .filter(
        ({ box }) =>
          isInFrame(box, frame) && ![...taken, ...boxes].some((other) => boxesMeet(box, other)),
      )
      .sort((a, b) => distanceToMiddle(a.middle, frame) - distanceToMiddle(b.middle, frame))[0];
    if (place === undefined) continue;
    named.add(name);
    boxes.push(place.box);
    drawn.push(
      element(
        'text',
        {
          transform: `translate(${place.middle[0].toFixed(1)} ${place.middle[1].toFixed(1)}) rotate(${place.angleDeg.toFixed(1)})`,
          y: fontSize * 0.35,
          'text-anchor': 'middle',
          'font-size': fontSize,
          fill: palette.inkLight,
        },
        name,
      ),
    );
  }
  return { drawn, boxes };
}

interface NamePlace {
  middle: SheetPoint;
  /** Clockwise on the sheet, from −90 to 90. */
  angleDeg: number;
  box: LabelBox;
}

function listPlaces(line: readonly SheetPoint[], width: number, fontSize: number): NamePlace[] {
  const places: NamePlace[] = [];
  const total = lengthOf(line);
  for (let start = 4; start + width <= total - 4; start += 6) {
    const from = pointAlong(line, start);
    const to = pointAlong(line, start + width);
    const chord = [to[0] - from[0], to[1] - from[1]] as const;
    if (Math.hypot(chord[0], chord[1]) < width * leastStraightness) continue;
    const isForward = chord[0] > 0.01 || (Math.abs(chord[0]) <= 0.01 && chord[1] < 0);
    const sign = isForward ? 1 : -1;
    const middle = pointAlong(line, start + width / 2);
    const boxWidth = Math.abs(chord[0]) + fontSize * 1.2;
    const boxHeight = Math.abs(chord[1]) + fontSize * 1.2;
    places.push({
      middle,
      angleDeg: (Math.atan2(chord[1] * sign, chord[0] * sign) * 180) / Math.PI,
      box: {
        x: middle[0] - boxWidth / 2,
        y: middle[1] - boxHeight / 2,
        width: boxWidth,
        height: boxHeight,
      },
    });
  }
  return places;
}

function lengthOf(line: readonly SheetPoint[]): number {
  return line
    .slice(1)
    .reduce((sum, point, index) => sum + distance(line[index] ?? point, point), 0);
}

function pointAlong(line: readonly SheetPoint[], far: number): SheetPoint {
  let left = far;
  let from = line[0] ?? [0, 0];
  for (const to of line.slice(1)) {
    const length = distance(from, to);
    if (left <= length && length > 0) {
      const share = left / length;
      return [from[0] + (to[0] - from[0]) * share, from[1] + (to[1] - from[1]) * share];
    }
    left -= length;
    from = to;
  }
  return from;
}

function isInFrame(box: LabelBox, frame: Frame): boolean {
  return (
    box.x >= 2 &&
    box.y >= 2 &&
    box.x + box.width <= frame.width - 2 &&
    box.y + box.height <= frame.height - 2
  );
}

function distanceToMiddle(point: SheetPoint, frame: Frame): number {
  return distance(point, [frame.width / 2, frame.height / 2]);
}

function distance(a: SheetPoint, b: SheetPoint): number {
  return Math.hypot(b[0] - a[0], b[1] - a[1]);
}
