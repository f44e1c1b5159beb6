import { useMutation, useQueryClient } from '@tanstack/react-query';
import { caseDetailSchema, type UpdateCaseInput } from '../../../../shared/contracts/cases.ts';
import { callApi } from '../../../lib/api-client.ts';
import { getCaseQueryOptions } from './get-case.ts';

export function useUpdateCase(reference: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (input: UpdateCaseInput) =>
      callApi(caseDetailSchema, `/cases/${reference}`, { method: 'PATCH', body: input }),
    onSuccess: (updated) => client.setQueryData(getCaseQueryOptions(reference).queryKey, updated),
  });
}
