import { randomUUID } from 'node:crypto';
import { defineEntity, p } from '@mikro-orm/core';
import type { InferEntity } from '@mikro-orm/core';
import { roles } from '../../../shared/contracts/people.ts';

/** Somebody who signs in; neighbours don't. */
export const Person = defineEntity({
  name: 'Person',
  properties: {
    id: p
      .uuid()
      .primary()
      .onCreate(() => randomUUID()),
    /** In small letters. */
    email: p.string().length(254).unique(),
    name: p.string().length(120),
    role: p.enum([...roles]),
    /** argon2id, in the PHC form. */
    passwordHash: p.string().length(255).hidden(),
    createdAt: p.datetime(3).onCreate(() => new Date()),
  },
});
export type Person = InferEntity<typeof Person>;
