import { keepPreviousData, queryOptions, useQuery } from '@tanstack/react-query';
import { casePageSchema, type ListCasesQuery } from '../../../../shared/contracts/cases.ts';
import { callApi } from '../../../lib/api-client.ts';

export interface ListCasesFilter {
  q?: string;
  view?: ListCasesQuery['view'];
  state?: ListCasesQuery['state'];
  sort?: string;
  page?: number;
  pageSize?: number;
}

export function listCasesQueryOptions(filter: ListCasesFilter) {
  return queryOptions({
    queryKey: ['cases', 'list', filter],
    queryFn: ({ signal }) => callApi(casePageSchema, '/cases', { query: { ...filter }, signal }),
    placeholderData: keepPreviousData,
  });
}

export function useCases(filter: ListCasesFilter) {
  return useQuery(listCasesQueryOptions(filter));
}
