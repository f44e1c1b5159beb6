import express from 'express';
import type { RequestHandler } from 'express';
import { z } from 'zod';
import { AppError } from '../errors.ts';

/** What the parser says of a body; it leaves the type out where unpacking has failed. */
const parserErrorSchema = z.object({ status: z.number().max(499), type: z.string().optional() });

/** Reads a body of JSON. Passes on UPLOAD_TOO_LARGE above the limit, INPUT_INVALID where it cannot be read. */
export function jsonBody(limit: string): RequestHandler {
  const parse: RequestHandler = express.json({ limit });
  return (request, response, next) => {
    parse(request, response, (error?: unknown) => {
      const refusal = parserErrorSchema.safeParse(error);
      if (!refusal.success) next(error);
      else if (refusal.data.type === 'entity.too.large') {
        next(new AppError('UPLOAD_TOO_LARGE', { title: 'What was sent is too large.' }));
      } else {
        const errors = [{ path: '', message: 'The body is not readable JSON.' }];
        next(new AppError('INPUT_INVALID', { errors }));
      }
    });
  };
}
