import { queryOptions, useQuery } from '@tanstack/react-query';
import { massingListSchema } from '../../../../shared/contracts/massings.ts';
import { callApi } from '../../../lib/api-client.ts';

export function listMassingsQueryOptions(reference: string) {
  return queryOptions({
    queryKey: ['cases', reference, 'massings'],
    queryFn: ({ signal }) => callApi(massingListSchema, `/cases/${reference}/massings`, { signal }),
  });
}

export function useMassings(reference: string) {
  return useQuery(listMassingsQueryOptions(reference));
}
