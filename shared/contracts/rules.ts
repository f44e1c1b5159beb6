import { z } from 'zod';
import { ruleSchema } from '../rules/rule-schema.ts';

export const ruleVersionStateSchema = z.enum(['draft', 'in-force', 'retired']);

export const ruleVersionSchema = z.object({
  id: z.uuid(),
  state: ruleVersionStateSchema,
  inForceFrom: z.iso.date().nullable(),
  rule: ruleSchema,
});
export type RuleVersion = z.infer<typeof ruleVersionSchema>;

export const ruleVersionListSchema = z.object({ rows: z.array(ruleVersionSchema) });

/** What the register of versions keeps of an id. */
const ruleIdLength = 100;

export const createRuleVersionInputSchema = z.strictObject({
  /** Complete, with the number of the next version. */
  rule: ruleSchema.refine(({ id }) => id.length <= ruleIdLength, {
    path: ['id'],
    error: `Use at most ${ruleIdLength} letters.`,
  }),
  /** The civil day from which it holds; null keeps it a draft. */
  inForceFrom: z.iso.date().nullable(),
});
export type CreateRuleVersionInput = z.output<typeof createRuleVersionInputSchema>;
