import { keepPreviousData, queryOptions, useQuery } from '@tanstack/react-query';
import { findingPageSchema, type ListFindingsQuery } from '../../../../shared/contracts/studies.ts';
import { callApi } from '../../../lib/api-client.ts';

export interface ListFindingsFilter {
  q?: string;
  sort?: string;
  finding?: ListFindingsQuery['finding'];
  clause?: ListFindingsQuery['clause'];
  class?: ListFindingsQuery['class'];
  page?: number;
  pageSize?: number;
}

export function listFindingsQueryOptions(studyId: string, filter: ListFindingsFilter) {
  return queryOptions({
    queryKey: ['studies', studyId, 'receptors', filter],
    queryFn: ({ signal }) =>
      callApi(findingPageSchema, `/studies/${studyId}/receptors`, { query: { ...filter }, signal }),
    placeholderData: keepPreviousData,
  });
}

export function useFindings(
  studyId: string | null,
  filter: ListFindingsFilter,
  options: { enabled?: boolean } = {},
) {
  const { enabled = true } = options;
  return useQuery({
    ...listFindingsQueryOptions(studyId ?? '', filter),
    enabled: studyId !== null && enabled,
  });
}
