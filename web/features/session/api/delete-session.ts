import { useMutation, useQueryClient } from '@tanstack/react-query';
import { callApiForNothing } from '../../../lib/api-client.ts';
import { getSessionQueryOptions } from './get-session.ts';

/** Signs out; what only a signed-in person may see is forgotten. */
export function useDeleteSession() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => callApiForNothing('/session', { method: 'DELETE' }),
    onSuccess: () => {
      client.setQueryData(getSessionQueryOptions().queryKey, { person: null });
      client.removeQueries({
        predicate: ({ queryKey }) => queryKey[0] !== 'session' && queryKey[0] !== 'municipality',
      });
    },
  });
}
