import { useQuery } from '@tanstack/react-query';
import { Link, Navigate, useNavigate, useSearchParams } from 'react-router';
import { sessionOptions } from '../../features/session/api/get-session.ts';
import { SignInForm } from '../../features/session/sign-in-form.tsx';
import { PageTitle } from '../../ui/heading.tsx';
import { paths, safeNext } from '../paths.ts';
import { Shell } from '../shell.tsx';

export function SignInRoute() {
  const [search] = useSearchParams();
  const navigate = useNavigate();
  const session = useQuery(sessionOptions());
  const next = safeNext(search.get('next'));
  if (session.data !== undefined && session.data.person !== null) return <Navigate to={next} replace />;
  return (
    <Shell title="Sign in" width="narrow">
      <PageTitle below="Calculations, checked and signed.">Sign in</PageTitle>
      <SignInForm onSignedIn={() => void navigate(next, { replace: true })} />
      <p className="mt-8 border-t border-rule pt-4 text-pencil">
        Holding a bundle?{' '}
        <Link to={paths.verify.href()} className="text-copper underline underline-offset-2">
          Verify it
        </Link>{' '}
        without signing in.
      </p>
    </Shell>
  );
}
