import type { ReactNode } from 'react';
import { Navigate, useLocation } from 'react-router';
import type { Person } from '../../schemas/api.ts';
import { useSession } from '../features/session/api/get-session.ts';
import { paths } from './paths.ts';

/** Pages for people who are signed in; when the session ends while one is open, on to the sign-in page and back. */
export function SignedIn({ children }: { readonly children: (me: Person) => ReactNode }) {
  const { person } = useSession();
  const { pathname, search } = useLocation();
  if (person === null) return <Navigate to={paths.signIn.href(pathname + search)} replace />;
  return children(person);
}
