import {
  measureUnits,
  type DayEvent,
  type ReceptorClass,
  type RuleClause,
  type RuleDay,
  type RuleLimit,
  type RuleMeasure,
  type RuleWindow,
} from '../../../shared/rules/rule-schema.ts';
import type { Formats } from '../../lib/formats.ts';

type UnitFormats = Pick<Formats, 'inUnit' | 'share' | 'area' | 'number' | 'length'>;

const classWords = {
  parcel: 'parcels',
  yard: 'yards',
  'open-space': 'open spaces',
  collector: 'solar collectors',
  walk: 'walks',
} as const satisfies Record<ReceptorClass, string>;

const eventWords = {
  'march-equinox': 'the March equinox',
  'june-solstice': 'the June solstice',
  'september-equinox': 'the September equinox',
  'december-solstice': 'the December solstice',
  'winter-solstice': 'the winter solstice',
  'summer-solstice': 'the summer solstice',
} as const satisfies Record<DayEvent, string>;

/** One clause of a rule in plain words: what it judges, when, how, and what it asks. */
export function describeClause(
  clause: RuleClause,
  formats: UnitFormats,
): { label: string; value: string }[] {
  const { receptors } = clause;
  const classes = joinWords(
    receptors.classes.map((one) => classWords[one]),
    'and',
  );
  const area =
    receptors.of === 'open'
      ? 'their open area, without what buildings stand on'
      : 'their whole area';
  const plane =
    receptors.plane === undefined ? '' : `, at ${formats.length(receptors.plane)} above the ground`;
  return [
    { label: 'Judged', value: `${classes}: ${area}${plane}` },
    { label: 'Days', value: joinWords(clause.days.map(describeDay), 'and') },
    {
      label: 'Hours',
      value: `${describeWindow(clause.window)}, every ${clause.step} minutes${
        clause.minimumAltitude > 0
          ? `, while the sun is at least ${formats.number(clause.minimumAltitude)}° high`
          : ''
      }`,
    },
    { label: 'Measured', value: describeMeasure(clause.measure, formats) },
    { label: 'Asked', value: describeLimit(clause.limit, clause.measure, formats) },
    { label: 'Not counted', value: describeDisregard(clause.disregard, formats) },
  ];
}

function describeDisregard(
  { area, minutes }: RuleClause['disregard'],
  formats: UnitFormats,
): string {
  const covers = `covers more than ${formats.area(area)}`;
  return minutes === 0
    ? `a place on which the new shadow never ${covers}`
    : `a place on which the new shadow ${covers} for at most ${formats.number(minutes)} minutes a day`;
}

function describeDay(day: RuleDay): string {
  if ('event' in day) return eventWords[day.event];
  if ('date' in day) return day.date;
  if ('year' in day) return 'every day of the year';
  const every = day.everyDays === 1 ? 'every day' : `every ${day.everyDays} days`;
  return `${every} from ${day.from} to ${day.to}`;
}

function describeWindow(window: RuleWindow): string {
  if (window.basis === 'sun') {
    return `from ${window.afterSunrise} minutes after sunrise to ${window.beforeSunset} minutes before sunset`;
  }
  const clocks = {
    civil: 'on the clock of the day',
    standard: 'standard time, all year',
    solar: 'true solar time',
  } as const;
  return `from ${window.from} to ${window.to}, ${clocks[window.basis]}`;
}

function describeMeasure(measure: RuleMeasure, formats: UnitFormats): string {
  switch (measure.kind) {
    case 'sun-hours':
      return 'mean hours of direct sun over the area';
    case 'best-run':
      return `the longest unbroken time with at least ${formats.share(measure.share)} of the area in sun`;
    case 'shade-share':
      return 'the largest share of the area in shade at any instant';
    case 'sun-area-hours':
      return 'sunlit area times time, added over the days';
    case 'beam-energy':
      return 'direct clear-sky energy, added over the days';
  }
}

function describeLimit(limit: RuleLimit, measure: RuleMeasure, formats: UnitFormats): string {
  if ('anyOf' in limit) {
    return joinWords(
      limit.anyOf.map((one) => describeLimit(one, measure, formats)),
      'or',
    );
  }
  if ('allOf' in limit) {
    return joinWords(
      limit.allOf.map((one) => describeLimit(one, measure, formats)),
      'and',
    );
  }
  const own = limit.measure ?? measure;
  const value = (amount: number) => formats.inUnit(amount, measureUnits[own.kind]);
  const of = limit.measure === undefined ? '' : ` (${describeMeasure(limit.measure, formats)})`;
  if ('atLeast' in limit) return `at least ${value(limit.atLeast)} with the proposal${of}`;
  if ('atMost' in limit) return `at most ${value(limit.atMost)} with the proposal${of}`;
  if ('keeps' in limit) return `at least ${formats.share(limit.keeps)} of what it is now${of}`;
  if ('losesAtMost' in limit) return `loses at most ${value(limit.losesAtMost)}${of}`;
  if ('losesAtMostShare' in limit) {
    const base = limit.of === 'before' ? 'what it is now' : 'what it would be without any building';
    return `loses at most ${formats.share(limit.losesAtMostShare)} of ${base}${of}`;
  }
  return `no worse than now${of}`;
}

function joinWords(words: readonly string[], conjunction: 'and' | 'or'): string {
  if (words.length < 2) return words.join('');
  const separator = words.some((word) => word.includes(',')) ? '; ' : ', ';
  const head = words.slice(0, -1).join(separator);
  return `${head}${words.length > 2 ? separator.trimEnd() : ''} ${conjunction} ${words.at(-1) ?? ''}`;
}
