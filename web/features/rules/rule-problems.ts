import type { z } from 'zod';
import { checkRule } from '../../../shared/rules/check-rule.ts';
import type { Place } from '../../../shared/rules/place.ts';
import { expandDays } from '../../../shared/rules/rule-days.ts';
import { ruleSchema, type Rule, type RuleClause } from '../../../shared/rules/rule-schema.ts';
import type { ApiError } from '../../lib/api-error.ts';

/** What is wrong, by the path of the field: `clauses.0.window.to`. */
export type RuleProblems = ReadonlyMap<string, string>;

/** Looks up what is wrong with a field of one part of the rule. */
export type ProblemAt = (path: string) => string | undefined;

export interface RuleReading {
  problems: RuleProblems;
  /** The rule, complete with its defaults; null while anything is wrong with its form. */
  rule: Rule | null;
}

/** Longer seasons are tried when the rule is saved: a year of sunrises takes too long for each letter. */
const mostDaysTried = 40;

/** Reads a rule as the server does, and says in plain words what is wrong with which field. */
export function readRule(value: Record<string, unknown>, place: Place, year: number): RuleReading {
  const parsed = ruleSchema.safeParse(value, { error: sayIssue });
  const problems = new Map<string, string>();
  const add = (path: string, message: string) => {
    if (!problems.has(path)) problems.set(path, message);
  };
  if (!parsed.success) {
    for (const issue of parsed.error.issues.flatMap((one) => flatten(one))) {
      add(issue.path.join('.'), issue.message);
    }
    return { problems, rule: null };
  }
  parsed.data.clauses.forEach((clause, index) => {
    for (const { path, message } of checkHere(parsed.data, clause, place, year)) {
      add(path.replace(/^clauses\.0\b/, `clauses.${index}`), message);
    }
  });
  return { problems, rule: parsed.data };
}

/** The server's refusals, each at its field. */
export function problemsOfError({ problem }: ApiError): RuleProblems {
  const errors = problem.errors ?? [];
  return new Map(errors.map(({ path, message }) => [path.replace(/^rule\./, ''), message]));
}

const tried = new Map<string, { path: string; message: string }[]>();
const mostKept = 100;

/** Whether one clause can be judged at the place; what was tried once is remembered. */
function checkHere(rule: Rule, clause: RuleClause, place: Place, year: number) {
  const dates = expandDays(clause.days, year, place).flatMap((group) => group.dates);
  if (dates.length > mostDaysTried) return [];
  const key = JSON.stringify([clause, place, year]);
  const known = tried.get(key) ?? checkRule({ ...rule, clauses: [clause] }, place, year);
  if (tried.size >= mostKept) tried.clear();
  tried.set(key, known);
  return known;
}

type Issue = z.core.$ZodIssue;

/** Of a field that may have several forms, what is wrong with the form that was meant. */
function flatten(issue: Issue, path: PropertyKey[] = []): { path: string[]; message: string }[] {
  const full = [...path, ...issue.path];
  if (issue.code !== 'invalid_union' || issue.errors.length === 0) {
    return [{ path: full.map(String), message: issue.message }];
  }
  const branches = issue.errors.map((errors) => ({
    strangers: errors.filter(({ code }) => code === 'unrecognized_keys').length,
    issues: errors.flatMap((one) => flatten(one, full)),
  }));
  const [meant] = branches.toSorted(
    (a, b) => a.strangers - b.strangers || a.issues.length - b.issues.length,
  );
  return meant?.issues ?? [];
}

/** For what the schema has no sentence of its own. */
function sayIssue(issue: z.core.$ZodRawIssue): string {
  const { path = [] } = issue;
  switch (issue.code) {
    case 'invalid_type':
      return issue.expected === 'number' || issue.expected === 'int'
        ? 'Write a number.'
        : 'Fill this in.';
    case 'too_small':
      if (issue.origin === 'string') return 'Write something here.';
      if (issue.origin === 'array') return 'Add at least one.';
      return `Write ${issue.inclusive === false ? 'more than' : 'at least'} ${issue.minimum}.`;
    case 'too_big':
      if (issue.origin === 'string') return `Use at most ${issue.maximum} letters.`;
      if (issue.origin === 'array') return `There can be ${issue.maximum} at most.`;
      return `Write ${issue.maximum} at most.`;
    case 'invalid_union':
      return path.at(-1) === 'basis' || path.at(-1) === 'window'
        ? 'Choose by which clock the hours are meant.'
        : 'Choose one.';
    default:
      return 'This cannot be read. Choose or write it anew.';
  }
}
