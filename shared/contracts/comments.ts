import { z } from 'zod';
import { lngLatSchema } from '../geometry/geojson-schema.ts';
import { listQuerySchema, pageSchema } from './paging.ts';
import { emailSchema } from './people.ts';

export const commentLimits = { bodyCharacters: 5000, nameCharacters: 120 } as const;

export const createCommentInputSchema = z.strictObject({
  authorName: z.string().trim().min(1, 'Write your name.').max(commentLimits.nameCharacters),
  /** Never shown to the public. */
  authorEmail: emailSchema,
  body: z
    .string()
    .trim()
    .min(5, 'Write what you want to say.')
    .max(commentLimits.bodyCharacters, 'Keep it under 5,000 characters.'),
  /** Where the comment is about, if the person dropped a pin. */
  pin: lngLatSchema.nullable().default(null),
});
export type CreateCommentInput = z.input<typeof createCommentInputSchema>;

export const commentStateSchema = z.enum(['waiting', 'published', 'withheld']);
export type CommentState = z.infer<typeof commentStateSchema>;

export const commentSchema = z.object({
  id: z.uuid(),
  authorName: z.string(),
  body: z.string(),
  pin: lngLatSchema.nullable(),
  /** The massing revision that was open when the comment was written. */
  revision: z.int().nullable(),
  receivedAt: z.iso.datetime(),
  state: commentStateSchema,
  /** For staff only. */
  withheldReason: z.string().nullable(),
  authorEmail: z.string().nullable(),
});
export type Comment = z.infer<typeof commentSchema>;

/** What the author gets back: a receipt. */
export const commentReceiptSchema = z.object({ id: z.uuid(), receivedAt: z.iso.datetime() });
export type CommentReceipt = z.infer<typeof commentReceiptSchema>;

export const moderateCommentInputSchema = z.discriminatedUnion('state', [
  z.strictObject({ state: z.literal('published') }),
  z.strictObject({
    state: z.literal('withheld'),
    reason: z.string().trim().min(3, 'Say why it is withheld.').max(1000),
  }),
]);
export type ModerateCommentInput = z.infer<typeof moderateCommentInputSchema>;

export const listCommentsQuerySchema = listQuerySchema.extend({
  state: commentStateSchema.optional(),
});
export const commentPageSchema = pageSchema(commentSchema);
export type CommentPage = z.infer<typeof commentPageSchema>;
