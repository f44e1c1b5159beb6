import { queryOptions, useQuery } from '@tanstack/react-query';
import { reportListSchema } from '../../../../shared/contracts/reports.ts';
import { callApi } from '../../../lib/api-client.ts';

export function listReportsQueryOptions(reference: string) {
  return queryOptions({
    queryKey: ['cases', reference, 'reports'],
    queryFn: ({ signal }) => callApi(reportListSchema, `/cases/${reference}/reports`, { signal }),
  });
}

export function useReports(reference: string) {
  return useQuery(listReportsQueryOptions(reference));
}
