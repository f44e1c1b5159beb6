import { useMutation, useQueryClient } from '@tanstack/react-query';
import { sessionSchema, type SignInInput } from '../../../../shared/contracts/people.ts';
import { callApi } from '../../../lib/api-client.ts';
import { getSessionQueryOptions } from './get-session.ts';

/** Signs in; everything that was loaded for somebody else is forgotten. */
export function useCreateSession() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (input: SignInInput) =>
      callApi(sessionSchema, '/session', { method: 'POST', body: input }),
    onSuccess: (session) => {
      const { queryKey } = getSessionQueryOptions();
      client.removeQueries({ predicate: (query) => query.queryKey[0] === 'cases' });
      client.setQueryData(queryKey, session);
    },
  });
}
