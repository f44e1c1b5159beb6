import { randomUUID } from 'node:crypto';
import { defineEntity, p } from '@mikro-orm/core';
import type { InferEntity } from '@mikro-orm/core';
import type { MassingBlock } from '../../../shared/massing/massing-block.ts';
import type { MassingFigures } from '../../../shared/massing/massing-figures.ts';
import type { MassingIssue } from '../../../shared/massing/massing-issue.ts';
import { ReviewCase } from '../cases/review-case.entity.ts';
import { Person } from '../people/person.entity.ts';

/** A massing file as it was sent, with what was read from it. A revision is never updated: the database refuses it. */
export const MassingRevision = defineEntity({
  name: 'MassingRevision',
  uniques: [{ properties: ['reviewCase', 'revision'] }],
  properties: {
    id: p
      .uuid()
      .primary()
      .onCreate(() => randomUUID()),
    reviewCase: () => p.manyToOne(ReviewCase),
    /** Counts from 1 in each case, without gaps. */
    revision: p.integer(),
    fileName: p.string().length(255),
    /** The bytes as sent. */
    original: p.blob().lazy(true, false),
    /** SHA-256 of the original bytes, hexadecimal. */
    sha256: p.string().length(64),
    sizeBytes: p.integer(),
    uploadedBy: () => p.manyToOne(Person),
    createdAt: p.datetime(3),
    issues: p.json<MassingIssue[]>(),
    blocks: p.json<MassingBlock[]>().lazy(true, false),
    figures: p.json<MassingFigures>(),
    /** No issue is an error. */
    sound: p.boolean(),
  },
});
export type MassingRevision = InferEntity<typeof MassingRevision>;
