import { z } from 'zod';
import { ruleSchema } from '../rules/rule-schema.ts';
import { problemSchema } from './problem.ts';
import { findingRowSchema } from './studies.ts';

/** A rule tried on the case of a finished study. */
export const tryRuleInputSchema = z.strictObject({ study: z.uuid(), rule: ruleSchema });
export type TryRuleInput = z.output<typeof tryRuleInputSchema>;

/** What one of the two rules says of one receptor under one clause. */
const trialFindingSchema = findingRowSchema.pick({
  day: true,
  finding: true,
  close: true,
  unit: true,
  before: true,
  after: true,
  limit: true,
  margin: true,
  band: true,
  sentence: true,
});
export type TrialFinding = z.infer<typeof trialFindingSchema>;

/**
 * From what matters most to what stays: `worse` is not met under the draft alone, `better` under the
 * other alone, `one-sided` is judged by one of them alone and meets it.
 */
export const trialChangeSchema = z.enum([
  'worse',
  'better',
  'finding',
  'figures',
  'one-sided',
  'same',
]);
export type TrialChange = z.infer<typeof trialChangeSchema>;

export const trialRowSchema = z.object({
  receptor: z.string(),
  label: z.string(),
  class: z.string(),
  clause: z.string(),
  clauseTitle: z.string(),
  change: trialChangeSchema,
  /** Null where that rule does not judge the receptor by this clause. */
  inForce: trialFindingSchema.nullable(),
  draft: trialFindingSchema.nullable(),
});
export type TrialRow = z.infer<typeof trialRowSchema>;

const trialClauseSideSchema = z.object({
  finding: z.enum(['met', 'not-met', 'no-receptor']),
  judged: z.int(),
  notMet: z.int(),
});
export type TrialClauseSide = z.infer<typeof trialClauseSideSchema>;

const trialOutcomeSchema = z.object({
  title: z.string(),
  version: z.int(),
  met: z.boolean(),
  lossIndex: z.number(),
});

export const ruleTrialSchema = z.object({
  study: z.uuid(),
  caseReference: z.string(),
  revision: z.int(),
  year: z.int(),
  inForce: trialOutcomeSchema,
  draft: trialOutcomeSchema,
  clauses: z.array(
    z.object({
      clause: z.string(),
      title: z.string(),
      inForce: trialClauseSideSchema.nullable(),
      draft: trialClauseSideSchema.nullable(),
    }),
  ),
  rows: z.array(trialRowSchema),
});
export type RuleTrial = z.infer<typeof ruleTrialSchema>;

/** One line of the answer: how far it is, or how it ended. Closing the connection ends the trial. */
export const trialLineSchema = z.union([
  z.object({ progress: z.object({ done: z.int(), total: z.int() }) }),
  z.object({ result: ruleTrialSchema }),
  z.object({ problem: problemSchema }),
]);
export type TrialLine = z.infer<typeof trialLineSchema>;
