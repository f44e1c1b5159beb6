import type { EntityManager, FilterQuery } from '@mikro-orm/postgresql';
import type { z } from 'zod';
import type { CommentPage, listCommentsQuerySchema } from '../../../shared/contracts/comments.ts';
import { containsPattern, parseSort, toWindow } from '../../paging.ts';
import { mayOnCase } from '../../policy.ts';
import type { Actor } from '../../policy.ts';
import { caseFacts, getCase } from '../cases/get-case.ts';
import { Comment } from './comment.entity.ts';
import { presentComment } from './comment.presenter.ts';

/** The comments on a case: the published ones for everybody, all of them for staff. */
export async function listComments(
  em: EntityManager,
  actor: Actor | null,
  reference: string,
  query: z.output<typeof listCommentsQuerySchema>,
): Promise<CommentPage> {
  const reviewCase = await getCase(em, actor, reference);
  const isStaff = mayOnCase(actor, 'read-every-comment', caseFacts(reviewCase));
  const { field, direction } = parseSort(query.sort, ['receivedAt', 'authorName'], {
    field: 'receivedAt',
    direction: 'desc',
  });
  const conditions: FilterQuery<Comment>[] = [{ reviewCase: reviewCase.id }];
  if (!isStaff) conditions.push({ state: 'published' });
  if (query.state !== undefined) conditions.push({ state: query.state });
  if (query.q !== undefined && query.q !== '') {
    const pattern = containsPattern(query.q);
    conditions.push({ $or: [{ body: { $ilike: pattern } }, { authorName: { $ilike: pattern } }] });
  }
  const [comments, total] = await em.findAndCount(
    Comment,
    { $and: conditions },
    {
      orderBy: [{ [field]: direction }, { id: 'asc' }],
      ...toWindow(query),
    },
  );
  return {
    rows: comments.map((comment) => presentComment(comment, isStaff)),
    page: query.page,
    pageSize: query.pageSize,
    total,
  };
}
