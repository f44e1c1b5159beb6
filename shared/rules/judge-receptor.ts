import { runsAbove, type DayLight, type Run } from './day-light.ts';
import { evaluateLimit, type LimitOutcome, type MeasuredValue } from './limits.ts';
import { addsUpOverDays, measureDay, measuresShade, stepTolerance } from './measures.ts';
import type { DayGroup } from './rule-days.ts';
import type { Rule, RuleClause, RuleMeasure } from './rule-schema.ts';

/** How one receptor stands under one clause: `met`, `not-met`, `disregarded` or `not-affected`. */
export interface ClauseJudgement extends LimitOutcome {
  /** The civil day judged, the worst of a season; null where the measure adds up over the days. */
  day: string | null;
  finding: 'met' | 'not-met' | 'disregarded' | 'not-affected';
  /** (before − after) / before in the clause's measure, of its complement for shade; null where before is 0. */
  loss: number | null;
  band: string | null;
  /** For a season: on how many days the limit is not met. */
  daysNotMet: number | null;
}

/** Shade that appears or goes on less than this is rounding, m². */
const leastChangeM2 = 0.005;

/**
 * Judges one receptor by one clause: once for each single day, once for a season by its worst day,
 * and once over all days where the measure adds up.
 *
 * @param lightOf the light on the receptor on a judged day
 */
export function judgeReceptor(
  clause: RuleClause,
  groups: readonly DayGroup[],
  bands: Rule['bands'],
  lightOf: (date: string) => DayLight,
): ClauseJudgement[] {
  if (addsUpOverDays(clause.measure.kind)) {
    const dates = [...new Set(groups.flatMap((group) => group.dates))];
    return [judgeDays(clause, bands, dates.map(lightOf), null)];
  }
  return groups.map((group) => {
    const days = group.dates.map((date) => judgeDays(clause, bands, [lightOf(date)], date));
    const worst = days.reduce((least, day) => (isWorse(day, least) ? day : least));
    if (!group.isSeason) return worst;
    return { ...worst, daysNotMet: days.filter((day) => day.finding === 'not-met').length };
  });
}

/** Direct energy in kWh on the whole judged area over the days, for the loss index. */
export function beamEnergyKwh(days: readonly DayLight[], state: 'before' | 'after'): number {
  return days.reduce(
    (sum, day) => sum + measureDay({ kind: 'beam-energy' }, day, state) * day.areaM2,
    0,
  );
}

function judgeDays(
  clause: RuleClause,
  bands: Rule['bands'],
  days: readonly DayLight[],
  day: string | null,
): ClauseJudgement {
  const valueOf = memoize((measure: RuleMeasure) => measureDays(measure, days, clause.step));
  const outcome = evaluateLimit(clause.limit, clause.measure, clause.disregard.area, valueOf);
  const loss = lossOf(clause.measure, valueOf(clause.measure));
  return {
    ...outcome,
    day,
    finding: findingOf(clause, days, outcome.met),
    loss,
    band: bandOf(loss, bands),
    daysNotMet: null,
  };
}

function findingOf(
  clause: RuleClause,
  days: readonly DayLight[],
  isMet: boolean,
): ClauseJudgement['finding'] {
  const lights = days.flatMap((day) => day.spans.flatMap((span) => span.lights));
  const isAffected = lights.some(
    ({ netNewM2, removedM2 }) => netNewM2 > leastChangeM2 || removedM2 > leastChangeM2,
  );
  if (!isAffected) return 'not-affected';
  if (isMet) return 'met';
  const isDisregarded = days.every((day) => netNewMinutes(clause, day) <= clause.disregard.minutes);
  return isDisregarded ? 'disregarded' : 'not-met';
}

/** Minutes of a day's window in which more than the disregarded area is shaded anew. */
function netNewMinutes(clause: RuleClause, day: DayLight): number {
  const runs = day.spans.flatMap((span): Run[] =>
    runsAbove(span, clause.disregard.area, (index) => span.lights[index]?.netNewM2 ?? 0, true),
  );
  const isInstantOver = runs.some((run) => run.startMs === run.endMs);
  const minutes = runs.reduce((sum, run) => sum + (run.endMs - run.startMs) / 60_000, 0);
  // A window of one instant has no length: shade at it counts as lasting.
  return isInstantOver && minutes === 0 ? Infinity : minutes;
}

function measureDays(
  measure: RuleMeasure,
  days: readonly DayLight[],
  stepMin: number,
): MeasuredValue {
  const sum = (valueOf: (day: DayLight) => number) =>
    days.reduce((total, day) => total + valueOf(day), 0);
  const netNew = days.flatMap((day) =>
    day.spans.flatMap((span) => span.lights.map((light) => light.netNewM2)),
  );
  return {
    before: sum((day) => measureDay(measure, day, 'before')),
    after: sum((day) => measureDay(measure, day, 'after')),
    theoretical: sum((day) => measureDay(measure, day, 'theoretical')),
    tolerance: sum((day) => stepTolerance(measure, day, stepMin)),
    largestNetNewM2: Math.max(0, ...netNew),
  };
}

function lossOf(measure: RuleMeasure, value: MeasuredValue): number | null {
  const isShade = measuresShade(measure.kind);
  const before = isShade ? 1 - value.before : value.before;
  const after = isShade ? 1 - value.after : value.after;
  return before > 0 ? (before - after) / before : null;
}

function bandOf(loss: number | null, bands: Rule['bands']): string | null {
  if (loss === null || loss <= 0) return null;
  return bands.find((band) => loss <= band.upTo)?.label ?? null;
}

const severity = { 'not-affected': 0, met: 1, disregarded: 2, 'not-met': 3 } as const;

function isWorse(day: ClauseJudgement, than: ClauseJudgement): boolean {
  const difference = severity[day.finding] - severity[than.finding];
  if (difference !== 0) return difference > 0;
  return decisiveMargin(day) < decisiveMargin(than);
}

function decisiveMargin(judgement: ClauseJudgement): number {
  return Math.max(...judgement.tests.map((test) => test.margin));
}

function memoize(compute: (measure: RuleMeasure) => MeasuredValue) {
  const known = new Map<string, MeasuredValue>();
  return (measure: RuleMeasure): MeasuredValue => {
    const key = JSON.stringify(measure);
    const value = known.get(key) ?? compute(measure);
    known.set(key, value);
    return value;
  };
}
