import { z } from 'zod';

/** `2026-0001-R1` */
export const reportNumberSchema = z
  .string()
  .regex(/^\d{4}-\d{4,}-R\d+$/, 'This is not a report number.');

export const issueReportInputSchema = z.strictObject({
  /** The planner's narrative: plain paragraphs, separated by empty lines. */
  narrative: z.string().trim().max(20_000).default(''),
  recommendation: z.string().trim().max(4000).default(''),
});
export type IssueReportInput = z.input<typeof issueReportInputSchema>;

export const reportSchema = z.object({
  number: reportNumberSchema,
  revision: z.int(),
  studyId: z.uuid(),
  studyDigest: z.string(),
  issuedAt: z.iso.datetime(),
  issuedByName: z.string(),
  sizeBytes: z.int(),
  pages: z.int(),
  /** SHA-256 of the PDF, hexadecimal. */
  sha256: z.string(),
  /** A later report or revision has taken its place. */
  superseded: z.boolean(),
});
export type Report = z.infer<typeof reportSchema>;

export const reportListSchema = z.object({ rows: z.array(reportSchema) });
