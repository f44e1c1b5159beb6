import { measuresOf } from './measure-kinds.ts';
import type { Place } from './place.ts';
import { expandDays } from './rule-days.ts';
import type { Rule, RuleClause } from './rule-schema.ts';
import { windowSpans } from './rule-window.ts';

/** A field of a rule by its path, and what is wrong with it. */
export interface RuleIssue {
  path: string;
  message: string;
}

/**
 * What keeps a well-formed rule from being judged at a place: a day on which the sun does not stand
 * in the window, and a step longer than every window that has sun. A season may have days without.
 *
 * @param year whose days are tried
 */
export function checkRule(rule: Rule, place: Place, year: number): RuleIssue[] {
  return rule.clauses.flatMap((clause, index) =>
    checkDays(clause, place, year).map(({ path, message }) => ({
      path: `clauses.${index}.${path}`,
      message,
    })),
  );
}

function checkDays(clause: RuleClause, place: Place, year: number): RuleIssue[] {
  const groups = expandDays(clause.days, year, place).map(({ isSeason, dates }) => ({
    isSeason,
    days: dates.map((date) => ({ date, longestMin: longestWindowMin(clause, date, place) })),
  }));
  const isSunless = ({ longestMin }: { longestMin: number | null }) => longestMin === null;
  const issues = groups.flatMap(({ isSeason, days }): RuleIssue[] => {
    if (!days.every(isSunless)) return [];
    const [first] = days;
    const when = isSeason ? 'on any of its days' : `on ${first?.date ?? 'its day'}`;
    return [{ path: 'window', message: `The sun does not stand in this window ${when}.` }];
  });
  const longestMin = Math.max(
    ...groups.flatMap(({ days }) => days.flatMap((day) => day.longestMin ?? [])),
  );
  const judgesInstants = measuresOf(clause).every(({ kind }) => kind === 'shade-share');
  const isInstant = longestMin === 0 && judgesInstants;
  if (issues.length === 0 && clause.step > longestMin && !isInstant) {
    issues.push({
      path: 'step',
      message: `The step is longer than the window, in which the sun stands for ${Math.floor(longestMin)} minutes at most.`,
    });
  }
  return issues;
}

/** The longest stretch of a day's window with sun, in minutes; null where it has none. */
function longestWindowMin(clause: RuleClause, date: string, place: Place): number | null {
  const spans = windowSpans(clause, date, place);
  return spans.reduce<number | null>(
    (longest, { startMs, endMs }) => Math.max(longest ?? 0, (endMs - startMs) / 60_000),
    null,
  );
}
