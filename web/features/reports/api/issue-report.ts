import { useMutation, useQueryClient } from '@tanstack/react-query';
import { reportSchema, type IssueReportInput } from '../../../../shared/contracts/reports.ts';
import { callApi } from '../../../lib/api-client.ts';

/** Issues the next staff report of a case; once issued it never changes. */
export function useIssueReport(reference: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ input, key }: { input: IssueReportInput; key: string }) =>
      callApi(reportSchema, `/cases/${reference}/reports`, {
        method: 'POST',
        body: input,
        idempotencyKey: key,
      }),
    onSuccess: () => client.invalidateQueries({ queryKey: ['cases'] }),
  });
}
