import { MutationCache, QueryCache, QueryClient } from '@tanstack/react-query';
import type { Session } from '../../schemas/api.ts';
import { sessionOptions } from '../features/session/api/get-session.ts';
import { ApiProblem } from '../lib/problem.ts';

/** Network trouble is worth another try; an answer of the server is an answer. */
function retry(failures: number, error: Error): boolean {
  return failures < 2 && error instanceof ApiProblem && (error.status === 0 || error.status >= 502);
}

export function makeQueryClient(): QueryClient {
  const onError = (error: Error) => {
    if (error instanceof ApiProblem && error.code === 'not-signed-in') forgetPerson(queryClient);
  };
  const queryClient: QueryClient = new QueryClient({
    queryCache: new QueryCache({ onError }),
    mutationCache: new MutationCache({ onError }),
    defaultOptions: { queries: { staleTime: 15_000, retry } },
  });
  return queryClient;
}

/** The session has ended on the server: the page learns it from whichever request is refused first, and asks to sign in. */
function forgetPerson(queryClient: QueryClient): void {
  queryClient.setQueryData(
    sessionOptions().queryKey,
    (session): Session | undefined => session && { ...session, person: null },
  );
}
