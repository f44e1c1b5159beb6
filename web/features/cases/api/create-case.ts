import { useMutation, useQueryClient } from '@tanstack/react-query';
import { caseDetailSchema, type CreateCaseInput } from '../../../../shared/contracts/cases.ts';
import { callApi } from '../../../lib/api-client.ts';
import { getCaseQueryOptions } from './get-case.ts';

export function useCreateCase() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (input: CreateCaseInput) =>
      callApi(caseDetailSchema, '/cases', { method: 'POST', body: input }),
    onSuccess: async (created) => {
      client.setQueryData(getCaseQueryOptions(created.reference).queryKey, created);
      await client.invalidateQueries({ queryKey: ['cases', 'list'] });
    },
  });
}
