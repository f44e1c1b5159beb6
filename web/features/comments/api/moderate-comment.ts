import { useMutation, useQueryClient } from '@tanstack/react-query';
import { commentSchema, type ModerateCommentInput } from '../../../../shared/contracts/comments.ts';
import { callApi } from '../../../lib/api-client.ts';

/** Publishes a comment or withholds it with a reason. */
export function useModerateComment(reference: string, commentId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (input: ModerateCommentInput) =>
      callApi(commentSchema, `/comments/${commentId}`, { method: 'PATCH', body: input }),
    onSuccess: () => client.invalidateQueries({ queryKey: ['cases', reference, 'comments'] }),
  });
}
