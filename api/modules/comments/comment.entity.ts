import { randomUUID } from 'node:crypto';
import { defineEntity, p } from '@mikro-orm/core';
import type { InferEntity } from '@mikro-orm/core';
import { commentStateSchema } from '../../../shared/contracts/comments.ts';
import type { LngLat } from '../../../shared/geometry/geojson-schema.ts';
import { ReviewCase } from '../cases/review-case.entity.ts';
import { Person } from '../people/person.entity.ts';

/** What a neighbour wrote about a case; shown to the public once a planner has published it. */
export const Comment = defineEntity({
  name: 'Comment',
  properties: {
    id: p
      .uuid()
      .primary()
      .onCreate(() => randomUUID()),
    reviewCase: () => p.manyToOne(ReviewCase).index(),
    authorName: p.string().length(120),
    /** For staff only. */
    authorEmail: p.string().length(254),
    body: p.text(),
    pin: p.json<LngLat>().nullable(),
    /** The massing revision that was open when it was written. */
    revision: p.integer().nullable(),
    receivedAt: p.datetime(3),
    state: p.enum([...commentStateSchema.options]),
    withheldReason: p.text().nullable(),
    moderatedBy: () => p.manyToOne(Person).nullable(),
    moderatedAt: p.datetime(3).nullable(),
  },
});
export type Comment = InferEntity<typeof Comment>;
