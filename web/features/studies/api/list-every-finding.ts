import { queryOptions, useQuery } from '@tanstack/react-query';
import { findingPageSchema, type FindingRow } from '../../../../shared/contracts/studies.ts';
import { callApi } from '../../../lib/api-client.ts';

/** The longest page that the API gives. */
const pageSize = 500;

export function listEveryFindingQueryOptions(studyId: string) {
  return queryOptions({
    queryKey: ['studies', studyId, 'receptors', 'every'],
    queryFn: async ({ signal }) => {
      const rows: FindingRow[] = [];
      for (let page = 1; ; page += 1) {
        const answer = await callApi(findingPageSchema, `/studies/${studyId}/receptors`, {
          query: { page, pageSize },
          signal,
        });
        rows.push(...answer.rows);
        if (rows.length >= answer.total || answer.rows.length === 0) return rows;
      }
    },
    // A finished study never changes.
    staleTime: Infinity,
  });
}

/** Every finding of a study, for the map and the table beside it. */
export function useEveryFinding(studyId: string) {
  return useQuery(listEveryFindingQueryOptions(studyId));
}
