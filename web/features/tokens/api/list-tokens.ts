import { queryOptions, useSuspenseQuery } from '@tanstack/react-query';
import type { AccessToken } from '../../../../schemas/api.ts';
import { api, getJson } from '../../../lib/api-client.ts';

export function tokenListOptions() {
  return queryOptions({
    queryKey: ['tokens', 'list'],
    queryFn: ({ signal }) => getJson<readonly AccessToken[]>(api`/tokens`, signal),
  });
}

export function useTokens(): readonly AccessToken[] {
  return useSuspenseQuery(tokenListOptions()).data;
}
