import { queryOptions, useQuery } from '@tanstack/react-query';
import { ruleVersionListSchema } from '../../../../shared/contracts/rules.ts';
import { callApi } from '../../../lib/api-client.ts';

export function listRulesQueryOptions() {
  return queryOptions({
    queryKey: ['rules'],
    queryFn: ({ signal }) => callApi(ruleVersionListSchema, '/rules', { signal }),
  });
}

export function useRules() {
  return useQuery(listRulesQueryOptions());
}
