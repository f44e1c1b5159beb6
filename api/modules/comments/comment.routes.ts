import { z } from 'zod';
import { caseReferenceSchema } from '../../../shared/contracts/cases.ts';
import {
  commentPageSchema,
  commentReceiptSchema,
  commentSchema,
  createCommentInputSchema,
  listCommentsQuerySchema,
  moderateCommentInputSchema,
} from '../../../shared/contracts/comments.ts';
import { defineEndpoint } from '../../endpoint.ts';
import { presentComment } from './comment.presenter.ts';
import { createComment } from './create-comment.ts';
import { listComments } from './list-comments.ts';
import { moderateComment } from './moderate-comment.ts';

const caseParams = z.object({ number: caseReferenceSchema });

export const commentEndpoints = [
  defineEndpoint({
    method: 'post',
    path: '/api/cases/:number/comments',
    summary: 'Takes a comment on a case that is open for comment, and gives a receipt.',
    access: 'anybody',
    params: caseParams,
    body: createCommentInputSchema,
    limit: 'comment',
    isRepeatable: true,
    status: 201,
    response: commentReceiptSchema,
    handler: async ({ em, actor, params, body }) => {
      const comment = await createComment(em, actor, params.number, body);
      return { id: comment.id, receivedAt: comment.receivedAt.toISOString() };
    },
  }),
  defineEndpoint({
    method: 'get',
    path: '/api/cases/:number/comments',
    summary: 'Lists the comments on a case: the published ones, for staff all.',
    access: 'anybody',
    params: caseParams,
    query: listCommentsQuerySchema,
    response: commentPageSchema,
    handler: ({ em, actor, params, query }) => listComments(em, actor, params.number, query),
  }),
  defineEndpoint({
    method: 'patch',
    path: '/api/comments/:id',
    summary: 'Publishes or withholds a comment.',
    access: ['planner'],
    params: z.object({ id: z.uuid() }),
    body: moderateCommentInputSchema,
    response: commentSchema,
    handler: async ({ em, actor, params, body }) =>
      presentComment(await moderateComment(em, actor, params.id, body), true),
  }),
];
