import type { CivilTimeFormat } from '../../../../shared/drawing/civil-time-format.ts';
import type { FigureFormat } from '../../../../shared/drawing/figure-format.ts';
import {
  measureUnits,
  type LimitLeaf,
  type RuleClause,
  type RuleDay,
  type RuleLimit,
  type RuleMeasure,
  type RuleWindow,
} from '../../../../shared/rules/rule-schema.ts';
import { nameReceptorClass } from './report-scene.ts';

/** A clause of the rule in plain words, point by point. */
export interface ClauseWords {
  receptors: string;
  days: string;
  hours: string;
  measure: string;
  limit: string;
  /** Null where nothing is disregarded. */
  disregard: string | null;
}

/**
 * Says a clause in words.
 *
 * @param judgedDays the days of the study's year on which it judges, with the window's ends
 */
export function sayClause(
  clause: RuleClause,
  judgedDays: readonly { date: string; fromAt: string; toAt: string }[],
  time: CivilTimeFormat,
  figures: FigureFormat,
): ClauseWords {
  const { minutes, area } = clause.disregard;
  return {
    receptors: sayReceptors(clause),
    days: sayDays(clause, judgedDays, time),
    hours: sayHours(clause, judgedDays, time, figures),
    measure: sayMeasure(clause.measure, figures),
    limit: sayLimit(clause.limit, clause.measure, figures),
    disregard:
      minutes === 0
        ? null
        : `A receptor that has more than ${figures.area(area)} of net new shadow for at most ${figures.whole(minutes)} min in a day's judged hours is reported and not held against the proposal.`,
  };
}

function sayReceptors({ receptors }: RuleClause): string {
  const kinds = receptors.classes.map((one) => `every ${nameReceptorClass(one)}`).join(', ');
  const which =
    receptors.of === 'open'
      ? 'its open ground, less what buildings around stand on'
      : 'the whole of it';
  const plane =
    receptors.plane === undefined ? '' : `, taken ${receptors.plane} m above the ground`;
  return `${kinds} outside the site: ${which}${plane}`;
}

const eventWords = {
  'march-equinox': 'the March equinox',
  'june-solstice': 'the June solstice',
  'september-equinox': 'the September equinox',
  'december-solstice': 'the December solstice',
  'winter-solstice': 'the winter solstice',
  'summer-solstice': 'the summer solstice',
} as const;

function sayDays(
  clause: RuleClause,
  judgedDays: readonly { date: string }[],
  time: CivilTimeFormat,
): string {
  const asked = clause.days.map((day) => sayDay(day, time)).join('; ');
  const dates = judgedDays.map(({ date }) => time.civilDate(date));
  const listed =
    dates.length === 0
      ? ''
      : dates.length <= 6
        ? ` (${dates.join('; ')})`
        : ` (${dates.length} days from ${dates[0] ?? ''} to ${dates[dates.length - 1] ?? ''})`;
  return `${asked}${listed}`;
}

function sayDay(day: RuleDay, time: CivilTimeFormat): string {
  const monthDay = (text: string) => time.monthAndDay(`2000-${text}`);
  if ('event' in day) return eventWords[day.event];
  if ('date' in day) return monthDay(day.date);
  if ('year' in day) return 'every day of the year';
  const every = day.everyDays === 1 ? 'every day' : `every ${day.everyDays} days`;
  return `${every} from ${monthDay(day.from)} to ${monthDay(day.to)}`;
}

const basisWords = {
  civil: 'by the clock, daylight saving included',
  standard: 'standard time, all year',
  solar: 'true solar time',
} as const;

function sayHours(
  clause: RuleClause,
  judgedDays: readonly { date: string; fromAt: string; toAt: string }[],
  time: CivilTimeFormat,
  figures: FigureFormat,
): string {
  const [first] = judgedDays;
  const onTheClock =
    first === undefined
      ? ''
      : `; on ${time.monthAndDay(first.date)} that is from ${time.clock(first.fromAt)} to ${time.clockWithZone(first.toAt)}`;
  const sun =
    clause.minimumAltitude === 0
      ? ''
      : `, while the sun is at least ${figures.angle(clause.minimumAltitude)} high`;
  const step = `, judged every ${figures.whole(clause.step)} min`;
  return `${sayWindow(clause.window, figures)}${sun}${onTheClock}${step}`;
}

function sayWindow(window: RuleWindow, figures: FigureFormat): string {
  if (window.basis === 'sun') {
    const edge = (minutes: number, words: string) =>
      minutes === 0 ? '' : `${figures.whole(minutes)} min ${words} `;
    return `from ${edge(window.afterSunrise, 'after')}sunrise to ${edge(window.beforeSunset, 'before')}sunset`;
  }
  if (window.from === window.to) return `at ${window.from}, ${basisWords[window.basis]}`;
  return `from ${window.from} to ${window.to}, ${basisWords[window.basis]}`;
}

function sayMeasure(measure: RuleMeasure, figures: FigureFormat): string {
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

function sayLimit(limit: RuleLimit, measure: RuleMeasure, figures: FigureFormat): string {
  if ('anyOf' in limit) {
    return joinLimits(limit.anyOf, measure, figures, ', or ');
  }
  if ('allOf' in limit) {
    return joinLimits(limit.allOf, measure, figures, ', and ');
  }
  return sayLeaf(limit, measure, figures);
}

function joinLimits(
  limits: readonly RuleLimit[],
  measure: RuleMeasure,
  figures: FigureFormat,
  joint: string,
): string {
  return limits
    .map((one) => {
      const words = sayLimit(one, measure, figures);
      return 'anyOf' in one || 'allOf' in one ? `(${words})` : words;
    })
    .join(joint);
}

function sayLeaf(leaf: LimitLeaf, clauseMeasure: RuleMeasure, figures: FigureFormat): string {
  const measure = leaf.measure ?? clauseMeasure;
  const of = leaf.measure === undefined ? '' : ` (of ${sayMeasure(leaf.measure, figures)})`;
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
