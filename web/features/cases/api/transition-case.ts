import { useMutation, useQueryClient } from '@tanstack/react-query';
import { caseDetailSchema, type TransitionInput } from '../../../../shared/contracts/cases.ts';
import { callApi } from '../../../lib/api-client.ts';
import { getCaseQueryOptions } from './get-case.ts';

/** Moves a case to another state; a draft gets its number and keeps answering to its key. */
export function useTransitionCase(reference: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (input: TransitionInput) =>
      callApi(caseDetailSchema, `/cases/${reference}/transitions`, { method: 'POST', body: input }),
    onSuccess: async (updated) => {
      client.setQueryData(getCaseQueryOptions(updated.reference).queryKey, updated);
      await client.invalidateQueries({ queryKey: ['cases'] });
    },
  });
}
