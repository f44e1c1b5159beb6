import { queryOptions, useQuery } from '@tanstack/react-query';
import { findingsSummarySchema } from '../../../../shared/contracts/studies.ts';
import { callApi } from '../../../lib/api-client.ts';

export function getFindingsSummaryQueryOptions(studyId: string) {
  return queryOptions({
    queryKey: ['studies', studyId, 'clauses'],
    queryFn: ({ signal }) =>
      callApi(findingsSummarySchema, `/studies/${studyId}/clauses`, { signal }),
    // A finished study never changes.
    staleTime: Infinity,
  });
}

/** What a finished study says of each clause. */
export function useFindingsSummary(studyId: string) {
  return useQuery(getFindingsSummaryQueryOptions(studyId));
}
