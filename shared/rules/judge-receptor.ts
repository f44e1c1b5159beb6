import { runsAbove, type DayLight, type Run } from './day-light.ts';
import { evaluateLimit, type LimitOutcome, type MeasuredValue } from './limits.ts';
import { addsUpOverDays, measuresOf, measuresShade, needsSamples } from './measure-kinds.ts';
import { measureDay, measureTolerance, wholeOf } from './measures.ts';
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

/** Judges one receptor by one clause, day by day as the light of each is known. */
export interface ReceptorJudge {
  /** Takes a judged day's light; in any order, each day once. */
  takeDay: (day: DayLight) => void;
  /** Direct energy in kWh on the whole judged area over the days taken, for the loss index. */
  energyKwh: () => { before: number; after: number };
  /** When all days are taken. @throws when a day is missing */
  judge: () => ClauseJudgement[];
}

/** Shade that appears or goes on less than this is rounding: m², or the share of a window. */
const leastChangeM2 = 0.005;

/** What is kept of a day, or of several that add up. */
interface Account {
  values: ReadonlyMap<string, MeasuredValue>;
  isAffected: boolean;
  /** Whether each day's net new shade stays within what the clause disregards. */
  isBrief: boolean;
  /** A window has no m² to disregard. */
  isWindow: boolean;
}

/**
 * Makes the judge of one receptor under one clause: it judges once for each single day, once for a
 * season by its worst day, and once over all days where the measure adds up. It keeps sums and
 * findings and not the light, so that a year needs no more memory than a day.
 */
export function createReceptorJudge(
  clause: RuleClause,
  groups: readonly DayGroup[],
  bands: Rule['bands'],
): ReceptorJudge {
  const addsUp = addsUpOverDays(clause.measure.kind);
  const wanted = new Set(groups.flatMap((group) => group.dates));
  const energy = { before: 0, after: 0 };
  let sum: Account | null = null;
  const ofDates = new Map<string, ClauseJudgement>();
  const datesOf = groups.map((group) => new Set(group.dates));
  const seasons = groups.map((): Season => ({ ...noDays }));
  return {
    takeDay: (day) => {
      if (!wanted.delete(day.date)) throw new Error(`${day.date} is no day to be judged.`);
      energy.before += measureDay({ kind: 'beam-energy' }, day, 'before') * day.areaM2;
      energy.after += measureDay({ kind: 'beam-energy' }, day, 'after') * day.areaM2;
      const account = accountOf(clause, day);
      if (addsUp) {
        sum = sum === null ? account : addAccounts(sum, account);
        return;
      }
      const judgement = judgeAccount(clause, bands, account, day.date);
      groups.forEach((group, index) => {
        if (datesOf[index]?.has(day.date) !== true) return;
        const season = seasons[index];
        if (!group.isSeason || season === undefined) ofDates.set(day.date, judgement);
        else takeIntoSeason(season, judgement);
      });
    },
    energyKwh: () => energy,
    judge: () => {
      if (wanted.size > 0) throw new Error('A judged day was never computed.');
      if (sum !== null) return [judgeAccount(clause, bands, sum, null)];
      return groups.flatMap((group, index) => {
        if (!group.isSeason) return group.dates.flatMap((date) => ofDates.get(date) ?? []);
        const { worst, daysNotMet } = seasons[index] ?? noDays;
        return worst === null ? [] : [{ ...worst, daysNotMet }];
      });
    },
  };
}

interface Season {
  worst: ClauseJudgement | null;
  daysNotMet: number;
}

const noDays: Season = { worst: null, daysNotMet: 0 };

function takeIntoSeason(season: Season, judgement: ClauseJudgement): void {
  if (season.worst === null || isWorse(judgement, season.worst)) season.worst = judgement;
  if (judgement.finding === 'not-met') season.daysNotMet += 1;
}

function accountOf(clause: RuleClause, day: DayLight): Account {
  const lights = day.spans.flatMap((span) => span.lights);
  return {
    values: new Map(
      measuresOf(clause).map((measure) => [
        keyOf(measure),
        measureValue(measure, day, clause.step),
      ]),
    ),
    isAffected: lights.some(
      ({ netNewM2, removedM2 }) => netNewM2 > leastChangeM2 || removedM2 > leastChangeM2,
    ),
    isBrief: netNewMinutes(disregardedM2(clause, day), day) <= clause.disregard.minutes,
    isWindow: day.isWindow,
  };
}

