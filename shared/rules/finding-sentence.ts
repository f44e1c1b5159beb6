import type { ClauseJudgement } from './judge-receptor.ts';
import type { JudgedClass } from './judged-class.ts';
import { leavesOf, type LimitTest } from './limits.ts';
import type {
  ClauseBaseline,
  LimitLeaf,
  MeasureKind,
  RuleClause,
  RuleMeasure,
} from './rule-schema.ts';

/** What was measured, in words: a parcel is not a garden. */
export function nameReceptor(receptorClass: JudgedClass, label: string): string {
  switch (receptorClass) {
    case 'parcel':
      return `the open ground of ${label}`;
    case 'yard':
      return `the yard of ${label}`;
    case 'collector':
      return `the collector at ${label}`;
    case 'window':
      return `the window at ${label}`;
    case 'open-space':
    case 'walk':
    case 'ring':
      return label;
  }
}

const none = 'none';

/** A length of time as people say it: `3 h 05 min`, `45 min`, `none`. */
export function sayHours(hours: number): string {
  const minutes = Math.round(hours * 60);
  if (minutes === 0) return none;
  const wholeHours = Math.trunc(minutes / 60);
  const rest = Math.abs(minutes % 60);
  if (wholeHours === 0) return `${minutes} min`;
  return rest === 0 ? `${wholeHours} h` : `${wholeHours} h ${String(rest).padStart(2, '0')} min`;
}

const dayAndMonth = new Intl.DateTimeFormat('en', {
  month: 'long',
  day: 'numeric',
  timeZone: 'UTC',
});

/** A civil date in English: `December 21`. */
export function sayDay(date: string): string {
  return dayAndMonth.format(new Date(`${date}T12:00:00Z`));
}

/** A measure's value with its unit, in words. */
export function sayValue(measure: MeasureKind, value: number): string {
  switch (measure) {
    case 'sun-hours':
    case 'best-run':
    case 'worst-shade-hours':
      return sayHours(value);
    case 'sun-share':
    case 'shade-share':
      return `${(value * 100).toFixed(0)} %`;
    case 'sun-area':
      return `${value.toFixed(0)} m²`;
    case 'sun-area-hours':
      return `${value.toFixed(0)} m²·h`;
    case 'beam-energy':
      return `${value.toFixed(2)} kWh/m²`;
  }
}

/** The measured thing, after its value: `40 % of its area …`. */
function sayMeasured(measure: RuleMeasure): string {
  const asked = (hours: number) =>
    hours === 0 ? 'some sun' : `at least ${sayHours(hours)} of sun`;
  switch (measure.kind) {
    case 'sun-share':
      return `its area with ${asked(measure.hours)} in the judged hours`;
    case 'sun-area':
      return `ground with ${asked(measure.hours)} in the judged hours`;
    case 'sun-hours':
      return 'sun in the judged hours';
    case 'best-run':
      return 'unbroken sun in the judged hours';
    case 'worst-shade-hours':
      return 'shade in the judged hours at its most shaded point';
    case 'shade-share':
      return 'its area in shade at the worst judged instant';
    case 'sun-area-hours':
      return 'sunlit area times hours in the judged time';
    case 'beam-energy':
      return 'direct clear-sky energy in the judged time';
  }
}

/** What the value before is held to be, and what the value after. */
function sayStates(baseline: ClauseBaseline | undefined): { before: string; after: string } {
  if (baseline === undefined) return { before: 'before', after: 'after' };
  const after = 'with the proposal';
  if (baseline === 'by-right') return { before: 'with what could be built by right', after };
  if (baseline === 'proposal-alone') return { before: 'with nothing built', after };
  return { before: `with a wall of ${baseline.wall} m`, after };
}

const endings: Record<ClauseJudgement['finding'], string> = {
  met: 'Met.',
  'not-met': 'Not met.',
  disregarded: 'Shaded too briefly to be held against the proposal.',
  'not-affected': 'The proposal changes nothing here in the judged hours.',
};

/**
 * A finding as a few plain English sentences.
 *
 * @param spacingM of the sample points, where any were taken
 */
