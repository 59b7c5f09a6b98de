import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api, sendOnly } from '../../../lib/api-client.ts';
import { tokenListOptions } from './list-tokens.ts';

export function useRevokeToken() {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: (id: string) => sendOnly('DELETE', api`/tokens/${id}`),
    onSuccess: () => queryClient.invalidateQueries(tokenListOptions()),
  });
}
