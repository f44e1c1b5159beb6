import type { UnfinishedClause } from '../../../shared/rules/clause-sentence.ts';
import type { Rule, RuleClause, RuleWindow } from '../../../shared/rules/rule-schema.ts';
import type { RuleTemplate } from '../../../shared/rules/templates/rule-templates.ts';

/** Hours whose clock is not chosen yet: the rule has to say which one it means. */
export type WindowDraft = RuleWindow | { basis: null };

/** A clause in the form: everything of a clause, a number that is not written being NaN. */
export interface ClauseDraft extends Omit<RuleClause, 'window'> {
  window: WindowDraft;
  /** Tells the form's clauses apart, also while two have the same id. */
  key: string;
  /** Where a clause from a template comes from, and what to heed; not part of the rule. */
  source: { citation: string; remark: string } | null;
}

/** A rule in the form; its id and number are not written by hand. */
export interface RuleDraft {
  title: string;
  citation: string;
  clauses: ClauseDraft[];
  bands: Rule['bands'];
}

export function draftOfRule({ title, citation, clauses, bands }: Rule): RuleDraft {
  return { title, citation, bands, clauses: clauses.map((clause) => draftOfClause(clause)) };
}

function draftOfClause(clause: RuleClause, source: ClauseDraft['source'] = null): ClauseDraft {
  return { ...clause, source, key: crypto.randomUUID() };
}

/** The rule as the schema reads it: what is not chosen is left out. */
export function ruleOfDraft(
  { title, citation, clauses, bands }: RuleDraft,
  { id, version }: Pick<Rule, 'id' | 'version'>,
): Record<string, unknown> {
  return { id, version, title, citation, clauses: clauses.map(clauseOfDraft), bands };
}

export function clauseOfDraft({
  key: _key,
  source: _source,
  window,
  ...clause
}: ClauseDraft): Record<string, unknown> {
  return { ...clause, window: window.basis === null ? {} : window };
}

/** For its sentence, which can do without a clock. */
export function unfinishedClause({ window, ...clause }: ClauseDraft): UnfinishedClause {
  return { ...clause, window: window.basis === null ? null : window };
}

/** A clause to begin from: everything that can be guessed, and no clock. */
export function blankClause(others: readonly ClauseDraft[]): ClauseDraft {
  return {
    key: crypto.randomUUID(),
    source: null,
    id: freeId('clause', others),
    title: '',
    receptors: { classes: ['yard'], of: 'open' },
    days: [{ event: 'winter-solstice' }],
    window: { basis: null },
    minimumAltitude: 0,
    step: 10,
    measure: { kind: 'sun-hours' },
    limit: { atLeast: 2 },
    disregard: { minutes: 0, area: 1 },
    weight: 1,
  };
}

/** A template's clauses, with ids that no clause of the rule has. */
export function clausesOfTemplate(
  { citation, remark, rule }: RuleTemplate,
  others: readonly ClauseDraft[],
): ClauseDraft[] {
  const taken = [...others];
  for (const clause of rule.clauses) {
    const id = freeId(clause.id, taken);
    taken.push({ ...draftOfClause(clause, { citation, remark }), id });
  }
  return taken.slice(others.length);
}

export function copyOfClause(clause: ClauseDraft, others: readonly ClauseDraft[]): ClauseDraft {
  return {
    ...clause,
    key: crypto.randomUUID(),
    id: freeId(clause.id, others),
    title: `${clause.title} (copy)`,
  };
}

/** The wanted id, with a number where another clause has it. */
function freeId(wanted: string, others: readonly ClauseDraft[]): string {
  const taken = new Set(others.map(({ id }) => id));
  if (!taken.has(wanted)) return wanted;
  const stem = wanted.replace(/-\d+$/, '');
  let number = 2;
  while (taken.has(`${stem}-${number}`)) number += 1;
  return `${stem}-${number}`;
}
