import { z } from 'zod';

/** Every error code of the API with the HTTP status that goes with it. */
export const errorStatuses = {
  INPUT_INVALID: 422,
  NOT_SIGNED_IN: 401,
  SIGN_IN_FAILED: 401,
  FORBIDDEN: 403,
  ORIGIN_FOREIGN: 403,
  NOT_FOUND: 404,
  CASE_TRANSITION_REFUSED: 409,
  CASE_CHANGED_MEANWHILE: 409,
  MASSING_UNREADABLE: 422,
  MASSING_UNSOUND: 409,
  MASSING_MISSING: 409,
  RULE_MISSING: 409,
  RULE_IS_KEPT: 409,
  RULE_CHANGED_MEANWHILE: 409,
  STUDY_RUNNING: 409,
  STUDY_MISSING: 409,
  STUDY_NOT_FINISHED: 409,
  INSTANT_INVALID: 422,
  UPLOAD_TOO_LARGE: 413,
  RATE_LIMITED: 429,
  IDEMPOTENCY_KEY_REUSED: 409,
  MUNICIPALITY_SET_UP: 409,
  UNAVAILABLE: 503,
  INTERNAL: 500,
} as const;

export type ErrorCode = keyof typeof errorStatuses;

export const errorCodeSchema = z.enum(Object.keys(errorStatuses) as [ErrorCode, ...ErrorCode[]]);

/** Problem details of RFC 9457; `title` is a sentence that a person can act on. */
export const problemSchema = z.object({
  type: z.string().default('about:blank'),
  title: z.string(),
  status: z.int(),
  code: errorCodeSchema,
  detail: z.string().optional(),
  /** For bad input: the path into the body or query, and what was expected. */
  errors: z.array(z.object({ path: z.string(), message: z.string() })).optional(),
  /** The id under which the server logged the request. */
  requestId: z.string().optional(),
});
export type Problem = z.infer<typeof problemSchema>;
