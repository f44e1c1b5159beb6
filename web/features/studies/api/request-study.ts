import { useMutation, useQueryClient } from '@tanstack/react-query';
import { studyDetailSchema } from '../../../../shared/contracts/studies.ts';
import { callApi } from '../../../lib/api-client.ts';
import { getStudyQueryOptions } from './get-study.ts';

/** Asks for a study of the case's current massing under the rule in force. */
export function useRequestStudy(reference: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () =>
      callApi(studyDetailSchema, `/cases/${reference}/studies`, {
        method: 'POST',
        body: {},
        idempotencyKey: crypto.randomUUID(),
      }),
    onSuccess: async (study) => {
      client.setQueryData(getStudyQueryOptions(study.id).queryKey, study);
      await client.invalidateQueries({ queryKey: ['cases'] });
    },
  });
}
