import { useMutation, useQueryClient } from '@tanstack/react-query';
import { sessionSchema, type AcceptInvitationInput } from '../../../../shared/contracts/people.ts';
import { callApi } from '../../../lib/api-client.ts';
import { getSessionQueryOptions } from './get-session.ts';

/** Sets name and password by a one-time link, and signs in. */
export function useAcceptInvitation() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (input: AcceptInvitationInput) =>
      callApi(sessionSchema, '/invitations/accept', { method: 'POST', body: input }),
    onSuccess: (session) => client.setQueryData(getSessionQueryOptions().queryKey, session),
  });
}
