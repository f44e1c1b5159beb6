import { sayClause, sayClauseParts, type ClauseParts } from './clause-sentence.ts';
import type { ClauseFigures } from './clause-words.ts';
import type { Rule, RuleClause } from './rule-schema.ts';

/** One thing in which two versions of a rule differ. */
export interface RuleDifference {
  kind: 'rule' | 'added' | 'removed' | 'changed' | 'moved';
  /** The title of the clause in which they differ; null for the rule as a whole. */
  clause: string | null;
  /** The difference as one English sentence. */
  sentence: string;
}

const partWords = {
  judged: 'Judged',
  days: 'Days',
  hours: 'Hours',
  measured: 'Measured',
  heldAgainst: 'Held against',
  asked: 'Asked',
  notCounted: 'Not counted',
  weight: 'Weight',
} as const satisfies Record<keyof ClauseParts, string>;

const whereSilent = {
  heldAgainst: 'what stands now',
  weight: 'counts once in the loss index',
} as const;

/**
 * What changes from one version of a rule to another, in English: the rule's own texts first, then
 * clause by clause in the order of the later one, then what is dropped. Clauses belong together by
 * their ids. Empty where the two judge alike; their numbers are not compared.
 *
 * @param figures how the reader's locale writes figures
 */
export function compareRules(earlier: Rule, later: Rule, figures: ClauseFigures): RuleDifference[] {
  const clausesBefore = new Map(earlier.clauses.map((clause) => [clause.id, clause]));
  const idsAfter = new Set(later.clauses.map(({ id }) => id));
  return [
    ...compareTexts(earlier, later, figures),
    ...later.clauses.flatMap((clause): RuleDifference[] => {
      const before = clausesBefore.get(clause.id);
      return before === undefined
        ? [difference('added', clause.title, `New: ${sayClause(clause, figures)}`)]
        : compareClauses(before, clause, figures);
    }),
    ...earlier.clauses
      .filter(({ id }) => !idsAfter.has(id))
      .map((clause) =>
        difference('removed', clause.title, `Dropped: ${sayClause(clause, figures)}`),
      ),
    ...compareOrder(earlier, later),
  ];
}

function difference(
  kind: RuleDifference['kind'],
  clause: string | null,
  sentence: string,
): RuleDifference {
  return { kind, clause, sentence };
}

function compareTexts(earlier: Rule, later: Rule, figures: ClauseFigures): RuleDifference[] {
  const bands = ({ bands: all }: Rule) =>
    all.map(({ upTo, label }) => `${label} up to ${figures.percent(upTo)}`).join(', ');
  const texts = [
    { part: 'Title', before: quote(earlier.title), after: quote(later.title) },
    { part: 'Citation', before: quote(earlier.citation), after: quote(later.citation) },
    { part: 'What a loss is called', before: bands(earlier), after: bands(later) },
  ];
  return texts.flatMap(({ part, before, after }) =>
    before === after ? [] : [difference('rule', null, sayChange(part, before, after))],
  );
}

function compareClauses(
  earlier: RuleClause,
  later: RuleClause,
  figures: ClauseFigures,
): RuleDifference[] {
  const before = sayClauseParts(earlier, figures);
  const after = sayClauseParts(later, figures);
  const changes =
    earlier.title === later.title
      ? []
      : [sayChange('Title', quote(earlier.title), quote(later.title))];
  for (const part of Object.keys(partWords) as (keyof ClauseParts)[]) {
    const silent = part in whereSilent ? whereSilent[part as keyof typeof whereSilent] : '';
    const one = before[part] ?? silent;
    const other = after[part] ?? silent;
    if (one !== other) changes.push(sayChange(partWords[part], one, other));
  }
  return changes.map((sentence) => difference('changed', later.title, sentence));
}

/** Only where the clauses that both have stand in another order. */
function compareOrder(earlier: Rule, later: Rule): RuleDifference[] {
  const idsOf = (one: Rule, other: Rule) => {
    const kept = new Set(other.clauses.map(({ id }) => id));
    return one.clauses.filter(({ id }) => kept.has(id)).map(({ id }) => id);
  };
  if (idsOf(earlier, later).join(' ') === idsOf(later, earlier).join(' ')) return [];
  const titles = later.clauses.map(({ title }) => quote(title)).join(', ');
  return [difference('moved', null, `The clauses stand in another order: ${titles}.`)];
}

function sayChange(part: string, before: string, after: string): string {
  return `${part}: ${after}; before: ${before}.`;
}

function quote(text: string): string {
  return text === '' ? 'none' : `“${text}”`;
}
