import type { Request, RequestHandler } from 'express';
import { ipKeyGenerator, rateLimit } from 'express-rate-limit';
import { z } from 'zod';
import { AppError } from '../errors.ts';

const minuteMs = 60_000;

/** How many requests from one address in a stretch of time. */
export const limits = {
  /** Every write. */
  write: { windowMs: minuteMs, limit: 240 },
  /** Failed sign-ins, by address and again by account. */
  'sign-in': { windowMs: 15 * minuteMs, limit: 20 },
  /** Comments, which anybody may write. */
  comment: { windowMs: 10 * minuteMs, limit: 20 },
  /** Work that costs much: uploads and studies. */
  heavy: { windowMs: minuteMs, limit: 30 },
  /** Reading that is computed for each request: shadows of any instant, a receptor's ledger. */
  compute: { windowMs: minuteMs, limit: 300 },
} as const;
export type LimitName = keyof typeof limits;

/** Failed sign-ins for one account, from wherever they come. */
export const accountLimit = { windowMs: 15 * minuteMs, limit: 10 } as const;

export type RateLimits = Record<LimitName, RequestHandler[]>;

/** The limits of one application; each counts for itself. */
export function createRateLimits(): RateLimits {
  const byAddress = (request: Request) => ipKeyGenerator(request.ip ?? 'unknown');
  return {
    write: [createLimit(limits.write, byAddress)],
    'sign-in': [
      createLimit(limits['sign-in'], byAddress, { isFailuresOnly: true }),
      createLimit(accountLimit, accountOf, { isFailuresOnly: true }),
    ],
    comment: [createLimit(limits.comment, byAddress)],
    heavy: [createLimit(limits.heavy, byAddress)],
    compute: [createLimit(limits.compute, byAddress)],
  };
}

function createLimit(
  { windowMs, limit }: { windowMs: number; limit: number },
  keyGenerator: (request: Request) => string,
  { isFailuresOnly = false } = {},
): RequestHandler {
  return rateLimit({
    windowMs,
    limit,
    keyGenerator,
    skipSuccessfulRequests: isFailuresOnly,
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    handler: (_request, _response, next) => next(new AppError('RATE_LIMITED')),
  });
}

const accountSchema = z.object({ email: z.string() });

function accountOf(request: Request): string {
  const account = accountSchema.safeParse(request.body);
  return account.success ? account.data.email.trim().toLowerCase() : 'none';
}
