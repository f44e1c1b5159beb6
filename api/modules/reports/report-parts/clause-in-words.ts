import type { CivilTimeFormat } from '../../../../shared/drawing/civil-time-format.ts';
import type { FigureFormat } from '../../../../shared/drawing/figure-format.ts';
import {
  sayBaseline,
  sayRing,
  sayRuleDay,
  sayRuleLimit,
  sayRuleMeasure,
  sayRuleWindow,
  type ClauseFigures,
} from '../../../../shared/rules/clause-words.ts';
import type { RuleClause } from '../../../../shared/rules/rule-schema.ts';
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
  const words = clauseFigures(time, figures);
  return {
    receptors: sayReceptors(clause, words),
    days: sayDays(clause, judgedDays, time, words),
    hours: sayHours(clause, judgedDays, time, figures, words),
    measure: sayRuleMeasure(clause.measure, words),
    limit: [
      sayBaseline(clause.baseline, words),
      sayRuleLimit(clause.limit, clause.measure, words, clause.baseline),
    ]
      .filter((part) => part !== null)
      .join(': '),
    disregard:
      minutes === 0
        ? null
        : `A receptor that has more than ${figures.area(area)} of net new shadow for at most ${figures.whole(minutes)} min in a day's judged hours is reported and not held against the proposal.`,
  };
}

function sayReceptors({ receptors }: RuleClause, words: ClauseFigures): string {
  const kinds =
    receptors.ring === undefined
      ? `${receptors.classes.map((one) => `every ${nameReceptorClass(one)}`).join(', ')} outside the site`
      : sayRing(receptors.ring, words);
  const which =
    receptors.of === 'open'
      ? 'its open ground, less what buildings around stand on'
      : 'the whole of it';
  const plane =
    receptors.plane === undefined ? '' : `, taken ${receptors.plane} m above the ground`;
  return `${kinds}: ${which}${plane}`;
}

function sayDays(
  clause: RuleClause,
  judgedDays: readonly { date: string }[],
  time: CivilTimeFormat,
  words: ClauseFigures,
): string {
  const asked = clause.days.map((day) => sayRuleDay(day, words)).join('; ');
  const dates = judgedDays.map(({ date }) => time.civilDate(date));
  const listed =
    dates.length === 0
      ? ''
      : dates.length <= 6
        ? ` (${dates.join('; ')})`
        : ` (${dates.length} days from ${dates[0] ?? ''} to ${dates[dates.length - 1] ?? ''})`;
  return `${asked}${listed}`;
}

/** The report's figures as the shared words want them. */
function clauseFigures(time: CivilTimeFormat, figures: FigureFormat): ClauseFigures {
  return {
    inUnit: figures.inUnit,
    metres: (lengthM) => `${lengthM}\u00a0m`,
    percent: figures.percent,
    whole: figures.whole,
    monthDay: (text) => time.monthAndDay(`2000-${text}`),
  };
}

function sayHours(
  clause: RuleClause,
  judgedDays: readonly { date: string; fromAt: string; toAt: string }[],
  time: CivilTimeFormat,
  figures: FigureFormat,
  words: ClauseFigures,
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
  return `${sayRuleWindow(clause.window, words)}${sun}${onTheClock}${step}`;
}
