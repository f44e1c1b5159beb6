import type { ListQuery } from '../shared/contracts/paging.ts';
import { AppError } from './errors.ts';

/** One sort order of a list: a field's name, and whether it descends. */
export interface SortOrder<Field extends string> {
  field: Field;
  direction: 'asc' | 'desc';
}

/** Reads `sort=field` or `sort=-field`; throws INPUT_INVALID for a field that the list cannot be sorted by. */
export function parseSort<Field extends string>(
  sort: string | undefined,
  fields: readonly Field[],
  fallback: SortOrder<Field>,
): SortOrder<Field> {
  if (sort === undefined) return fallback;
  const direction = sort.startsWith('-') ? 'desc' : 'asc';
  const name = sort.replace(/^-/, '');
  const field = fields.find((one) => one === name);
  if (field === undefined) {
    throw new AppError('INPUT_INVALID', {
      errors: [{ path: 'sort', message: `Sort by one of ${fields.join(', ')}.` }],
    });
  }
  return { field, direction };
}

/** Limit and offset of a page for the database. */
export function toWindow({ page, pageSize }: Pick<ListQuery, 'page' | 'pageSize'>): {
  limit: number;
  offset: number;
} {
  return { limit: pageSize, offset: (page - 1) * pageSize };
}

/** A text as a pattern that matches it anywhere; its own wildcards stand for themselves. */
export function containsPattern(text: string): string {
  return `%${text.replace(/[\\%_]/g, (sign) => `\\${sign}`)}%`;
}
