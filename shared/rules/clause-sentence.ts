import {
  sayBaseline,
  sayRing,
  sayRuleDay,
  sayRuleLimit,
  sayRuleMeasure,
  sayRuleWindow,
  type ClauseFigures,
} from './clause-words.ts';
import type { ReceptorClass, RuleClause, RuleWindow } from './rule-schema.ts';

/** A clause that is still being written: its clock may not be chosen yet. */
export type UnfinishedClause = Omit<RuleClause, 'window'> & { window: RuleWindow | null };

/** What several receptors of a class are called. */
export const receptorsOfClass = {
  parcel: 'parcels',
  yard: 'yards',
  'open-space': 'open spaces',
  collector: 'solar collectors',
  walk: 'walks',
  window: 'windows',
} as const satisfies Record<ReceptorClass, string>;

/** What a clause says, part by part, in English; null where that part says nothing. */
export interface ClauseParts {
  judged: string;
  days: string;
  hours: string;
  measured: string;
  heldAgainst: string | null;
  asked: string;
  notCounted: string;
  weight: string | null;
}

/**
 * A clause in English, part by part, so that two of them can be held against each other.
 *
 * @param figures how the reader's locale writes figures
 */
export function sayClauseParts(clause: UnfinishedClause, figures: ClauseFigures): ClauseParts {
  return {
    judged: `${sayWhom(clause, figures)}: ${sayArea(clause, figures)}`,
    days: sayDays(clause, figures),
    hours: `${sayHours(clause, figures)}, every ${figures.whole(clause.step)} minutes`,
    measured: sayRuleMeasure(clause.measure, figures),
    heldAgainst: sayBaseline(clause.baseline, figures),
    asked: sayRuleLimit(clause.limit, clause.measure, figures, clause.baseline),
    notCounted: sayDisregard(clause.disregard, figures),
    weight: clause.weight === 1 ? null : `counts ${clause.weight} times in the loss index`,
  };
}

/** A clause as one English sentence: when, whom, by what, and what is asked. */
export function sayClause(clause: UnfinishedClause, figures: ClauseFigures): string {
  const baseline = sayBaseline(clause.baseline, figures);
  return [
    `On ${sayDays(clause, figures)}, ${sayHours(clause, figures)},`,
    `${sayWhom(clause, figures)} ${isRing(clause) ? 'is' : 'are'} judged by`,
    `${sayRuleMeasure(clause.measure, figures)}${baseline === null ? '' : `, ${baseline}`};`,
    `the rule asks for ${sayRuleLimit(clause.limit, clause.measure, figures, clause.baseline)}.`,
  ].join(' ');
}

function isRing({ receptors }: UnfinishedClause): boolean {
  return receptors.ring !== undefined;
}

function sayWhom({ receptors }: UnfinishedClause, figures: ClauseFigures): string {
  if (receptors.ring !== undefined) return sayRing(receptors.ring, figures);
  if (receptors.classes.length === 0) return '…';
  return joinWords(receptors.classes.map((one) => receptorsOfClass[one]));
}

function sayArea(clause: UnfinishedClause, figures: ClauseFigures): string {
  const { of, plane } = clause.receptors;
  const its = isRing(clause) ? 'its' : 'their';
  const area =
    of === 'open' ? `${its} open area, without what buildings stand on` : `${its} whole area`;
  return plane === undefined ? area : `${area}, at ${figures.metres(plane)} above the ground`;
}

function sayDays({ days }: UnfinishedClause, figures: ClauseFigures): string {
  return days.length === 0 ? '…' : joinWords(days.map((day) => sayRuleDay(day, figures)));
}

function sayHours({ window, minimumAltitude }: UnfinishedClause, figures: ClauseFigures): string {
  const hours =
    window === null ? 'at hours by a clock to be chosen' : sayRuleWindow(window, figures);
  if (minimumAltitude === 0) return hours;
  const degrees = Number.isFinite(minimumAltitude) ? String(minimumAltitude) : '…';
  return `${hours}, while the sun is at least ${degrees}° high`;
}

function sayDisregard({ area, minutes }: RuleClause['disregard'], figures: ClauseFigures): string {
  const covers = `covers more than ${figures.inUnit(area, 'm²')}`;
  return minutes === 0
    ? `a place on which the new shadow never ${covers}`
    : `a place on which the new shadow ${covers} for at most ${figures.whole(minutes)} minutes a day`;
}

function joinWords(words: readonly string[]): string {
  if (words.length < 2) return words.join('');
  const separator = words.some((word) => word.includes(',')) ? '; ' : ', ';
  const head = words.slice(0, -1).join(separator);
  return `${head}${words.length > 2 ? separator.trimEnd() : ''} and ${words.at(-1) ?? ''}`;
}
