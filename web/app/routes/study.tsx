import { useQuery } from '@tanstack/react-query';
import { useParams } from 'react-router';
import { studyOptions } from '../../features/studies/api/get-study.ts';
import { StudySkeleton, StudyView } from '../../features/studies/study-view.tsx';
import { Panel } from '../../ui/panel.tsx';
import { renderMissing } from '../missing.tsx';
import { Shell } from '../shell.tsx';
import { SignedIn } from '../signed-in.tsx';

export function StudyRoute() {
  const { study = '' } = useParams();
  const title = useQuery(studyOptions(study)).data?.title ?? study;
  return (
    <Shell title={title} crumbs={[{ label: title }]}>
      <SignedIn>
        {() => (
          <Panel key={study} fallback={<StudySkeleton />} renderError={renderMissing}>
            <StudyView study={study} />
          </Panel>
        )}
      </SignedIn>
    </Shell>
  );
}
