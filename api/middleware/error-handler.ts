import type { ErrorRequestHandler, RequestHandler } from 'express';
import { z } from 'zod';
import { AppError } from '../errors.ts';
import { requestIdOf } from './request-log.ts';

/** Answers every error with problem details; what was not expected is logged and its text kept back. */
export const errorHandler: ErrorRequestHandler = (error: unknown, request, response, next) => {
  if (response.headersSent) {
    request.log.error({ err: error }, 'failed after the answer had begun');
    next(error);
    return;
  }
  const known = toAppError(error);
  if (known === null) request.log.error({ err: error }, 'unexpected error');
  const { problem } = known ?? new AppError('INTERNAL');
  response
    .status(problem.status)
    // What is refused today may be there tomorrow, or for somebody else.
    .set('Cache-Control', 'no-store')
    .type('application/problem+json')
    .send(JSON.stringify({ ...problem, requestId: requestIdOf(request) }));
};

/** For a path that no endpoint has, or not with this method. */
export const notFoundHandler: RequestHandler = () => {
  throw new AppError('NOT_FOUND');
};

/** What the file server says of a file that is not there or that nobody may ask for. */
const refusedFileSchema = z.object({ status: z.number().min(400).max(499) });

function toAppError(error: unknown): AppError | null {
  if (error instanceof AppError) return error;
  // The second: a path with a broken percent sign.
  if (refusedFileSchema.safeParse(error).success || error instanceof URIError) {
    return new AppError('NOT_FOUND');
  }
  return null;
}
