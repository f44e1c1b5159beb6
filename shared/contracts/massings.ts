import { z } from 'zod';
import { polygonalSchema } from '../geometry/geojson-schema.ts';
import { massingFiguresSchema } from '../massing/massing-figures.ts';
import { massingIssueSchema } from '../massing/massing-issue.ts';

export { massingFiguresSchema, type MassingFigures } from '../massing/massing-figures.ts';
export { massingLimits } from '../massing/massing-limits.ts';

export const massingBlockFeatureSchema = z.object({
  type: z.literal('Feature'),
  properties: z.object({
    id: z.string(),
    role: z.enum(['proposed', 'existing']),
    baseM: z.number(),
    topM: z.number(),
    storeys: z.int().nullable(),
    name: z.string().nullable(),
  }),
  geometry: polygonalSchema,
});

export const massingSummarySchema = z.object({
  revision: z.int(),
  fileName: z.string(),
  sizeBytes: z.int(),
  /** SHA-256 of the bytes as sent, hexadecimal. */
  sha256: z.string(),
  uploadedAt: z.iso.datetime(),
  uploadedByName: z.string(),
  /** No issue of severity `error`. */
  sound: z.boolean(),
  figures: massingFiguresSchema,
});
export type MassingSummary = z.infer<typeof massingSummarySchema>;

export const massingDetailSchema = massingSummarySchema.extend({
  issues: z.array(massingIssueSchema),
  blocks: z.object({
    type: z.literal('FeatureCollection'),
    features: z.array(massingBlockFeatureSchema),
  }),
});
export type MassingDetail = z.infer<typeof massingDetailSchema>;

export const massingListSchema = z.object({ rows: z.array(massingSummarySchema) });

const comparedBlockSchema = z.object({
  baseM: z.number(),
  topM: z.number(),
  footprintM2: z.number().nullable(),
});

/** What changed from one revision to another, block by block. */
export const massingComparisonSchema = z.object({
  from: z.int(),
  to: z.int(),
  blocks: z.array(
    z.object({
      id: z.string(),
      change: z.enum(['added', 'removed', 'changed', 'same']),
      before: comparedBlockSchema.nullable(),
      after: comparedBlockSchema.nullable(),
    }),
  ),
  figuresBefore: massingFiguresSchema,
  figuresAfter: massingFiguresSchema,
});
export type MassingComparison = z.infer<typeof massingComparisonSchema>;
