import { queryOptions, useQuery } from '@tanstack/react-query';
import { studyDetailSchema } from '../../../../shared/contracts/studies.ts';
import { callApi } from '../../../lib/api-client.ts';

export function getStudyQueryOptions(id: string) {
  return queryOptions({
    queryKey: ['studies', id],
    queryFn: ({ signal }) => callApi(studyDetailSchema, `/studies/${id}`, { signal }),
  });
}

export function useStudy(id: string | null) {
  return useQuery({ ...getStudyQueryOptions(id ?? ''), enabled: id !== null });
}
