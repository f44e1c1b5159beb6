import { z } from 'zod';

/** The query of every list: `?page=&pageSize=&sort=&q=`; `sort` is a field name, with `-` for descending. */
export const listQuerySchema = z.object({
  page: z.coerce.number().int().min(1).default(1),
  pageSize: z.coerce.number().int().min(1).max(500).default(50),
  sort: z.string().max(40).optional(),
  q: z.string().trim().max(200).optional(),
});
export type ListQuery = z.infer<typeof listQuerySchema>;

/** One page of a list, with the number of rows on all pages. */
export function pageSchema<Row extends z.ZodType>(row: Row) {
  return z.object({
    rows: z.array(row),
    page: z.int(),
    pageSize: z.int(),
    total: z.int(),
  });
}
