import type { Place } from '../rules/place.ts';
import { expandDays } from '../rules/rule-days.ts';
import type { Rule } from '../rules/rule-schema.ts';
import { windowSpans } from '../rules/rule-window.ts';
import { formatInstant } from '../solar/civil-time.ts';

/** When a clause judges: its dates, and the first and last judged instant of each that has sun. */
export interface JudgedClause {
  clause: string;
  title: string;
  days: { date: string; fromAt: string; toAt: string }[];
}

/** The judged days of every clause of a rule in a year, instants as RFC 3339 with the zone's offset. */
export function listJudgedDays(rule: Rule, place: Place, year: number): JudgedClause[] {
  return rule.clauses.map((clause) => ({
    clause: clause.id,
    title: clause.title,
    days: expandDays(clause.days, year, place)
      .flatMap((group) => group.dates)
      .flatMap((date) => {
        const spans = windowSpans(clause, date, place);
        const first = spans[0];
        const last = spans.at(-1);
        if (first === undefined || last === undefined) return [];
        return [
          {
            date,
            fromAt: formatInstant(first.startMs, place.timezone),
            toAt: formatInstant(last.endMs, place.timezone),
          },
        ];
      }),
  }));
}
