import { z } from 'zod';

export const roles = ['applicant', 'planner', 'board', 'administrator'] as const;
export const roleSchema = z.enum(roles);
export type Role = z.infer<typeof roleSchema>;

export const emailSchema = z
  .email('Write an e-mail address, for example name@town.example.')
  .max(254);

export const signInInputSchema = z.strictObject({
  email: emailSchema,
  password: z.string().min(1, 'Write your password.').max(200),
});
export type SignInInput = z.infer<typeof signInInputSchema>;

/** Setting the first administrator's password by the one-time link. */
export const acceptInvitationInputSchema = z.strictObject({
  token: z.string().min(20).max(200),
  email: emailSchema,
  name: z.string().trim().min(1, 'Write your name.').max(120),
  password: z.string().min(12, 'Use at least 12 characters.').max(200),
});
export type AcceptInvitationInput = z.infer<typeof acceptInvitationInputSchema>;

export const personSchema = z.object({
  id: z.uuid(),
  name: z.string(),
  email: z.string(),
  role: roleSchema,
});
export type Person = z.infer<typeof personSchema>;

/** Who is signed in, and the place that this server serves. */
export const sessionSchema = z.object({
  person: personSchema.nullable(),
});
export type Session = z.infer<typeof sessionSchema>;
