import { z } from 'zod';
import { ruleSchema } from '../rules/rule-schema.ts';

/** `scheduled` has a day that has not come yet; until then it can be changed like a draft. */
export const ruleVersionStateSchema = z.enum(['draft', 'scheduled', 'in-force', 'retired']);
export type RuleVersionState = z.infer<typeof ruleVersionStateSchema>;

/** What the signed-in person may do with a version now; buttons follow these, and the server checks them again. */
export const ruleAbilities = ['copy', 'change', 'enact', 'try'] as const;
export const ruleAbilitySchema = z.enum(ruleAbilities);
export type RuleAbility = z.infer<typeof ruleAbilitySchema>;

/** When something was done, and by whom: null for the set-up of the server, and to the public. */
const deedSchema = z.object({ at: z.iso.datetime(), by: z.string().nullable() });

export const ruleVersionSchema = z.object({
  id: z.uuid(),
  state: ruleVersionStateSchema,
  inForceFrom: z.iso.date().nullable(),
  rule: ruleSchema,
  created: deedSchema,
  /** The last change of the draft. */
  changed: deedSchema.nullable(),
  /** Setting the day from which it holds. */
  enacted: deedSchema.nullable(),
  /** Changes with every change of the version; sent back with the next one. */
  stamp: z.string(),
  abilities: z.array(ruleAbilitySchema),
});
export type RuleVersion = z.infer<typeof ruleVersionSchema>;

export const ruleVersionListSchema = z.object({
  rows: z.array(ruleVersionSchema),
  /** Whether the person may write versions of the rule at all. */
  mayWrite: z.boolean(),
});

/** What the register of versions keeps of an id. */
const ruleIdLength = 100;

const storedRuleSchema = ruleSchema.refine(({ id }) => id.length <= ruleIdLength, {
  path: ['id'],
  error: `Use at most ${ruleIdLength} letters.`,
});

export const createRuleVersionInputSchema = z.strictObject({
  /** Complete, with the number of the next version. */
  rule: storedRuleSchema,
  /** The civil day from which it holds; null keeps it a draft. */
  inForceFrom: z.iso.date().nullable(),
});
export type CreateRuleVersionInput = z.output<typeof createRuleVersionInputSchema>;

/** The stamp of the version that the person saw; the change is refused when it has another by now. */
const seenSchema = z.string().max(60);

export const changeRuleDraftInputSchema = z.strictObject({
  /** Complete, with the draft's own id and number. */
  rule: storedRuleSchema,
  seen: seenSchema,
});
export type ChangeRuleDraftInput = z.output<typeof changeRuleDraftInputSchema>;

export const discardRuleDraftQuerySchema = z.object({ seen: seenSchema });

export const enactRuleVersionInputSchema = z.strictObject({
  /** The civil day from which it holds, today at the earliest; null makes it a draft again. */
  inForceFrom: z.iso.date().nullable(),
  seen: seenSchema,
});
export type EnactRuleVersionInput = z.output<typeof enactRuleVersionInputSchema>;
