import { useMutation } from '@tanstack/react-query';
import { api, sendOnly } from '../../../lib/api-client.ts';

export function useSignOut() {
  return useMutation({
    mutationFn: () => sendOnly('DELETE', api`/session`),
    // A fresh page holds nothing of the person who has left.
    onSuccess: () => window.location.assign('/sign-in'),
  });
}
