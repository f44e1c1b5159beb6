import { queryOptions, useQuery } from '@tanstack/react-query';
import { receptorDetailSchema } from '../../../../shared/contracts/studies.ts';
import { callApi } from '../../../lib/api-client.ts';

export function getReceptorQueryOptions(studyId: string, receptor: string) {
  return queryOptions({
    queryKey: ['studies', studyId, 'receptors', receptor],
    queryFn: ({ signal }) =>
      callApi(
        receptorDetailSchema,
        `/studies/${studyId}/receptors/${encodeURIComponent(receptor)}`,
        { signal },
      ),
    // A finished study never changes.
    staleTime: Infinity,
  });
}

export function useReceptor(studyId: string | null, receptor: string | null) {
  return useQuery({
    ...getReceptorQueryOptions(studyId ?? '', receptor ?? ''),
    enabled: studyId !== null && receptor !== null,
  });
}
