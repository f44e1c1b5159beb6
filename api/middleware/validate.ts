import type { Request } from 'express';
import type { z } from 'zod';
import { AppError } from '../errors.ts';

interface RequestSchemas {
  params?: z.ZodType;
  query?: z.ZodType;
  body?: z.ZodType;
}

interface CheckedInput {
  params: unknown;
  query: unknown;
  body: unknown;
}

/**
 * The input of a request, checked and converted. Throws INPUT_INVALID with every issue of query and
 * body, or NOT_FOUND where the path itself can name nothing.
 */
export function validate(schemas: RequestSchemas, request: Request): CheckedInput {
  const params = schemas.params?.safeParse(request.params);
  if (params?.success === false) throw new AppError('NOT_FOUND');
  const query = schemas.query?.safeParse(request.query);
  // Express leaves the body undefined when none was sent; a schema then names what is missing.
  const body = schemas.body?.safeParse(request.body ?? {});
  const issues = [...(query?.error?.issues ?? []), ...(body?.error?.issues ?? [])];
  if (issues.length > 0) {
    throw new AppError('INPUT_INVALID', {
      errors: issues.flatMap(describeIssue),
    });
  }
  return { params: params?.data, query: query?.data, body: body?.data };
}

function describeIssue(issue: z.core.$ZodIssue): { path: string; message: string }[] {
  // An unknown member is named by its own path, not by that of the object around it.
  if (issue.code === 'unrecognized_keys') {
    return issue.keys.map((key) => ({
      path: [...issue.path, key].join('.'),
      message: 'This field is not known here.',
    }));
  }
  return [{ path: issue.path.join('.'), message: issue.message }];
}
