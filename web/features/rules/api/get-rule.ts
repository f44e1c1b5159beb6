import { queryOptions, useQuery } from '@tanstack/react-query';
import { ruleVersionSchema } from '../../../../shared/contracts/rules.ts';
import { callApi } from '../../../lib/api-client.ts';

export function getRuleQueryOptions(id: string) {
  return queryOptions({
    queryKey: ['rules', id],
    queryFn: ({ signal }) => callApi(ruleVersionSchema, `/rules/${id}`, { signal }),
  });
}

export function useRule(id: string) {
  return useQuery(getRuleQueryOptions(id));
}
