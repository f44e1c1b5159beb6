import { queryOptions, useQuery } from '@tanstack/react-query';
import { receptorDetailSchema } from '../../../../shared/contracts/studies.ts';
import { callApi } from '../../../lib/api-client.ts';
import { createTurns } from '../../../lib/take-turns.ts';

/** A ledger costs the server work; a table of them shall not keep the map's shadows waiting. */
const takeTurn = createTurns(2);

export function getReceptorQueryOptions(studyId: string, receptor: string) {
  return queryOptions({
    queryKey: ['studies', studyId, 'receptors', receptor],
    queryFn: ({ signal }) =>
      takeTurn(() =>
        callApi(
          receptorDetailSchema,
          `/studies/${studyId}/receptors/${encodeURIComponent(receptor)}`,
          { signal },
        ),
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
