import { useMutation, useQueryClient } from '@tanstack/react-query';
import {
  commentReceiptSchema,
  type CreateCommentInput,
} from '../../../../shared/contracts/comments.ts';
import { callApi } from '../../../lib/api-client.ts';

export interface CreateCommentRequest {
  input: CreateCommentInput;
  /** The same for a repeated attempt at the same comment. */
  idempotencyKey: string;
}

export function useCreateComment(reference: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ input, idempotencyKey }: CreateCommentRequest) =>
      callApi(commentReceiptSchema, `/cases/${reference}/comments`, {
        method: 'POST',
        body: input,
        idempotencyKey,
      }),
    onSuccess: () => client.invalidateQueries({ queryKey: ['cases', reference, 'comments'] }),
  });
}
