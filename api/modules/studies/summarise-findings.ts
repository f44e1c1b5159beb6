import {
  judgedClassSchema,
  type ClauseSummary,
  type FindingRow,
  type FindingsSummary,
} from '../../../shared/contracts/studies.ts';
import type { Rule } from '../../../shared/rules/rule-schema.ts';
import type { Finding } from '../../../shared/study/evidence-schema.ts';
import type { Study } from './study.entity.ts';

/** A finished study's findings summed up, in the order of the rule's clauses. */
export function summariseFindings({
  findings,
  findingRows,
  rule,
}: Pick<Study, 'findings' | 'findingRows'> & { rule: Rule }): FindingsSummary {
  const all = findingRows ?? [];
  const clauses = (findings?.clauses ?? []).map(({ clause, finding }): ClauseSummary => {
    const rows = all.filter((row) => row.clause === clause);
    const count = (wanted: Finding) => rows.filter((row) => row.finding === wanted).length;
    return {
      clause,
      title: rule.clauses.find(({ id }) => id === clause)?.title ?? clause,
      finding,
      judged: rows.length,
      notMet: count('not-met'),
      met: count('met'),
      disregarded: count('disregarded'),
      notAffected: count('not-affected'),
      close: rows.filter(({ close }) => close).length,
      worst: findWorst(rows),
    };
  });
  const classes = judgedClassSchema.options.filter((one) => all.some((row) => row.class === one));
  return { clauses, classes };
}

/** One that fails, if any does: a disregarded receptor may have the worse margin. Margins of several units have no worst. */
function findWorst(rows: readonly FindingRow[]): ClauseSummary['worst'] {
  const notMet = rows.filter(({ finding }) => finding === 'not-met');
  const affected = rows.filter(({ finding }) => finding !== 'not-affected');
  const [first, ...rest] = notMet.length > 0 ? notMet : affected;
  if (first === undefined || rest.some(({ unit }) => unit !== first.unit)) return null;
  const worst = rest.reduce((found, row) => (row.margin < found.margin ? row : found), first);
  const { receptor, label, margin, unit } = worst;
  return { receptor, label, margin, unit };
}
