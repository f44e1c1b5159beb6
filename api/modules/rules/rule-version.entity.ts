import { randomUUID } from 'node:crypto';
import { defineEntity, p } from '@mikro-orm/core';
import type { InferEntity } from '@mikro-orm/core';
import type { Rule } from '../../../shared/rules/rule-schema.ts';
import { Person } from '../people/person.entity.ts';

/**
 * One version of the municipality's rule. Its state follows from the dates; once it has come into force,
 * or a study was judged by it, it never changes (a trigger refuses it).
 */
export const RuleVersion = defineEntity({
  name: 'RuleVersion',
  properties: {
    id: p
      .uuid()
      .primary()
      .onCreate(() => randomUUID()),
    ruleId: p.string().length(100),
    version: p.integer(),
    /** A civil day of the municipality; null for a draft. */
    inForceFrom: p.date().nullable(),
    rule: p.json<Rule>(),
    createdAt: p.datetime(3).onCreate(() => new Date()),
    /** Null for a version that was put in place when the server was set up. */
    createdBy: () => p.manyToOne(Person).nullable(),
    /** The last change of a draft. */
    changedAt: p.datetime(3).nullable(),
    changedBy: () => p.manyToOne(Person).nullable(),
    /** When and by whom the day was set from which it holds. */
    enactedAt: p.datetime(3).nullable(),
    enactedBy: () => p.manyToOne(Person).nullable(),
  },
  uniques: [{ properties: ['ruleId', 'version'] }],
});
export type RuleVersion = InferEntity<typeof RuleVersion>;
