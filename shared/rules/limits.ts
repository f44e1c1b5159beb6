import { measureUnits, measuresShade } from './measure-kinds.ts';
import type { LimitLeaf, RuleLimit, RuleMeasure } from './rule-schema.ts';

/** A measure's value in each state. */
export interface StateValues {
  before: number;
  after: number;
  theoretical: number;
}

/** A measure's value in each state, and what else its limits need. */
export interface MeasuredValue extends StateValues {
  /** How much the value can change within one step, or one grid spacing. */
  tolerance: number;
  /** What a measure of shade is the rest of: the whole area, or the whole judged time. */
  whole: number;
  /** The values by each of the sampling grids of twice the spacing; none where nothing is sampled. */
  coarser: readonly StateValues[];
  /** The largest area in m² that is shaded after and not before at any judged instant. */
  largestNetNewM2: number;
}

/** One limit held against one measure. */
export interface LimitTest {
  measure: RuleMeasure['kind'];
  unit: string;
  before: number;
  after: number;
  /** The bound on the value after or, where the rule limits a loss, on the loss. */
  limit: number;
  /** How far on the right side of the limit; negative when not met. */
  margin: number;
  met: boolean;
  /** By how many sampling grids of twice the spacing the limit was tried as well. */
  coarserGrids: number;
  /** How much the worst of them differs, in the measure's unit; null where nothing is sampled. */
  samplingError: number | null;
}

export interface LimitOutcome {
  met: boolean;
  close: boolean;
  /** One for each limit, in the order in which they stand in the rule. */
  tests: LimitTest[];
}

/** What rounding may do to a value that stands exactly on its limit. */
const rounding = 1e-9;

/**
 * Holds a clause's limits against its measured values. An outcome is `close` when the limit that
 * decides it is met or missed by no more than one step or one grid spacing can change, or when one
 * of the sampling grids of twice the spacing decides otherwise.
 */
export function evaluateLimit(
  limit: RuleLimit,
  clauseMeasure: RuleMeasure,
  disregardAreaM2: number,
  valueOf: (measure: RuleMeasure) => MeasuredValue,
): LimitOutcome {
  const tests: LimitTest[] = [];
  const decision = decide(limit, clauseMeasure, disregardAreaM2, valueOf, tests);
  const gridCount = tests.reduce((most, { coarserGrids }) => Math.max(most, coarserGrids), 0);
  const hangsOnGrid = Array.from({ length: gridCount }, (_, grid) => {
    const byGrid = (measure: RuleMeasure): MeasuredValue => {
      const value = valueOf(measure);
      return { ...value, ...value.coarser[grid] };
    };
    return decide(limit, clauseMeasure, disregardAreaM2, byGrid, []).met;
  }).some((met) => met !== decision.met);
  return { met: decision.met, close: Math.abs(decision.steps) <= 1 || hangsOnGrid, tests };
}

interface Decision {
  met: boolean;
  /** How many steps or spacings from the limit. */
  steps: number;
}

function decide(
  limit: RuleLimit,
  clauseMeasure: RuleMeasure,
  disregardAreaM2: number,
  valueOf: (measure: RuleMeasure) => MeasuredValue,
  tests: LimitTest[],
): Decision {
  const decidePart = (part: RuleLimit) =>
    decide(part, clauseMeasure, disregardAreaM2, valueOf, tests);
  if ('anyOf' in limit) return join(limit.anyOf.map(decidePart), 'any');
  if ('allOf' in limit) return join(limit.allOf.map(decidePart), 'all');
  const measure = limit.measure ?? clauseMeasure;
  const value = valueOf(measure);
  const test = testLeaf(limit, measure, value, disregardAreaM2);
  tests.push(test);
  // Shade that is judged place by place has its margin in m² and its own allowance.
  const tolerance = isPlaceByPlace(limit, measure) ? 0 : value.tolerance;
  return { met: test.met, steps: stepsFromLimit(test.margin, tolerance) };
}

/** Whether shade is judged place by place: what is gained elsewhere does not make up for it. */
function isPlaceByPlace(leaf: LimitLeaf, measure: RuleMeasure): boolean {
  return 'noWorse' in leaf && measure.kind === 'shade-share';
}

/** The members of a limit decide by the one that is furthest on the right side, or the least far. */
function join(parts: readonly Decision[], by: 'any' | 'all'): Decision {
  const steps = parts.map((part) => part.steps);
  return by === 'any'
    ? { met: parts.some((part) => part.met), steps: Math.max(...steps) }
    : { met: parts.every((part) => part.met), steps: Math.min(...steps) };
}

function stepsFromLimit(margin: number, tolerance: number): number {
  if (tolerance > 0) return margin / tolerance;
  return margin < 0 ? -Infinity : Infinity;
}

function testLeaf(
  leaf: LimitLeaf,
  measure: RuleMeasure,
  value: MeasuredValue,
  disregardAreaM2: number,
): LimitTest {
  const { limit, margin } = boundOf(leaf, measure, value, disregardAreaM2);
  return {
    measure: measure.kind,
    unit: measureUnits[measure.kind],
    before: value.before,
    after: value.after,
    limit,
    margin,
    met: margin >= -rounding,
    coarserGrids: value.coarser.length,
    samplingError: largestDifference(value),
  };
}

/** How far a grid of twice the spacing is from the value before or after; null where nothing is sampled. */
function largestDifference({ before, after, coarser }: MeasuredValue): number | null {
  if (coarser.length === 0) return null;
  return Math.max(
    ...coarser.flatMap((one) => [Math.abs(one.before - before), Math.abs(one.after - after)]),
  );
}

function boundOf(
  leaf: LimitLeaf,
  measure: RuleMeasure,
  value: MeasuredValue,
  disregardAreaM2: number,
): { limit: number; margin: number } {
  const isShade = measuresShade(measure.kind);
  // A share of shade loses sun by growing.
  const lost = isShade ? value.after - value.before : value.before - value.after;
  if ('atLeast' in leaf) return { limit: leaf.atLeast, margin: value.after - leaf.atLeast };
  if ('atMost' in leaf) return { limit: leaf.atMost, margin: leaf.atMost - value.after };
  if ('keeps' in leaf) {
    if (!isShade) {
      const limit = leaf.keeps * value.before;
      return { limit, margin: value.after - limit };
    }
    const limit = value.whole - leaf.keeps * (value.whole - value.before);
    return { limit, margin: limit - value.after };
  }
  if ('losesAtMost' in leaf) return { limit: leaf.losesAtMost, margin: leaf.losesAtMost - lost };
  if ('losesAtMostShare' in leaf) {
    const base = leaf.of === 'theoretical' ? value.theoretical : value.before;
    const limit = leaf.losesAtMostShare * (isShade ? value.whole - base : base);
    return { limit, margin: limit - lost };
  }
  if (isPlaceByPlace(leaf, measure)) {
    return { limit: value.before, margin: disregardAreaM2 - value.largestNetNewM2 };
  }
  return { limit: value.before, margin: -lost };
}

/** The single limits of a clause, in the order in which their tests stand in an outcome. */
export function leavesOf(limit: RuleLimit): LimitLeaf[] {
  if ('anyOf' in limit) return limit.anyOf.flatMap(leavesOf);
  if ('allOf' in limit) return limit.allOf.flatMap(leavesOf);
  return [limit];
}
