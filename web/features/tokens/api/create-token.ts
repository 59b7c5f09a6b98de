import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { CreatedToken, NewToken } from '../../../../schemas/api.ts';
import { api, sendJson } from '../../../lib/api-client.ts';
import { tokenListOptions } from './list-tokens.ts';

export function useCreateToken() {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: (body: NewToken) => sendJson<CreatedToken>('POST', api`/tokens`, body),
    onSuccess: () => queryClient.invalidateQueries(tokenListOptions()),
  });
}
