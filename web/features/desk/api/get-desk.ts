import { queryOptions, useSuspenseQuery } from '@tanstack/react-query';
import type { Desk } from '../../../../schemas/api.ts';
import { api, getJson } from '../../../lib/api-client.ts';

export function deskOptions() {
  return queryOptions({
    queryKey: ['desk'],
    queryFn: ({ signal }) => getJson<Desk>(api`/desk`, signal),
  });
}

export function useDesk(): Desk {
  return useSuspenseQuery(deskOptions()).data;
}
