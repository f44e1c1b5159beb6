import { z } from 'zod';
import { lngLatSchema, polygonalSchema } from '../geometry/geojson-schema.ts';
import { caseStateSchema } from './case-life.ts';
import { listQuerySchema, pageSchema } from './paging.ts';
import { roleSchema } from './people.ts';

/** `2026-0001` once submitted, `draft-…` before; both resolve for ever. */
export const caseReferenceSchema = z
  .string()
  .regex(/^(?:\d{4}-\d{4,}|draft-[a-z0-9]{10,})$/, 'This is not a case number.');

export const parcelNumbersSchema = z
  .array(z.string().min(1).max(40))
  .min(1, 'Pick at least one site parcel.')
  .max(50);

const applicationFields = {
  title: z.string().trim().min(3, 'Give the project a name.').max(120),
  description: z.string().trim().max(4000),
  siteParcels: parcelNumbersSchema,
};

export const createCaseInputSchema = z.strictObject({
  ...applicationFields,
  description: applicationFields.description.default(''),
});
export type CreateCaseInput = z.input<typeof createCaseInputSchema>;

/** Without defaults: a field that is left out stays as it is. */
export const updateCaseInputSchema = z.strictObject(applicationFields).partial();
export type UpdateCaseInput = z.input<typeof updateCaseInputSchema>;

export const transitionInputSchema = z.strictObject({
  to: caseStateSchema,
  /** The state that the person saw; the change is refused when the case has moved on. */
  from: caseStateSchema.optional(),
  reason: z.string().trim().max(4000).optional(),
  /** For a case sent back: the day by which the correction is due. */
  dueDate: z.iso.date().optional(),
});
export type TransitionInput = z.infer<typeof transitionInputSchema>;

/** What the signed-in person may do with this case now; buttons follow these, and the server checks them again. */
export const caseAbilities = [
  'edit',
  'upload-massing',
  'request-study',
  'read-study',
  'read-every-comment',
  'moderate-comments',
  'write-comment',
  'issue-report',
  'read-report',
] as const;
export const caseAbilitySchema = z.enum(caseAbilities);
export type CaseAbility = z.infer<typeof caseAbilitySchema>;

export const studyStatusSchema = z.enum(['queued', 'running', 'finished', 'failed', 'cancelled']);
export type StudyStatus = z.infer<typeof studyStatusSchema>;

export const caseSummarySchema = z.object({
  /** The case number, or the draft's key while it has none. */
  reference: caseReferenceSchema,
  number: z.string().nullable(),
  title: z.string(),
  address: z.string(),
  state: caseStateSchema,
  stateSince: z.iso.datetime(),
  applicantName: z.string(),
  /** The middle of the site, for the map. */
  sitePoint: lngLatSchema.nullable(),
  latestRevision: z.int().nullable(),
  heightM: z.number().nullable(),
  storeys: z.int().nullable(),
  latestStudy: z
    .object({
      id: z.uuid(),
      revision: z.int(),
      status: studyStatusSchema,
      met: z.boolean().nullable(),
      receptorsNotMet: z.int().nullable(),
      lossIndex: z.number().nullable(),
    })
    .nullable(),
});
export type CaseSummary = z.infer<typeof caseSummarySchema>;

export const caseDetailSchema = caseSummarySchema.extend({
  description: z.string(),
  siteParcels: z.array(z.object({ number: z.string(), address: z.string() })),
  site: polygonalSchema.nullable(),
  /** What the planner asked for when the case was sent back, until it is submitted again. */
  correction: z.object({ reason: z.string(), dueDate: z.iso.date().nullable() }).nullable(),
  history: z.array(
    z.object({
      from: caseStateSchema,
      to: caseStateSchema,
      at: z.iso.datetime(),
      byRole: roleSchema,
      reason: z.string().nullable(),
    }),
  ),
  abilities: z.array(caseAbilitySchema),
  /** The transitions that this person may make now. */
  transitions: z.array(
    z.object({
      to: caseStateSchema,
      label: z.string(),
      needsReason: z.boolean(),
      /** What still stands in the way, as a sentence; null when nothing does. */
      obstacle: z.string().nullable(),
    }),
  ),
});
export type CaseDetail = z.infer<typeof caseDetailSchema>;

export const listCasesQuerySchema = listQuerySchema.extend({
  state: caseStateSchema.optional(),
  /** `mine`: the applicant's own; `desk`: all that staff may see; `public`: what anybody may see. */
  view: z.enum(['public', 'mine', 'desk']).default('public'),
});
export type ListCasesQuery = z.input<typeof listCasesQuerySchema>;

export const casePageSchema = pageSchema(caseSummarySchema);
export type CasePage = z.infer<typeof casePageSchema>;
