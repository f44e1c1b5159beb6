import { queryOptions, useQuery } from '@tanstack/react-query';
import { studyListSchema } from '../../../../shared/contracts/studies.ts';
import { callApi } from '../../../lib/api-client.ts';

export function listStudiesQueryOptions(reference: string) {
  return queryOptions({
    queryKey: ['cases', reference, 'studies'],
    queryFn: ({ signal }) => callApi(studyListSchema, `/cases/${reference}/studies`, { signal }),
  });
}

export function useStudies(reference: string) {
  return useQuery(listStudiesQueryOptions(reference));
}
