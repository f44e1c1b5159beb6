import { randomUUID } from 'node:crypto';
import { defineEntity, p } from '@mikro-orm/core';
import type { InferEntity } from '@mikro-orm/core';
import { studyStatusSchema } from '../../../shared/contracts/cases.ts';
import type { FindingRow } from '../../../shared/contracts/studies.ts';
import type { StudyFindings } from '../../../shared/study/evidence-schema.ts';
import { ReviewCase } from '../cases/review-case.entity.ts';
import { MassingRevision } from '../massings/massing-revision.entity.ts';
import { Person } from '../people/person.entity.ts';
import { RuleVersion } from '../rules/rule-version.entity.ts';

/** One computation of one massing revision under one rule version; once finished it never changes. */
export const Study = defineEntity({
  name: 'Study',
  properties: {
    id: p
      .uuid()
      .primary()
      .onCreate(() => randomUUID()),
    reviewCase: () => p.manyToOne(ReviewCase).index(),
    massing: () => p.manyToOne(MassingRevision),
    ruleVersion: () => p.manyToOne(RuleVersion),
    /** The civil year in which its days are taken. */
    year: p.integer(),
    requestedBy: () => p.manyToOne(Person),
    requestedAt: p.datetime(3),
    status: p.enum([...studyStatusSchema.options]),
    instantsDone: p.integer().default(0),
    instantsTotal: p.integer().default(0),
    /** The worker run that computes it; a run whose claim is gone stores nothing. */
    claim: p.uuid().nullable(),
    /** When that run last showed life. */
    heartbeatAt: p.datetime(3).nullable(),
    /** How many runs were begun. */
    attempts: p.integer().default(0),
    finishedAt: p.datetime(3).nullable(),
    /** Why it failed, as a sentence. */
    failure: p.text().nullable(),
    engine: p.string().length(40).nullable(),
    digest: p.string().length(71).nullable(),
    findings: p.json<StudyFindings>().nullable(),
    /** The findings table, made once from the evidence. */
    findingRows: p.json<FindingRow[]>().nullable().lazy(true, false),
    /** The evidence file, to the byte as it is handed out. */
    evidence: p.text().nullable().lazy(true, false),
  },
});
export type Study = InferEntity<typeof Study>;
