import { defineEntity, p } from '@mikro-orm/core';
import type { InferEntity } from '@mikro-orm/core';

/** The answer that was given to a repeatable write, so that its repetition gets the same. */
export const IdempotencyKey = defineEntity({
  name: 'IdempotencyKey',
  properties: {
    /** Who sent it: a person's id, or `public`. */
    scope: p.string().length(40).primary(),
    key: p.string().length(200).primary(),
    /** Which request took the key first. */
    requestId: p.string().length(60),
    /** SHA-256 over method, path, body and file. */
    fingerprint: p.string().length(64),
    status: p.integer().nullable(),
    body: p.json<unknown>().nullable(),
    createdAt: p
      .datetime(3)
      .onCreate(() => new Date())
      .index(),
  },
});
export type IdempotencyKey = InferEntity<typeof IdempotencyKey>;
