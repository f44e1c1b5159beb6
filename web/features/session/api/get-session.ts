import { queryOptions, useQuery } from '@tanstack/react-query';
import { sessionSchema } from '../../../../shared/contracts/people.ts';
import { callApi } from '../../../lib/api-client.ts';

export function getSessionQueryOptions() {
  return queryOptions({
    queryKey: ['session'],
    queryFn: ({ signal }) => callApi(sessionSchema, '/session', { signal }),
    staleTime: 5 * 60_000,
  });
}

export function useSession() {
  return useQuery(getSessionQueryOptions());
}
