import { Navigate, useParams } from 'react-router';
import { useRevisionList } from '../../features/revision/api/list-revisions.ts';
import { RevisionSkeleton } from '../../features/revision/revision-view.tsx';
import { Empty } from '../../ui/empty.tsx';
import { Panel } from '../../ui/panel.tsx';
import { renderMissing } from '../missing.tsx';
import { paths } from '../paths.ts';
import { Shell } from '../shell.tsx';
import { SignedIn } from '../signed-in.tsx';

/** The address of a sheet without a revision leads to its newest. */
export function NewestRoute() {
  const { study = '', number = '' } = useParams();
  return (
    <Shell title={number} width="full" crumbs={[{ label: study, href: paths.study.href(study) }, { label: number }]}>
      <SignedIn>
        {() => (
          <Panel fallback={<RevisionSkeleton />} renderError={renderMissing}>
            <ToNewest study={study} number={number} />
          </Panel>
        )}
      </SignedIn>
    </Shell>
  );
}

function ToNewest({ study, number }: { readonly study: string; readonly number: string }) {
  const newest = useRevisionList(study, number)[0];
  if (newest === undefined) {
    return (
      <Empty title={`${number} has no revision yet`} commands={['npx antinode push FILE']}>
        Its first push becomes revision A.
      </Empty>
    );
  }
  return <Navigate to={paths.revision.href(study, number, newest.revision)} replace />;
}
