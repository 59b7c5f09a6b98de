import type { QueryClient } from '@tanstack/react-query';
import { redirect } from 'react-router';
import type { Session } from '../../schemas/api.ts';
import { sessionOptions } from '../features/session/api/get-session.ts';
import { paths } from './paths.ts';

/** The session, or on to the sign-in page and back. */
export async function requireSession(queryClient: QueryClient, request: Request): Promise<Session> {
  const session = await queryClient.query({ ...sessionOptions(), staleTime: 'static' });
  if (session.person !== null) return session;
  const { pathname, search } = new URL(request.url);
  // eslint-disable-next-line @typescript-eslint/only-throw-error -- react-router takes a thrown Response as a redirect
  throw redirect(paths.signIn.href(pathname + search));
}

/** Lets a query run while the page is still being made ready. Its failure is told by the panel that reads it. */
export function begin(query: Promise<unknown>): void {
  query.catch(() => undefined);
}
