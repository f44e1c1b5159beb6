import { useMutation, useQueryClient } from '@tanstack/react-query';
import { massingDetailSchema } from '../../../../shared/contracts/massings.ts';
import { callApi } from '../../../lib/api-client.ts';

/** Sends a massing file as the next revision of a case; the server reads and checks it again. */
export function useCreateMassing(reference: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ file, idempotencyKey }: { file: File; idempotencyKey: string }) => {
      const form = new FormData();
      form.set('file', file);
      return callApi(massingDetailSchema, `/cases/${reference}/massings`, {
        method: 'POST',
        body: form,
        idempotencyKey,
      });
    },
    onSuccess: () => client.invalidateQueries({ queryKey: ['cases', reference] }),
  });
}
