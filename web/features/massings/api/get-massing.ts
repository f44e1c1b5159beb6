import { queryOptions, useQuery } from '@tanstack/react-query';
import { massingDetailSchema } from '../../../../shared/contracts/massings.ts';
import { callApi } from '../../../lib/api-client.ts';

export function getMassingQueryOptions(reference: string, revision: number) {
  return queryOptions({
    queryKey: ['cases', reference, 'massings', revision],
    queryFn: ({ signal }) =>
      callApi(massingDetailSchema, `/cases/${reference}/massings/${revision}`, { signal }),
    // A revision never changes.
    staleTime: Infinity,
  });
}

export function useMassing(reference: string, revision: number | null) {
  return useQuery({
    ...getMassingQueryOptions(reference, revision ?? 0),
    enabled: revision !== null,
  });
}
