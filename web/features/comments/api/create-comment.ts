import { useMutation, useQueryClient } from '@tanstack/react-query';
import {
  commentReceiptSchema,
  type CreateCommentInput,
} from '../../../../shared/contracts/comments.ts';
import { callApi } from '../../../lib/api-client.ts';

export function useCreateComment(reference: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (input: CreateCommentInput) =>
      callApi(commentReceiptSchema, `/cases/${reference}/comments`, {
        method: 'POST',
        body: input,
      }),
    onSuccess: () => client.invalidateQueries({ queryKey: ['cases', reference, 'comments'] }),
  });
}
