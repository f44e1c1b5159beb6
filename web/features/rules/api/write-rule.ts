import { useMutation, useQueryClient, type QueryClient } from '@tanstack/react-query';
import { ruleVersionSchema, type RuleVersion } from '../../../../shared/contracts/rules.ts';
import type { Rule } from '../../../../shared/rules/rule-schema.ts';
import { callApi, callApiForNothing } from '../../../lib/api-client.ts';
import { getRuleQueryOptions } from './get-rule.ts';

async function keep(client: QueryClient, version: RuleVersion): Promise<void> {
  client.setQueryData(getRuleQueryOptions(version.id).queryKey, version);
  await client.invalidateQueries({ queryKey: ['rules'], exact: true });
}

/** Writes a new version as a draft. */
export function useCreateRuleDraft() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ rule, idempotencyKey }: { rule: Rule; idempotencyKey: string }) =>
      callApi(ruleVersionSchema, '/rules', {
        method: 'POST',
        body: { rule, inForceFrom: null },
        idempotencyKey,
      }),
    onSuccess: (version) => keep(client, version),
  });
}

/** Writes a draft anew. */
export function useChangeRuleDraft({ id, stamp }: Pick<RuleVersion, 'id' | 'stamp'>) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (rule: Rule) =>
      callApi(ruleVersionSchema, `/rules/${id}`, { method: 'PUT', body: { rule, seen: stamp } }),
    onSuccess: (version) => keep(client, version),
  });
}

/** Sets the day from which a version holds; null takes it back. */
export function useEnactRule({ id, stamp }: Pick<RuleVersion, 'id' | 'stamp'>) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (inForceFrom: string | null) =>
      callApi(ruleVersionSchema, `/rules/${id}/enactment`, {
        method: 'POST',
        body: { inForceFrom, seen: stamp },
      }),
    // The version that was in force may have become another.
    onSuccess: async (version) => {
      await client.invalidateQueries({ queryKey: ['rules'] });
      await keep(client, version);
    },
  });
}

/** Throws a draft away. */
export function useDiscardRuleDraft({ id, stamp }: Pick<RuleVersion, 'id' | 'stamp'>) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () =>
      callApiForNothing(`/rules/${id}?seen=${encodeURIComponent(stamp)}`, { method: 'DELETE' }),
    onSuccess: () => client.invalidateQueries({ queryKey: ['rules'], exact: true }),
  });
}
