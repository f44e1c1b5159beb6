import { randomUUID } from 'node:crypto';
import { defineEntity, p } from '@mikro-orm/core';
import type { InferEntity } from '@mikro-orm/core';
import type { Rule } from '../../../shared/rules/rule-schema.ts';

/** One version of the municipality's rule; never changed once written. Its state follows from the dates. */
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
  },
  uniques: [{ properties: ['ruleId', 'version'] }],
});
export type RuleVersion = InferEntity<typeof RuleVersion>;
