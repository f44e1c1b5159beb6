import { measuresShade } from './measures.ts';
import { measureUnits, type LimitLeaf, type RuleLimit, type RuleMeasure } from './rule-schema.ts';

/** A measure's value in each state, and what else its limits need. */
export interface MeasuredValue {
  before: number;
  after: number;
  theoretical: number;
  /** How much the value can change within one step. */
  tolerance: number;
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
 * decides it is met or missed by no more than one step can change.
 */
export function evaluateLimit(
  limit: RuleLimit,
  clauseMeasure: RuleMeasure,
  disregardAreaM2: number,
  valueOf: (measure: RuleMeasure) => MeasuredValue,
): LimitOutcome {
  const tests: LimitTest[] = [];
  const evaluate = (part: RuleLimit): { met: boolean; steps: number } => {
    if ('anyOf' in part) return decide(part.anyOf.map(evaluate), 'any');
    if ('allOf' in part) return decide(part.allOf.map(evaluate), 'all');
    const measure = part.measure ?? clauseMeasure;
    const value = valueOf(measure);
    const test = testLeaf(part, measure, value, disregardAreaM2);
    tests.push(test);
    // Shade that is judged place by place has its margin in m² and its own allowance.
    const isPlaceByPlace = 'noWorse' in part && measuresShade(measure.kind);
    const tolerance = isPlaceByPlace ? 0 : value.tolerance;
    return { met: test.met, steps: stepsFromLimit(test.margin, tolerance) };
  };
  const { met, steps } = evaluate(limit);
  return { met, close: Math.abs(steps) <= 1, tests };
}

/** The members of a limit decide by the one that is furthest on the right side, or the least far. */
function decide(parts: { met: boolean; steps: number }[], by: 'any' | 'all') {
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
  };
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
    const limit = 1 - leaf.keeps * (1 - value.before);
    return { limit, margin: limit - value.after };
  }
  if ('losesAtMost' in leaf) return { limit: leaf.losesAtMost, margin: leaf.losesAtMost - lost };
  if ('losesAtMostShare' in leaf) {
    const whole = leaf.of === 'theoretical' ? value.theoretical : value.before;
    const limit = leaf.losesAtMostShare * (isShade ? 1 - whole : whole);
    return { limit, margin: limit - lost };
  }
  // Shade is judged place by place: what is gained elsewhere does not make up for it.
  if (isShade) return { limit: value.before, margin: disregardAreaM2 - value.largestNetNewM2 };
  return { limit: value.before, margin: value.after - value.before };
}

/** The single limits of a clause, in the order in which their tests stand in an outcome. */
export function leavesOf(limit: RuleLimit): LimitLeaf[] {
  if ('anyOf' in limit) return limit.anyOf.flatMap(leavesOf);
  if ('allOf' in limit) return limit.allOf.flatMap(leavesOf);
  return [limit];
}
