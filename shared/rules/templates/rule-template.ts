import type { z } from 'zod';
import { ruleSchema, type clauseSchema, type Rule } from '../rule-schema.ts';

/** A published approach as a ready rule: a place to begin from, to be held against one's own text. */
export interface RuleTemplate {
  id: string;
  /** What it asks for, in plain words. */
  title: string;
  citation: string;
  /** What is left out, or was taken to mean one of two things; empty where there is nothing to say. */
  remark: string;
  rule: Rule;
}

type ClauseDraft = z.input<typeof clauseSchema>;

/** Said of a source whose text was not read. */
export const fromMemory = 'from memory: check your own text';

/** The sun as long as it is up. */
export const wholeDay = { basis: 'sun', afterSunrise: 0, beforeSunset: 0 } as const;

/** Makes a template; its rule is complete with all defaults. */
export function makeTemplate(draft: {
  id: string;
  title: string;
  citation: string;
  remark?: string;
  clauses: readonly (Omit<ClauseDraft, 'id' | 'title'> & { id?: string; title?: string })[];
}): RuleTemplate {
  const { id, title, citation, remark = '' } = draft;
  const clauses = draft.clauses.map((clause) => ({ id, title, ...clause }));
  return {
    id,
    title,
    citation,
    remark,
    rule: ruleSchema.parse({ id, version: 1, title, citation, clauses }),
  };
}
