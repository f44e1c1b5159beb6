import {
  measureUnits,
  type DayEvent,
  type LimitLeaf,
  type RuleDay,
  type RuleLimit,
  type RuleMeasure,
  type RuleWindow,
} from './rule-schema.ts';

/** How a reader's locale writes the figures in a clause's words. */
export interface ClauseFigures {
  /** A value with its unit, as in `measureUnits`. */
  inUnit: (value: number, unit: string) => string;
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
    case 'sun-hours':
      return 'hours of direct sun in the judged hours, as a mean over the area';
    case 'best-run':
      return `the longest unbroken time with at least ${figures.percent(measure.share)} of the area in sun`;
    case 'shade-share':
      return 'the largest share of the area in shade at any judged instant';
    case 'sun-area-hours':
      return 'sunlit area times hours, added over the judged days';
    case 'beam-energy':
      return 'direct clear-sky energy on the area, added over the judged days';
  }
}

/** What a clause asks for, in English; limits within limits stand in brackets. */
export function sayRuleLimit(
  limit: RuleLimit,
  clauseMeasure: RuleMeasure,
  figures: ClauseFigures,
): string {
  const join = (limits: readonly RuleLimit[], joint: string) =>
    limits
      .map((one) => {
        const words = sayRuleLimit(one, clauseMeasure, figures);
        return 'anyOf' in one || 'allOf' in one ? `(${words})` : words;
      })
      .join(joint);
  if ('anyOf' in limit) return join(limit.anyOf, ', or ');
  if ('allOf' in limit) return join(limit.allOf, ', and ');
  return sayLeaf(limit, clauseMeasure, figures);
}

function sayLeaf(leaf: LimitLeaf, clauseMeasure: RuleMeasure, figures: ClauseFigures): string {
  const measure = leaf.measure ?? clauseMeasure;
  const of = leaf.measure === undefined ? '' : ` (of ${sayRuleMeasure(leaf.measure, figures)})`;
  const inUnit = (value: number) => figures.inUnit(value, measureUnits[measure.kind]);
  if ('atLeast' in leaf) return `at least ${inUnit(leaf.atLeast)} with the proposal${of}`;
  if ('atMost' in leaf) return `at most ${inUnit(leaf.atMost)} with the proposal${of}`;
  if ('keeps' in leaf) return `at least ${figures.percent(leaf.keeps)} of what there is now${of}`;
  if ('losesAtMost' in leaf) return `a loss of at most ${inUnit(leaf.losesAtMost)}${of}`;
  if ('losesAtMostShare' in leaf) {
    const whole =
      leaf.of === 'before' ? 'what there is now' : 'what there would be without any building';
    return `a loss of at most ${figures.percent(leaf.losesAtMostShare)} of ${whole}${of}`;
  }
  return `no worse than now${of}`;
}
