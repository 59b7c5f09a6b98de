import type { ReactNode } from 'react';
import { Link } from 'react-router';
import { ApiProblem } from '../lib/problem.ts';
import { PageTitle } from '../ui/heading.tsx';
import { Failure } from '../ui/panel.tsx';
import { paths } from './paths.ts';

/** What a page shows in place of what it could not get: that there is no such thing, or what went wrong. */
export function renderMissing(error: unknown, retry: () => void): ReactNode {
  const isMissing = error instanceof ApiProblem && (error.status === 404 || error.status === 403);
  return (
    <div className="mx-auto max-w-[48rem] px-4 pt-12">
      {isMissing ? <NotFound detail={error.message} /> : <Failure error={error} retry={retry} />}
    </div>
  );
}

export function NotFound({ detail }: { readonly detail?: string }) {
  return (
    <>
      <PageTitle below={detail ?? 'The address leads nowhere: it may have been cut short on its way here.'}>
        Nothing here
      </PageTitle>
      <p>
        <Link to={paths.desk.href()} className="text-copper underline underline-offset-2">
          To your desk
        </Link>
        , where everything that waits on you is listed.
      </p>
    </>
  );
}