/** Only measures that add up come here, and none of them is sampled. */
function addAccounts(a: Account, b: Account): Account {
  return {
    values: new Map(
      [...a.values].map(([key, value]) => {
        const more = b.values.get(key) ?? value;
        return [
          key,
          {
            before: value.before + more.before,
            after: value.after + more.after,
            theoretical: value.theoretical + more.theoretical,
            tolerance: value.tolerance + more.tolerance,
            whole: value.whole + more.whole,
            coarser: [],
            largestNetNewM2: Math.max(value.largestNetNewM2, more.largestNetNewM2),
          },
        ];
      }),
    ),
    isAffected: a.isAffected || b.isAffected,
    isBrief: a.isBrief && b.isBrief,
    isWindow: a.isWindow,
  };
}

function judgeAccount(
  clause: RuleClause,
  bands: Rule['bands'],
  account: Account,
  day: string | null,
): ClauseJudgement {
  const valueOf = (measure: RuleMeasure): MeasuredValue => {
    const value = account.values.get(keyOf(measure));
    if (value === undefined) throw new Error(`${measure.kind} was not measured.`);
    return value;
  };
  const allowedM2 = account.isWindow ? 0 : clause.disregard.area;
  const outcome = evaluateLimit(clause.limit, clause.measure, allowedM2, valueOf);
  const loss = lossOf(clause.measure, valueOf(clause.measure));
  return {
    ...outcome,
    // Where nothing changes, nothing hangs on how near the limit is.
    close: outcome.close && account.isAffected,
    day,
    finding: findingOf(account, outcome.met),
    loss,
    band: bandOf(loss, bands),
    daysNotMet: null,
  };
}

function findingOf(account: Account, isMet: boolean): ClauseJudgement['finding'] {
  if (!account.isAffected) return 'not-affected';
  if (isMet) return 'met';
  return account.isBrief ? 'disregarded' : 'not-met';
}

/** m² that a new shadow may cover unheeded; a window has none, so any new shade on it counts. */
function disregardedM2(clause: RuleClause, { isWindow }: DayLight): number {
  return isWindow ? leastChangeM2 : clause.disregard.area;
}

/** Minutes of a day's window in which more than the disregarded area is shaded anew. */
function netNewMinutes(areaM2: number, day: DayLight): number {
  const runs = day.spans.flatMap((span): Run[] =>
    runsAbove(span, areaM2, (index) => span.lights[index]?.netNewM2 ?? 0, true),
  );
  const isInstantOver = runs.some((run) => run.startMs === run.endMs);
  const minutes = runs.reduce((sum, run) => sum + (run.endMs - run.startMs) / 60_000, 0);
  // A window of one instant has no length: shade at it counts as lasting.
  return isInstantOver && minutes === 0 ? Infinity : minutes;
}

function measureValue(measure: RuleMeasure, day: DayLight, stepMin: number): MeasuredValue {
  const valuesBy = (grid?: number) => ({
    before: measureDay(measure, day, 'before', grid),
    after: measureDay(measure, day, 'after', grid),
    theoretical: measureDay(measure, day, 'theoretical', grid),
  });
  const netNew = day.spans.flatMap((span) => span.lights.map((light) => light.netNewM2));
  const gridCount = needsSamples(measure.kind) ? (day.samples?.points.gridCount ?? 0) : 0;
  return {
    ...valuesBy(),
    tolerance: measureTolerance(measure, day, stepMin),
    whole: wholeOf(measure, day),
    coarser: Array.from({ length: gridCount }, (_, grid) => valuesBy(grid)),
    largestNetNewM2: Math.max(0, ...netNew),
  };
}

function lossOf(measure: RuleMeasure, value: MeasuredValue): number | null {
  const isShade = measuresShade(measure.kind);
  const before = isShade ? value.whole - value.before : value.before;
  const after = isShade ? value.whole - value.after : value.after;
  return before > 0 ? (before - after) / before : null;
}

function bandOf(loss: number | null, bands: Rule['bands']): string | null {
  if (loss === null || loss <= 0) return null;
  return bands.find((band) => loss <= band.upTo)?.label ?? null;
}

const severity = { 'not-affected': 0, met: 1, disregarded: 2, 'not-met': 3 } as const;

/** Days come in any order; of equal ones the earliest stands for the season. */
function isWorse(day: ClauseJudgement, than: ClauseJudgement): boolean {
  const difference = severity[day.finding] - severity[than.finding];
  if (difference !== 0) return difference > 0;
  const margins = decisiveMargin(day) - decisiveMargin(than);
  return margins === 0 ? (day.day ?? '') < (than.day ?? '') : margins < 0;
}

function decisiveMargin(judgement: ClauseJudgement): number {
  return Math.max(...judgement.tests.map((test) => test.margin));
}

function keyOf(measure: RuleMeasure): string {
  return JSON.stringify(measure);
}
