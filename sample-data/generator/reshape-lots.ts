import { frameOf, frameRectangle, type Lot } from './lots.ts';
import { common, joined, without } from './overlay.ts';
import type { Random } from './random.ts';
import { areaOf, dot, minus, unit, leftOf, type Point } from './shape.ts';

const FAR_M = 200;
/** The lane that leads to a lot at the back. */
const LANE_M = 4.5;

function depthOf(lot: Lot): number {
  const [from, to] = lot.front;
  const inwards = leftOf(unit(minus(to, from)));
  return Math.max(...lot.shape.outer.map((corner: Point) => dot(minus(corner, from), inwards)));
}

/** The neighbour's back ground goes to the first lot, which becomes L-shaped. */
function tradeBackGround(lot: Lot, neighbour: Lot): [Lot, Lot] {
  const depth = Math.min(depthOf(lot), depthOf(neighbour));
  const back = frameRectangle(frameOf(neighbour), [-FAR_M, FAR_M], [depth * 0.7, FAR_M]);
  const [given] = common(neighbour.shape, [back]);
  const [kept] = without(neighbour.shape, [back]);
  const [grown, stray] = given ? joined([lot.shape, given]) : [];
  return kept && grown && !stray
    ? [
        { ...lot, shape: grown },
        { ...neighbour, shape: kept },
      ]
    : [lot, neighbour];
}

/** A deep lot becomes a front lot and a flag lot behind it, reached by a lane along one side. */
function splitFlag(lot: Lot): Lot[] {
  const frame = frameOf(lot);
  const frontDepthM = depthOf(lot) * 0.46;
  const half = frame.widthM / 2;
  const square = frameRectangle(frame, [-half + LANE_M, FAR_M], [-FAR_M, frontDepthM]);
  const [ahead] = common(lot.shape, [square]);
  const [behind, stray] = without(lot.shape, [square]);
  if (!ahead || !behind || stray) return [lot];
  return [
    {
      ...lot,
      kind: 'house',
      shape: ahead,
      front: [frame.at(-half + LANE_M, 0), frame.at(half, 0)],
    },
    { ...lot, shape: behind, front: [frame.at(-half, frontDepthM), frame.at(half, frontDepthM)] },
  ];
}

/** Makes a few lots of a row irregular, as sales between neighbours do over the years. */
export function reshapeLots(lots: readonly Lot[], random: Random): Lot[] {
  const reshaped: Lot[] = [];
  for (let index = 0; index < lots.length; index++) {
    const lot = lots[index];
    const neighbour = lots[index + 1];
    if (!lot) continue;
    const areNeighbours =
      neighbour?.street === lot.street && neighbour.front[0].join() === lot.front[1].join();
    if (lot.kind === 'waterfront' && areaOf(lot.shape) > 1400 && random.chance(0.5)) {
      reshaped.push(...splitFlag(lot));
    } else if (lot.kind === 'house' && neighbour && areNeighbours && random.chance(0.06)) {
      reshaped.push(...tradeBackGround(lot, neighbour));
      index++;
    } else {
      reshaped.push(lot);
    }
  }
  return reshaped;
}
