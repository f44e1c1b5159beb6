import { keepPreviousData, queryOptions, useQuery } from '@tanstack/react-query';
import { instantShadowsSchema } from '../../../../shared/contracts/studies.ts';
import { callApi } from '../../../lib/api-client.ts';

export function getShadowsQueryOptions(studyId: string, at: string) {
  return queryOptions({
    queryKey: ['studies', studyId, 'shadows', at],
    queryFn: ({ signal }) =>
      callApi(instantShadowsSchema, `/studies/${studyId}/shadows`, { query: { at }, signal }),
    staleTime: Infinity,
    placeholderData: keepPreviousData,
  });
}

export function useShadows(studyId: string | null, at: string | null) {
  return useQuery({
    ...getShadowsQueryOptions(studyId ?? '', at ?? ''),
    enabled: studyId !== null && at !== null,
  });
}
