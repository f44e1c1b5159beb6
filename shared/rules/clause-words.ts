import { measureUnits } from './measure-kinds.ts';
import {
  type ClauseBaseline,
  type DayEvent,
  type LimitLeaf,
  type ReceptorRing,
  type RuleDay,
  type RuleLimit,
  type RuleMeasure,
  type RuleWindow,
} from './rule-schema.ts';

/** How a reader's locale writes the figures in a clause's words. */
export interface ClauseFigures {
  /** A value with its unit, as in `measureUnits`. */
  inUnit: (value: number, unit: string) => string;
  /** A length in metres, to the centimetre where it has any. */
  metres: (lengthM: number) => string;
  /** A share from 0 to 1 as a percentage. */
  percent: (share: number) => string;
  whole: (value: number) => string;
  /** `03-21` as a day and a month. */
  monthDay: (monthDay: string) => string;
}

const eventWords = {
  'march-equinox': 'the March equinox',
  'june-solstice': 'the June solstice',
  'september-equinox': 'the September equinox',
  'december-solstice': 'the December solstice',
  'winter-solstice': 'the winter solstice',
  'summer-solstice': 'the summer solstice',
} as const satisfies Record<DayEvent, string>;

const basisWords = {
  civil: 'by the clock, daylight saving included',
  standard: 'standard time, all year',
  solar: 'true solar time',
} as const;

/** The ground that a ring judges, in English. */
export function sayRing(
  { from, to }: ReceptorRing,
  figures: Pick<ClauseFigures, 'metres'>,
): string {
  return to === undefined
    ? `the ground from ${figures.metres(from)} outside the site's boundary to where the shadow ends`
    : `the ground from ${figures.metres(from)} to ${figures.metres(to)} outside the site's boundary`;
}

/** What a clause holds the proposal against, in English; null where that is what stands now. */
export function sayBaseline(
  baseline: ClauseBaseline | undefined,
  figures: ClauseFigures,
): string | null {
  if (baseline === undefined) return null;
  if (baseline === 'by-right') {
    return 'compared with what could be built on the site without this approval';
  }
  if (baseline === 'proposal-alone') {
    return 'the shadow of the proposal alone, as if nothing else stood';
  }
  const beside = baseline.with
    .map((role) => (role === 'context' ? 'the buildings around' : 'what stands on the site now'))
    .join(' and ');
  return `compared with a wall of ${figures.metres(baseline.wall)} along the site's boundary${beside === '' ? '' : `, beside ${beside}`}`;
}

/** One entry of a clause's days in English. */
export function sayRuleDay(day: RuleDay, figures: ClauseFigures): string {
  if ('event' in day) return eventWords[day.event];
  if ('date' in day) return figures.monthDay(day.date);
  if ('year' in day) return 'every day of the year';
  const every = day.everyDays === 1 ? 'every day' : `every ${figures.whole(day.everyDays)} days`;
  return `${every} from ${figures.monthDay(day.from)} to ${figures.monthDay(day.to)}`;
}

/** A clause's window in English, with the clock that it means. */
export function sayRuleWindow(window: RuleWindow, figures: ClauseFigures): string {
  if (window.basis === 'sun') {
    const edge = (minutes: number, words: string) =>
      minutes === 0 ? '' : `${figures.whole(minutes)} min ${words} `;
    return `from ${edge(window.afterSunrise, 'after')}sunrise to ${edge(window.beforeSunset, 'before')}sunset`;
  }
  if (window.from === window.to) return `at ${window.from}, ${basisWords[window.basis]}`;
  return `from ${window.from} to ${window.to}, ${basisWords[window.basis]}`;
}

/** What a measure takes, in English. */
export function sayRuleMeasure(measure: RuleMeasure, figures: ClauseFigures): string {
  switch (measure.kind) {
    case 'sun-share':
      return `the share of the area with ${sayHoursAsked(measure.hours, figures)} in the judged hours`;
    case 'sun-area':
      return `the area with ${sayHoursAsked(measure.hours, figures)} in the judged hours`;
    case 'sun-hours':
      return 'hours of direct sun in the judged hours, as a mean over the area';
    case 'best-run':
      return `the longest unbroken time with at least ${figures.percent(measure.share)} of the area in sun`;
    case 'worst-shade-hours':
      return 'hours of shade in the judged hours at the most shaded point';
    case 'shade-share':
      return 'the largest share of the area in shade at any judged instant';
    case 'sun-area-hours':
      return 'sunlit area times hours, added over the judged days';
    case 'beam-energy':
      return 'direct clear-sky energy on the area, added over the judged days';
  }
}

function sayHoursAsked(hours: number, figures: ClauseFigures): string {
  return hours === 0 ? 'any direct sun' : `at least ${figures.inUnit(hours, 'h')} of direct sun`;
}

/**
 * What a clause asks for, in English; limits within limits stand in brackets.
 *
 * @param baseline the clause's own, if it is not held against what stands now
 */
export function sayRuleLimit(
  limit: RuleLimit,
  clauseMeasure: RuleMeasure,
  figures: ClauseFigures,
  baseline?: ClauseBaseline,
): string {
  const say = (one: RuleLimit) => sayRuleLimit(one, clauseMeasure, figures, baseline);
  const join = (limits: readonly RuleLimit[], joint: string) =>
    limits
      .map((one) => ('anyOf' in one || 'allOf' in one ? `(${say(one)})` : say(one)))
      .join(joint);
  if ('anyOf' in limit) return join(limit.anyOf, ', or ');
  if ('allOf' in limit) return join(limit.allOf, ', and ');
  return sayLeaf(limit, clauseMeasure, figures, baseline !== undefined);
}

function sayLeaf(
  leaf: LimitLeaf,
  clauseMeasure: RuleMeasure,
  figures: ClauseFigures,
  hasBaseline: boolean,
): string {
  const measure = leaf.measure ?? clauseMeasure;
  const of = leaf.measure === undefined ? '' : ` (of ${sayRuleMeasure(leaf.measure, figures)})`;
  const inUnit = (value: number) => figures.inUnit(value, measureUnits[measure.kind]);
  const whatIs = hasBaseline ? 'what that leaves' : 'what there is now';
  if ('atLeast' in leaf) return `at least ${inUnit(leaf.atLeast)} with the proposal${of}`;
  if ('atMost' in leaf) return `at most ${inUnit(leaf.atMost)} with the proposal${of}`;
  if ('keeps' in leaf) return `at least ${figures.percent(leaf.keeps)} of ${whatIs}${of}`;
  if ('losesAtMost' in leaf) return `a loss of at most ${inUnit(leaf.losesAtMost)}${of}`;
  if ('losesAtMostShare' in leaf) {
    const whole = leaf.of === 'before' ? whatIs : 'what there would be without any building';
    return `a loss of at most ${figures.percent(leaf.losesAtMostShare)} of ${whole}${of}`;
  }
  return `${hasBaseline ? 'no worse than that' : 'no worse than now'}${of}`;
}
