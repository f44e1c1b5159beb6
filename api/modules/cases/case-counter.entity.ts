import { defineEntity, p } from '@mikro-orm/core';
import type { InferEntity } from '@mikro-orm/core';

/** The last case number given in a year; its row is locked while the next one is given. */
export const CaseCounter = defineEntity({
  name: 'CaseCounter',
  properties: {
    year: p.integer().primary().autoincrement(false),
    lastNumber: p.integer(),
  },
});
export type CaseCounter = InferEntity<typeof CaseCounter>;
