import type { ErrorRequestHandler, RequestHandler } from 'express';
import multer from 'multer';
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
    .type('application/problem+json')
    .send(JSON.stringify({ ...problem, requestId: requestIdOf(request) }));
};

/** For a path under /api that no endpoint has. */
export const notFoundHandler: RequestHandler = () => {
  throw new AppError('NOT_FOUND');
};

const parserErrorSchema = z.object({ type: z.string(), status: z.number() });

const missingFileSchema = z.object({ status: z.literal(404) });

function toAppError(error: unknown): AppError | null {
  if (error instanceof AppError) return error;
  if (error instanceof multer.MulterError) {
    return error.code === 'LIMIT_FILE_SIZE'
      ? new AppError('UPLOAD_TOO_LARGE')
      : new AppError('INPUT_INVALID', {
          errors: [{ path: error.field ?? '', message: 'Send one file in the field named here.' }],
        });
  }
  // A file that is not there, or a path with a broken percent sign.
  if (error instanceof URIError || missingFileSchema.safeParse(error).success) {
    return new AppError('NOT_FOUND');
  }
  const parserError = parserErrorSchema.safeParse(error);
  if (parserError.success) {
    if (parserError.data.type === 'entity.too.large') return new AppError('UPLOAD_TOO_LARGE');
    if (parserError.data.status < 500) {
      return new AppError('INPUT_INVALID', {
        errors: [{ path: '', message: 'The body is not readable JSON.' }],
      });
    }
  }
  return null;
}
