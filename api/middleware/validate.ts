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

interface InputError {
  path: string;
  message: string;
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
  if (listUnstorableTexts(params?.data).length > 0) throw new AppError('NOT_FOUND');
  const issues = [...(query?.error?.issues ?? []), ...(body?.error?.issues ?? [])];
  const errors = [
    ...issues.flatMap(describeIssue),
    ...[query?.data, body?.data].flatMap((data) => listUnstorableTexts(data)),
  ];
  if (errors.length > 0) throw new AppError('INPUT_INVALID', { errors });
  return { params: params?.data, query: query?.data, body: body?.data };
}

function describeIssue(issue: z.core.$ZodIssue): InputError[] {
  // An unknown member is named by its own path, not by that of the object around it.
  if (issue.code === 'unrecognized_keys') {
    return issue.keys.map((key) => ({
      path: [...issue.path, key].join('.'),
      message: 'This field is not known here.',
    }));
  }
  return [{ path: issue.path.join('.'), message: issue.message }];
}

/** Whether PostgreSQL keeps this text: not one with a zero character or half a surrogate pair. */
export function isStorableText(text: string): boolean {
  return !/\0|\p{Surrogate}/u.test(text);
}

function listUnstorableTexts(value: unknown, path: readonly string[] = []): InputError[] {
  if (typeof value === 'string') {
    return isStorableText(value)
      ? []
      : [{ path: path.join('.'), message: 'This text has a character that cannot be kept.' }];
  }
  if (typeof value !== 'object' || value === null) return [];
  return Object.entries(value).flatMap(([key, one]) => listUnstorableTexts(one, [...path, key]));
}
