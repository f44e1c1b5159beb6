import { addsUpOverDays, measuresArea, measuresOf, measureUnits } from './measure-kinds.ts';
import type { LimitLeaf, RuleClause, RuleDay, RuleLimit, RuleMeasure } from './rule-schema.ts';

/** What is wrong with a clause, and with which of its fields. */
export interface ClauseIssue {
  path: (string | number)[];
  message: string;
}

/**
 * What a clause's form cannot say: parts that are each right and cannot be judged together. What
 * hangs on a place and a year is in `check-rule.ts`.
 */
export function checkClause(clause: RuleClause): ClauseIssue[] {
  return [
    ...checkReceptors(clause),
    ...checkWindow(clause),
    ...checkMeasure(clause, clause.measure, ['measure']),
    ...checkLimit(clause, clause.limit, ['limit']),
  ];
}

function checkReceptors({ receptors: { classes, ring } }: RuleClause): ClauseIssue[] {
  const path = ['receptors', 'classes'];
  if (ring === undefined) {
    return classes.length > 0 ? [] : [{ path, message: 'Name at least one kind of receptor.' }];
  }
  const issues: ClauseIssue[] = [];
  if (classes.length > 0) {
    issues.push({ path, message: 'A clause judges kinds of receptors or a ring, not both.' });
  }
  if (ring.to !== undefined && ring.to <= ring.from) {
    issues.push({
      path: ['receptors', 'ring', 'to'],
      message: 'The ring must end further out than it begins.',
    });
  }
  return issues;
}

function checkWindow(clause: RuleClause): ClauseIssue[] {
  const { window } = clause;
  if (window.basis === 'sun') return [];
  const path = ['window', 'to'];
  if (window.from > window.to) return [{ path, message: 'The window ends before it begins.' }];
  if (window.from === window.to) {
    const isJudged = measuresOf(clause).every(({ kind }) => kind === 'shade-share');
    return isJudged
      ? []
      : [{ path, message: 'A single instant can be judged by shade-share only.' }];
  }
  return clause.step > windowMinutes(window)
    ? [{ path: ['step'], message: 'The step is longer than the window.' }]
    : [];
}

function windowMinutes({ from, to }: { from: string; to: string }): number {
  const toMinutes = (clock: string) => Number(clock.slice(0, 2)) * 60 + Number(clock.slice(3));
  return toMinutes(to) - toMinutes(from);
}

function checkMeasure(
  { receptors, window }: RuleClause,
  measure: RuleMeasure,
  path: ClauseIssue['path'],
): ClauseIssue[] {
  const issues: ClauseIssue[] = [];
  if (measuresArea(measure.kind) && receptors.classes.includes('window')) {
    issues.push({
      path: [...path, 'kind'],
      message: 'A window has no area in square metres; measure hours or a share instead.',
    });
  }
  const asksHours = measure.kind === 'sun-share' || measure.kind === 'sun-area';
  const hasLength = window.basis !== 'sun' && window.from < window.to;
  if (asksHours && hasLength && measure.hours * 60 > windowMinutes(window)) {
    issues.push({
      path: [...path, 'hours'],
      message: 'The window is shorter than the hours that the clause asks for.',
    });
  }
  return issues;
}

function checkLimit(
  clause: RuleClause,
  limit: RuleLimit,
  path: ClauseIssue['path'],
): ClauseIssue[] {
  if ('anyOf' in limit) {
    return limit.anyOf.flatMap((part, index) =>
      checkLimit(clause, part, [...path, 'anyOf', index]),
    );
  }
  if ('allOf' in limit) {
    return limit.allOf.flatMap((part, index) =>
      checkLimit(clause, part, [...path, 'allOf', index]),
    );
  }
  const issues = checkShare(limit, limit.measure ?? clause.measure, path);
  if (limit.measure === undefined) return issues;
  const ownPath = [...path, 'measure'];
  const isOneDay = clause.days.length === 1 && clause.days.every(isSingleDay);
  if (!isOneDay && addsUpOverDays(limit.measure.kind) !== addsUpOverDays(clause.measure.kind)) {
    issues.push({
      path: [...ownPath, 'kind'],
      message: 'A limit on each day and one on the sum of the days need clauses of their own.',
    });
  }
  return [...issues, ...checkMeasure(clause, limit.measure, ownPath)];
}

function isSingleDay(day: RuleDay): boolean {
  return 'event' in day || 'date' in day;
}

/** A share runs from 0 to 1: 50 would be fifty times the whole. */
function checkShare(
  leaf: LimitLeaf,
  { kind }: RuleMeasure,
  path: ClauseIssue['path'],
): ClauseIssue[] {
  if (measureUnits[kind] !== '1') return [];
  const bounds = [
    'atLeast' in leaf ? { member: 'atLeast', value: leaf.atLeast } : null,
    'atMost' in leaf ? { member: 'atMost', value: leaf.atMost } : null,
    'losesAtMost' in leaf ? { member: 'losesAtMost', value: leaf.losesAtMost } : null,
  ];
  return bounds.flatMap((bound) =>
    bound === null || bound.value <= 1
      ? []
      : [
          {
            path: [...path, bound.member],
            message: 'A share runs from 0 to 1: write 0.5 for half.',
          },
        ],
  );
}
