import { randomUUID } from 'node:crypto';
import { defineEntity, p } from '@mikro-orm/core';
import type { InferEntity } from '@mikro-orm/core';
import { ReviewCase } from '../cases/review-case.entity.ts';
import { MassingRevision } from '../massings/massing-revision.entity.ts';
import { Person } from '../people/person.entity.ts';
import { Study } from '../studies/study.entity.ts';
import type { ReportPayload } from './report-payload.ts';

/** An issued staff report. It never changes and never goes: the database refuses both. */
export const Report = defineEntity({
  name: 'Report',
  uniques: [{ properties: ['reviewCase', 'ordinal'] }],
  properties: {
    id: p
      .uuid()
      .primary()
      .onCreate(() => randomUUID()),
    /** `2026-0001-R1` */
    number: p.string().length(40).unique(),
    reviewCase: () => p.manyToOne(ReviewCase),
    /** Counts from 1 in each case, without gaps. */
    ordinal: p.integer(),
    massing: () => p.manyToOne(MassingRevision),
    study: () => p.manyToOne(Study),
    studyDigest: p.string().length(71),
    issuedBy: () => p.manyToOne(Person),
    issuedAt: p.datetime(3),
    pdf: p.blob().lazy(true, false),
    sizeBytes: p.integer(),
    pages: p.integer(),
    /** SHA-256 of the PDF, hexadecimal. */
    sha256: p.string().length(64),
    /** What the PDF was drawn from. */
    payload: p.json<ReportPayload>().lazy(true, false),
  },
});
export type Report = InferEntity<typeof Report>;
