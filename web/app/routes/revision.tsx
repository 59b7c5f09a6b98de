import { useQuery } from '@tanstack/react-query';
import { useNavigate, useParams, useSearchParams } from 'react-router';
import { RevisionSwitcher } from '../../features/revision/revision-switcher.tsx';
import { RevisionSkeleton, RevisionView, type Tab } from '../../features/revision/revision-view.tsx';
import { studyOptions } from '../../features/studies/api/get-study.ts';
import { Panel } from '../../ui/panel.tsx';
import { renderMissing } from '../missing.tsx';
import { paths } from '../paths.ts';
import { Shell } from '../shell.tsx';
import { SignedIn } from '../signed-in.tsx';

export function RevisionRoute() {
  const { study = '', number = '', revision = '' } = useParams();
  const [search, setSearch] = useSearchParams();
  const navigate = useNavigate();
  const studyTitle = useQuery(studyOptions(study)).data?.title ?? study;
  const reference = { study, number, revision };
  const crumbs = [
    { label: studyTitle, href: paths.study.href(study) },
    { label: number, href: paths.sheet.href(study, number) },
    {
      label: (
        <RevisionSwitcher
          reference={reference}
          onSwitch={(other) =>
            void navigate({ pathname: paths.revision.href(study, number, other), search: search.toString() })
          }
        />
      ),
    },
  ];
  return (
    <Shell title={`${number} revision ${revision}`} width="full" crumbs={crumbs}>
      <SignedIn>
        {(me) => (
          <Panel key={`${study} ${number} ${revision}`} fallback={<RevisionSkeleton />} renderError={renderMissing}>
            <RevisionView
              reference={reference}
              me={me}
              studyTitle={studyTitle}
              tab={tabOf(search.get('view'))}
              file={search.get('file')}
              onFile={(file) => setSearch({ view: 'files', file })}
            />
          </Panel>
        )}
      </SignedIn>
    </Shell>
  );
}

function tabOf(view: string | null): Tab {
  return view === 'files' || view === 'record' ? view : 'report';
}