export function describeFinding(
  clause: RuleClause,
  judgement: ClauseJudgement,
  receptorClass: JudgedClass,
  label: string,
  spacingM: number | null,
): string {
  const when = judgement.day === null ? 'Over the judged days' : `On ${sayDay(judgement.day)}`;
  const leaves = leavesOf(clause.limit);
  // The clause's own measure leads; where every limit brings one, the first of them.
  const lead = Math.max(
    leaves.findIndex((leaf) => leaf.measure === undefined),
    0,
  );
  const measure = leaves[lead]?.measure ?? clause.measure;
  const test = judgement.tests[lead];
  const states = sayStates(clause.baseline);
  const values =
    test === undefined
      ? ''
      : ` has ${sayAmount(measure, test.before, receptorClass)} ${states.before} and ${sayValue(measure.kind, test.after)} ${states.after}`;
  const asks = leaves
    .map((leaf, index) => sayLimit(leaf, judgement.tests[index], clause, states.before))
    .join('allOf' in clause.limit ? ', and ' : ', or ');
  return [
    `${when}, ${nameReceptor(receptorClass, label)}${values}.`,
    `The rule asks for ${asks}.`,
    sayEnding(judgement),
    ...saySampling(judgement.tests, spacingM),
  ].join(' ');
}

/** A value with the thing that it is of: `3 h of sun …`, `no sun …`. */
function sayAmount(measure: RuleMeasure, value: number, receptorClass: JudgedClass): string {
  const said = sayValue(measure.kind, value);
  const of = sayMeasured(measure);
  const measured = receptorClass === 'window' ? of.replace('its area', 'its width') : of;
  return said === none ? `no ${measured}` : `${said} of ${measured}`;
}

function sayEnding({ finding, daysNotMet }: ClauseJudgement): string {
  if (finding !== 'not-met' || daysNotMet === null || daysNotMet < 2) return endings[finding];
  return `Not met on ${daysNotMet} of the season's days, of which this is the worst.`;
}

/** How finely sample points lie, and what twice the spacing would change. */
function saySampling(tests: readonly LimitTest[], spacingM: number | null): string[] {
  const sampled = tests.find((test) => test.samplingError !== null);
  if (spacingM === null || sampled === undefined) return [];
  const difference = sayDifference(sampled.measure, sampled.samplingError ?? 0);
  return [
    `Taken at points ${spacingM.toFixed(2)} m apart; points twice as far apart change the figure by ${difference}.`,
  ];
}

/** A small difference keeps a digit more than a value. */
function sayDifference(measure: MeasureKind, difference: number): string {
  const atMost = (value: string, unit: string) =>
    Number(value) === 0
      ? `less than ${value.replace(/0$/, '1')} ${unit}`
      : `at most ${value} ${unit}`;
  if (measure === 'sun-share') return atMost((difference * 100).toFixed(1), '%');
  if (measure === 'sun-area') return atMost(difference.toFixed(1), 'm²');
  const said = sayHours(difference);
  return said === none ? 'less than a minute' : `at most ${said}`;
}

function sayLimit(
  leaf: LimitLeaf,
  test: LimitTest | undefined,
  clause: RuleClause,
  before: string,
): string {
  const kind = leaf.measure?.kind ?? clause.measure.kind;
  if ('atLeast' in leaf) return `at least ${sayValue(kind, leaf.atLeast)}`;
  if ('atMost' in leaf) return `at most ${sayValue(kind, leaf.atMost)}`;
  if ('losesAtMost' in leaf) return `a loss of at most ${sayValue(kind, leaf.losesAtMost)}`;
  if ('keeps' in leaf) {
    const whole = clause.baseline === undefined ? 'what there was' : `what there is ${before}`;
    const share = `${(leaf.keeps * 100).toFixed(0)} % of ${whole}`;
    return test === undefined ? share : `${share} (${sayValue(kind, test.limit)})`;
  }
  if ('losesAtMostShare' in leaf) {
    const share = `a loss of at most ${(leaf.losesAtMostShare * 100).toFixed(1)} %`;
    return test === undefined ? share : `${share} (${sayValue(kind, test.limit)})`;
  }
  return `no worse than ${before}`;
}
