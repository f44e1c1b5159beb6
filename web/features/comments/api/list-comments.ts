import { queryOptions, useQuery } from '@tanstack/react-query';
import { commentPageSchema, type CommentState } from '../../../../shared/contracts/comments.ts';
import { callApi } from '../../../lib/api-client.ts';

export interface ListCommentsFilter {
  state?: CommentState;
  page?: number;
  pageSize?: number;
}

export function listCommentsQueryOptions(reference: string, filter: ListCommentsFilter = {}) {
  return queryOptions({
    queryKey: ['cases', reference, 'comments', filter],
    queryFn: ({ signal }) =>
      callApi(commentPageSchema, `/cases/${reference}/comments`, { query: { ...filter }, signal }),
  });
}

export function useComments(reference: string, filter: ListCommentsFilter = {}) {
  return useQuery(listCommentsQueryOptions(reference, filter));
}
