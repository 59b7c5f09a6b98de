import { queryOptions, useSuspenseQuery } from '@tanstack/react-query';
import type { Session } from '../../../../schemas/api.ts';
import { api, getJson, setCsrfToken } from '../../../lib/api-client.ts';

async function getSession(signal: AbortSignal): Promise<Session> {
  const session = await getJson<Session>(api`/session`, signal);
  setCsrfToken(session.csrf);
  return session;
}

export function sessionOptions() {
  return queryOptions({
    queryKey: ['session'],
    queryFn: ({ signal }) => getSession(signal),
    staleTime: 60_000,
  });
}

export function useSession(): Session {
  return useSuspenseQuery(sessionOptions()).data;
}
