import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { Session, SignIn } from '../../../../schemas/api.ts';
import { api, sendJson, setCsrfToken } from '../../../lib/api-client.ts';
import { sessionOptions } from './get-session.ts';

export function useSignIn() {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: (body: SignIn) => sendJson<Session>('POST', api`/session`, body),
    onSuccess: (session) => {
      setCsrfToken(session.csrf);
      // What another person has seen on this screen is not for this one.
      queryClient.clear();
      queryClient.setQueryData(sessionOptions().queryKey, session);
    },
  });
}
