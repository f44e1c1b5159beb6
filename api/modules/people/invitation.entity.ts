import { randomUUID } from 'node:crypto';
import { defineEntity, p } from '@mikro-orm/core';
import type { InferEntity } from '@mikro-orm/core';
import { roles } from '../../../shared/contracts/people.ts';

/** A one-time link by which somebody sets a password and becomes a person with this role. */
export const Invitation = defineEntity({
  name: 'Invitation',
  properties: {
    id: p
      .uuid()
      .primary()
      .onCreate(() => randomUUID()),
    role: p.enum([...roles]),
    /** SHA-256 of the token, hexadecimal: who reads the database cannot use the link. */
    tokenHash: p.string().length(64).unique().hidden(),
    createdAt: p.datetime(3).onCreate(() => new Date()),
    expiresAt: p.datetime(3),
    acceptedAt: p.datetime(3).nullable(),
  },
});
export type Invitation = InferEntity<typeof Invitation>;
