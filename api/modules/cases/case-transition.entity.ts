import { randomUUID } from 'node:crypto';
import { defineEntity, p } from '@mikro-orm/core';
import type { InferEntity } from '@mikro-orm/core';
import { caseStates } from '../../../shared/contracts/case-life.ts';
import { roles } from '../../../shared/contracts/people.ts';
import { Person } from '../people/person.entity.ts';
import { ReviewCase } from './review-case.entity.ts';

/** One step in the life of a case, kept for ever: the database refuses a change. */
export const CaseTransition = defineEntity({
  name: 'CaseTransition',
  uniques: [{ properties: ['reviewCase', 'position'] }],
  properties: {
    id: p
      .uuid()
      .primary()
      .onCreate(() => randomUUID()),
    reviewCase: () => p.manyToOne(ReviewCase),
    /** Counts from 1 in each case. */
    position: p.integer(),
    from: p.enum([...caseStates]).fieldName('from_state'),
    to: p.enum([...caseStates]).fieldName('to_state'),
    at: p.datetime(3),
    by: () => p.manyToOne(Person),
    byRole: p.enum([...roles]),
    reason: p.text().nullable(),
    /** For a case sent back: the day by which the correction is due. */
    dueDate: p.date().nullable(),
  },
});
export type CaseTransition = InferEntity<typeof CaseTransition>;
