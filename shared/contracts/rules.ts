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
