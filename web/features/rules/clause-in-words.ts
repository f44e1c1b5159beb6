import {
  sayBaseline,
  sayRing,
  sayRuleDay,
  sayRuleLimit,
  sayRuleMeasure,
  sayRuleWindow,
  type ClauseFigures,
} from '../../../shared/rules/clause-words.ts';
import type { ReceptorClass, RuleClause } from '../../../shared/rules/rule-schema.ts';
import type { Formats } from '../../lib/formats.ts';

type UnitFormats = Pick<Formats, 'inUnit' | 'share' | 'area' | 'number' | 'length' | 'dayOfYear'>;

const classWords = {
  parcel: 'parcels',
  yard: 'yards',
  'open-space': 'open spaces',
  collector: 'solar collectors',
  walk: 'walks',
  window: 'windows',
} as const satisfies Record<ReceptorClass, string>;

/** One clause of a rule in plain words: what it judges, when, how, and what it asks. */
export function describeClause(
  clause: RuleClause,
  formats: UnitFormats,
): { label: string; value: string }[] {
  const { receptors } = clause;
  const figures: ClauseFigures = {
    inUnit: formats.inUnit,
    metres: (lengthM) => `${formats.number(lengthM, 2)} m`,
    percent: formats.share,
    whole: formats.number,
    monthDay: (text) => formats.dayOfYear(`2000-${text}`),
  };
  const judged =
    receptors.ring === undefined
      ? joinWords(
          receptors.classes.map((one) => classWords[one]),
          'and',
        )
      : sayRing(receptors.ring, figures);
  const baseline = sayBaseline(clause.baseline, figures);
  const area =
    receptors.of === 'open'
      ? 'their open area, without what buildings stand on'
      : 'their whole area';
  const plane =
    receptors.plane === undefined ? '' : `, at ${formats.length(receptors.plane)} above the ground`;
  return [
    { label: 'Judged', value: `${judged}: ${area}${plane}` },
    {
      label: 'Days',
      value: joinWords(
        clause.days.map((day) => sayRuleDay(day, figures)),
        'and',
      ),
    },
    {
      label: 'Hours',
      value: `${sayRuleWindow(clause.window, figures)}, every ${clause.step} minutes${
        clause.minimumAltitude > 0
          ? `, while the sun is at least ${formats.number(clause.minimumAltitude)}° high`
          : ''
      }`,
    },
    { label: 'Measured', value: sayRuleMeasure(clause.measure, figures) },
    ...(baseline === null ? [] : [{ label: 'Held against', value: baseline }]),
    { label: 'Asked', value: sayRuleLimit(clause.limit, clause.measure, figures, clause.baseline) },
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

function joinWords(words: readonly string[], conjunction: 'and' | 'or'): string {
  if (words.length < 2) return words.join('');
  const separator = words.some((word) => word.includes(',')) ? '; ' : ', ';
  const head = words.slice(0, -1).join(separator);
  return `${head}${words.length > 2 ? separator.trimEnd() : ''} ${conjunction} ${words.at(-1) ?? ''}`;
}
