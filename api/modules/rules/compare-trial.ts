import type {
  RuleTrial,
  TrialChange,
  TrialClauseSide,
  TrialFinding,
  TrialRow,
} from '../../../shared/contracts/rule-trials.ts';
import { trialChangeSchema } from '../../../shared/contracts/rule-trials.ts';
import type { FindingRow } from '../../../shared/contracts/studies.ts';
import type { Rule } from '../../../shared/rules/rule-schema.ts';
import type { StudyFindings } from '../../../shared/study/evidence-schema.ts';

/** What one rule says of a case. */
export interface JudgedByRule {
  rule: Rule;
  findings: StudyFindings;
  rows: readonly FindingRow[];
}

type Comparison = Pick<RuleTrial, 'inForce' | 'draft' | 'clauses' | 'rows'>;

/**
 * Two rules' findings of one case side by side. Clauses belong together by their ids, receptors by
 * theirs; what the draft changes comes first, and of that the worst margin.
 */
export function compareTrial(inForce: JudgedByRule, draft: JudgedByRule): Comparison {
  const keyOf = ({ receptor, clause }: FindingRow) => `${clause} ${receptor}`;
  const rowsInForce = new Map(inForce.rows.map((row) => [keyOf(row), row]));
  const rowsOfDraft = new Map(draft.rows.map((row) => [keyOf(row), row]));
  const keys = [...new Set([...rowsOfDraft.keys(), ...rowsInForce.keys()])];
  const rows = keys.flatMap((key): TrialRow[] => {
    const before = rowsInForce.get(key) ?? null;
    const after = rowsOfDraft.get(key) ?? null;
    const either = after ?? before;
    if (either === null) return [];
    const { receptor, label, clause, clauseTitle } = either;
    return [
      {
        receptor,
        label,
        class: either.class,
        clause,
        clauseTitle,
        change: changeOf(before, after),
        inForce: before,
        draft: after,
      },
    ];
  });
  return {
    inForce: outcomeOf(inForce),
    draft: outcomeOf(draft),
    clauses: compareClauses(inForce, draft),
    rows: rows.sort(byChange),
  };
}

function changeOf(inForce: TrialFinding | null, draft: TrialFinding | null): TrialChange {
  const isNotMet = (side: TrialFinding | null) => side?.finding === 'not-met';
  if (isNotMet(draft) !== isNotMet(inForce)) return isNotMet(draft) ? 'worse' : 'better';
  if (draft === null || inForce === null) return 'one-sided';
  if (draft.finding !== inForce.finding) return 'finding';
  const figures = (side: TrialFinding) =>
    JSON.stringify([side.before, side.after, side.limit, side.unit, side.day, side.band]);
  return figures(draft) === figures(inForce) ? 'same' : 'figures';
}

function byChange(one: TrialRow, other: TrialRow): number {
  const rank = ({ change }: TrialRow) => trialChangeSchema.options.indexOf(change);
  const either = ({ draft, inForce }: TrialRow) => draft ?? inForce;
  const isUntouched = (row: TrialRow) => Number(either(row)?.finding === 'not-affected');
  const marginOf = (row: TrialRow) => either(row)?.margin ?? 0;
  return (
    rank(one) - rank(other) ||
    isUntouched(one) - isUntouched(other) ||
    marginOf(one) - marginOf(other) ||
    one.label.localeCompare(other.label, 'en', { numeric: true })
  );
}

function outcomeOf({ rule, findings }: JudgedByRule): RuleTrial['draft'] {
  const { title, version } = rule;
  return { title, version, met: findings.met, lossIndex: findings.lossIndex };
}

function compareClauses(inForce: JudgedByRule, draft: JudgedByRule): RuleTrial['clauses'] {
  const titles = new Map(
    [...inForce.rule.clauses, ...draft.rule.clauses].map(({ id, title }) => [id, title]),
  );
  const inOrder = [...draft.rule.clauses, ...inForce.rule.clauses].map(({ id }) => id);
  return [...new Set(inOrder)].map((clause) => ({
    clause,
    title: titles.get(clause) ?? clause,
    inForce: sideOf(inForce, clause),
    draft: sideOf(draft, clause),
  }));
}

function sideOf({ findings, rows }: JudgedByRule, clause: string): TrialClauseSide | null {
  const found = findings.clauses.find((one) => one.clause === clause);
  if (found === undefined) return null;
  return {
    finding: found.finding,
    judged: rows.filter((row) => row.clause === clause).length,
    notMet: found.receptorsNotMet.length,
  };
}
