import { z } from 'zod';

/** `error` forbids submission; `warning` is shown; `repaired` says what was put right in the reading. */
export const issueSeveritySchema = z.enum(['error', 'warning', 'repaired']);
export type IssueSeverity = z.infer<typeof issueSeveritySchema>;

/** One thing found in a massing file, with the place and the way out. */
export const massingIssueSchema = z.object({
  /** Stable: `MASSING_RING_OPEN`. */
  code: z.string().regex(/^MASSING_[A-Z_]+$/),
  severity: issueSeveritySchema,
  /** The feature's own id or name, else its place in the file (`feature 3`); null for the file as a whole. */
  feature: z.string().nullable(),
  /** Longitude and latitude of the place, where there is one. */
  lngLat: z.tuple([z.number(), z.number()]).nullable(),
  /** What is the matter, as a sentence. */
  message: z.string(),
  /** What to do, as a sentence; empty for a repair that needs nothing. */
  suggestion: z.string(),
});
export type MassingIssue = z.infer<typeof massingIssueSchema>;
