import { queryOptions, useQuery } from '@tanstack/react-query';
import { massingComparisonSchema } from '../../../../shared/contracts/massings.ts';
import { callApi } from '../../../lib/api-client.ts';

export function compareMassingsQueryOptions(reference: string, from: number, to: number) {
  return queryOptions({
    queryKey: ['cases', reference, 'massings', 'comparison', from, to],
    queryFn: ({ signal }) =>
      callApi(massingComparisonSchema, `/cases/${reference}/massings/comparison`, {
        query: { from, to },
        signal,
      }),
    staleTime: Infinity,
  });
}

export function useMassingComparison(reference: string, from: number, to: number) {
  return useQuery(compareMassingsQueryOptions(reference, from, to));
}
