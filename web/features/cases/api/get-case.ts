import { queryOptions, useQuery } from '@tanstack/react-query';
import { caseDetailSchema } from '../../../../shared/contracts/cases.ts';
import { callApi } from '../../../lib/api-client.ts';

/** Everything of one case lies under this key, so that one invalidation reaches it. */
export function getCaseQueryOptions(reference: string) {
  return queryOptions({
    queryKey: ['cases', reference],
    queryFn: ({ signal }) => callApi(caseDetailSchema, `/cases/${reference}`, { signal }),
  });
}

export function useCase(reference: string) {
  return useQuery(getCaseQueryOptions(reference));
}
