import { common, without } from './overlay.ts';
import {
  evenDirection,
  extended,
  midPath,
  nearestOnPath,
  offsetPath,
  pathLength,
  placeAlong,
  type Path,
} from './path.ts';
import type { BlockPlan, LotKind, RowPlan } from './plan-blocks.ts';
import { streets, type Street } from './plan-streets.ts';
import type { Random } from './random.ts';
import {
  add,
  between,
  leftOf,
  minus,
  shapeOf,
  sidesOf,
  times,
  unit,
  type Point,
  type Shape,
} from './shape.ts';

/** A piece of ground with a front on a street. */
export interface Lot {
  shape: Shape;
  kind: LotKind;
  street: string;
  /** The ends of the front, with the lot to the left of the line between them. */
  front: readonly [Point, Point];
}

/** How far beyond its end a line is drawn so that it surely leaves the block. */
const BEYOND_M = 80;
/** No row of lots is deeper than this. */
const DEEPEST_M = 96;

const streetsOf = ({ front, alsoAlong }: RowPlan): Street[] =>
  streets.filter(({ name }) => name === front || name === alsoAlong);

const gapTo = (point: Point, street: Street): number =>
  nearestOnPath(point, street.centreLine).gapM;

/** The longest unbroken run of a block's sides along the front street of a row. */
function frontAlong(shape: Shape, row: RowPlan): Path {
  const fronted = streetsOf(row);
  const sides = sidesOf(shape.outer).map(([from, to]) => ({
    from,
    to,
    isFront: fronted.some(
      (street) => gapTo(between(from, to, 0.5), street) < street.widthM / 2 + 0.6,
    ),
  }));
  // Start the round at a side that is no front, so that no run is cut in two.
  const start = Math.max(
    0,
    sides.findIndex((side) => !side.isFront),
  );
  const runs: Point[][] = [[]];
  for (const side of [...sides.slice(start), ...sides.slice(0, start)]) {
    const run = runs.at(-1) ?? [];
    if (!side.isFront) {
      if (run.length > 0) runs.push([]);
    } else if (run.length === 0) {
      run.push(side.from, side.to);
    } else {
      run.push(side.to);
    }
  }
  const longest = runs.reduce((best, run) => (pathLength(run) > pathLength(best) ? run : best));
  if (longest.length < 2) {
    throw new Error(`The block at ${String(shape.outer[0])} has no front on ${row.front}.`);
  }
  return longest;
}

/** The ground from a front inwards to a line that runs the same way. */
const groundBetween = (front: Path, inner: Path): Shape =>
  shapeOf([
    ...extended(offsetPath(front, -6), BEYOND_M),
    ...[...extended(inner, BEYOND_M)].reverse(),
  ]);

/** Frontages of about equal comfort that add up to the whole length. */
function divideFront(lengthM: number, widthM: readonly [number, number], random: Random): number[] {
  const wish = (widthM[0] + widthM[1]) / 2;
  const count = Math.max(1, Math.round(lengthM / wish));
  const parts = Array.from({ length: count }, () => random.between(widthM[0], widthM[1]));
  const sum = parts.reduce((total, part) => total + part, 0);
  return parts.map((part) => (part / sum) * lengthM);
}

function cutRow(row: Shape, plan: RowPlan, random: Random): Lot[] {
  const front = frontAlong(row, plan);
  const length = pathLength(front);
  const widths = plan.lotWidthM ? divideFront(length, plan.lotWidthM, random) : [length];
  const cutAt = (atM: number): { point: Point; inwards: Point } => ({
    point: placeAlong(front, atM).point,
    inwards: leftOf(evenDirection(front, atM, 24)),
  });
  const sideways = (atM: number): Point => times(evenDirection(front, atM, 24), BEYOND_M);
  const lots: Lot[] = [];
  let doneM = 0;
  for (const [index, width] of widths.entries()) {
    const from = cutAt(doneM);
    const to = cutAt(doneM + width);
    const isFirst = index === 0;
    const isLast = index === widths.length - 1;
    const start = isFirst ? minus(from.point, sideways(0)) : from.point;
    const end = isLast ? add(to.point, sideways(length)) : to.point;
    const bends = front.filter((point) => {
      const { alongM } = nearestOnPath(point, front);
      return alongM > doneM + 0.01 && alongM < doneM + width - 0.01;
    });
    const ground = shapeOf([
      add(start, times(from.inwards, -6)),
      ...bends.map((point) => add(point, times(from.inwards, -6))),
      add(end, times(to.inwards, -6)),
      add(end, times(to.inwards, DEEPEST_M)),
      add(start, times(from.inwards, DEEPEST_M)),
    ]);
    const [shape] = common(row, [ground]);
    if (shape) {
      const middle = between(from.point, to.point, 0.5);
      const [street] = streetsOf(plan).sort((a, b) => gapTo(middle, a) - gapTo(middle, b));
      lots.push({
        shape,
        kind: plan.kind,
        street: street?.name ?? plan.front,
        front: [from.point, to.point],
      });
    }
    doneM += width;
  }
  return lots;
}

/** Divides a block into lots row by row; what no row takes comes back as the rest. */
export function divideBlock(
  block: Shape,
  plan: BlockPlan,
  random: Random,
): { lots: Lot[]; rest: Shape | null } {
  const lots: Lot[] = [];
  let rest: Shape | null = block;
  for (const [index, row] of plan.rows.entries()) {
    if (!rest) break;
    const ahead: RowPlan | undefined = plan.rows[index + 1];
    let ground: Shape | null = null;
    if (row.depthM !== undefined) {
      const front = frontAlong(rest, row);
      ground = groundBetween(front, offsetPath(front, row.depthM));
    } else if (ahead && index === plan.rows.length - 2) {
      const front = frontAlong(rest, row);
      const opposite = [...frontAlong(rest, ahead)].reverse();
      ground = groundBetween(front, midPath(front, opposite, 7));
    }
    const taken: Shape | undefined = ground ? common(rest, [ground])[0] : rest;
    if (taken) lots.push(...cutRow(taken, row, random));
    rest = ground ? (without(rest, [ground])[0] ?? null) : null;
  }
  return { lots, rest };
}

/** The lot's own frame: from the middle of its front, along it and inwards. */
export interface LotFrame {
  widthM: number;
  /** The point this far to the right along the front and this far in from it. */
  at: (alongM: number, inM: number) => Point;
}

export function frameOf(lot: Pick<Lot, 'front'>): LotFrame {
  const [from, to] = lot.front;
  const along = unit(minus(to, from));
  const inwards = leftOf(along);
  const middle = between(from, to, 0.5);
  return {
    widthM: Math.hypot(...minus(to, from)),
    at: (alongM, inM) => add(middle, add(times(along, alongM), times(inwards, inM))),
  };
}

/** A rectangle in a lot's frame. */
export const frameRectangle = (
  frame: LotFrame,
  [leftM, rightM]: readonly [number, number],
  [nearM, farM]: readonly [number, number],
): Shape =>
  shapeOf([
    frame.at(leftM, nearM),
    frame.at(rightM, nearM),
    frame.at(rightM, farM),
    frame.at(leftM, farM),
  ]);
