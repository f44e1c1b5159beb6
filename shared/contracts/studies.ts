import { z } from 'zod';
import { multiPolygonSchema } from '../geometry/geojson-schema.ts';
import { sunLedgerSchema } from '../receptors/sun-ledger-schema.ts';
import { receptorClassSchema } from '../rules/rule-schema.ts';
import { findingSchema, studyFindingsSchema } from '../study/evidence-schema.ts';
import { studyStatusSchema } from './cases.ts';
import { listQuerySchema, pageSchema } from './paging.ts';

export const studyDetailSchema = z.object({
  id: z.uuid(),
  caseReference: z.string(),
  revision: z.int(),
  status: studyStatusSchema,
  instantsDone: z.int(),
  instantsTotal: z.int(),
  requestedAt: z.iso.datetime(),
  finishedAt: z.iso.datetime().nullable(),
  /** Why it failed, as a sentence. */
  failure: z.string().nullable(),
  engine: z.string().nullable(),
  digest: z.string().nullable(),
  /** It judges the case's current massing revision. */
  isCurrent: z.boolean(),
  year: z.int(),
  timeZone: z.string(),
  rule: z.object({
    title: z.string(),
    version: z.int(),
    citation: z.string(),
    clauses: z.array(
      z.object({
        id: z.string(),
        title: z.string(),
        /** The days judged, and the window's first and last instant on each. */
        days: z.array(
          z.object({
            date: z.iso.date(),
            fromAt: z.iso.datetime({ offset: true }),
            toAt: z.iso.datetime({ offset: true }),
          }),
        ),
      }),
    ),
  }),
  keyDates: z.array(z.object({ event: z.string(), date: z.iso.date() })),
  /** Null until the study is finished. */
  findings: studyFindingsSchema.nullable(),
  instants: z.array(
    z.object({
      at: z.iso.datetime({ offset: true }),
      azimuthDeg: z.number(),
      altitudeDeg: z.number(),
      netNewM2: z.number().nullable(),
      removedM2: z.number().nullable(),
    }),
  ),
});
export type StudyDetail = z.infer<typeof studyDetailSchema>;

export const studyListSchema = z.object({ rows: z.array(studyDetailSchema) });

/** The event `progress` of `GET /api/studies/:id/events`. */
export const studyProgressSchema = z.object({
  status: studyStatusSchema,
  instantsDone: z.int(),
  instantsTotal: z.int(),
});
export type StudyProgress = z.infer<typeof studyProgressSchema>;

export const shadowKindSchema = z.enum(['before', 'after', 'netNew']);
export type ShadowKind = z.infer<typeof shadowKindSchema>;

/** The shadows on the ground at one instant, as polygons. */
export const instantShadowsSchema = z.object({
  type: z.literal('FeatureCollection'),
  at: z.iso.datetime({ offset: true }),
  azimuthDeg: z.number(),
  altitudeDeg: z.number(),
  features: z.array(
    z.object({
      type: z.literal('Feature'),
      properties: z.object({ kind: shadowKindSchema }),
      geometry: multiPolygonSchema,
    }),
  ),
});
export type InstantShadows = z.infer<typeof instantShadowsSchema>;

export const shadowsQuerySchema = z.object({ at: z.iso.datetime({ offset: true }) });

/** One receptor under one clause on one day: a row of the findings table. */
export const findingRowSchema = z.object({
  receptor: z.string(),
  label: z.string(),
  class: z.string(),
  clause: z.string(),
  clauseTitle: z.string(),
  day: z.iso.date().nullable(),
  finding: findingSchema,
  close: z.boolean(),
  measure: z.string(),
  unit: z.string(),
  before: z.number(),
  after: z.number(),
  lost: z.number(),
  limit: z.number(),
  margin: z.number(),
  loss: z.number().nullable(),
  band: z.string().nullable(),
  /** Of a season: the days on which the limit is not met; null for single days and sums. */
  daysNotMet: z.int().nullable().optional(),
  /** Metres between the sample points; null where none were taken. */
  spacingM: z.number().nullable().optional(),
  sentence: z.string(),
});
export type FindingRow = z.infer<typeof findingRowSchema>;

/** A receptor's class, or `ring` for the ground around the site. */
export const judgedClassSchema = z.enum([...receptorClassSchema.options, 'ring']);
export type JudgedClass = z.infer<typeof judgedClassSchema>;

export const listFindingsQuerySchema = listQuerySchema.extend({
  finding: findingSchema.optional(),
  clause: z.string().max(100).optional(),
  class: judgedClassSchema.optional(),
});
export type ListFindingsQuery = z.input<typeof listFindingsQuerySchema>;
export const findingPageSchema = pageSchema(findingRowSchema);
export type FindingPage = z.infer<typeof findingPageSchema>;

/** What a study says of each clause: its finding, and how many receptors have which. */
export const clauseSummarySchema = z.object({
  clause: z.string(),
  title: z.string(),
  finding: z.enum(['met', 'not-met', 'no-receptor']),
  judged: z.int(),
  notMet: z.int(),
  met: z.int(),
  disregarded: z.int(),
  notAffected: z.int(),
  /** Within one step or one grid spacing of the limit. */
  close: z.int(),
  /** The worst margin among the receptors that the proposal affects; null where it affects none, or their margins have several units. */
  worst: z
    .object({ receptor: z.string(), label: z.string(), margin: z.number(), unit: z.string() })
    .nullable(),
});
export type ClauseSummary = z.infer<typeof clauseSummarySchema>;

export const findingsSummarySchema = z.object({
  clauses: z.array(clauseSummarySchema),
  /** The classes that any clause judges here. */
  classes: z.array(judgedClassSchema),
});
export type FindingsSummary = z.infer<typeof findingsSummarySchema>;

/** One receptor of a study: its findings and its sun ledger on the key dates. */
export const receptorDetailSchema = z.object({
  findings: z.array(findingRowSchema),
  ledger: sunLedgerSchema,
});
export type ReceptorDetail = z.infer<typeof receptorDetailSchema>;
