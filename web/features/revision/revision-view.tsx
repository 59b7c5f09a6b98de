import { Link } from 'react-router';
import type { Person } from '../../../schemas/api.ts';
import { notify } from '../../lib/notices.ts';
import { wordsOf } from '../../lib/problem.ts';
import { Bone } from '../../ui/skeleton.tsx';
import { useDownloadBundle } from './api/get-bundle.ts';
import { useRevision } from './api/get-revision.ts';
import { FilesPanel } from './files-panel.tsx';
import { RecordPanel } from './record-panel.tsx';
import { ReportPanel } from './report-panel.tsx';
import type { RevisionRef } from './revision-ref.ts';
import { Strip, StripSkeleton } from './strip.tsx';

export type Tab = 'report' | 'files' | 'record';

const TABS: readonly { readonly tab: Tab; readonly word: string }[] = [
  { tab: 'report', word: 'Report' },
  { tab: 'files', word: 'Files' },
  { tab: 'record', word: 'Record' },
];

interface RevisionViewProps {
  readonly reference: RevisionRef;
  readonly me: Person;
  readonly studyTitle: string;
  /** What the address asks for. */
  readonly tab: Tab;
  readonly file: string | null;
  readonly onFile: (file: string) => void;
}

/** A revision: the strip, and below it its report with the margin, its files, or its record. */
export function RevisionView({ reference, me, studyTitle, tab, file, onFile }: RevisionViewProps) {
  const detail = useRevision(reference);
  return (
    <>
      <Strip reference={reference} detail={detail} isHeading={tab !== 'report'} />
      <div className={`revision-grid ${tab === 'report' ? '' : 'revision-grid-plain'}`}>
        <Tabs reference={reference} tab={tab} />
        {tab === 'report' && <ReportPanel reference={reference} detail={detail} me={me} studyTitle={studyTitle} />}
        {tab === 'files' && <FilesPanel reference={reference} files={detail.files} file={file} onFile={onFile} />}
        {tab === 'record' && <RecordPanel detail={detail} />}
      </div>
    </>
  );
}

function Tabs({ reference, tab }: { readonly reference: RevisionRef; readonly tab: Tab }) {
  const bundle = useDownloadBundle(reference);
  return (
    <nav aria-label="Views of the revision" className="tabs print:hidden">
      {TABS.map((choice) => (
        <Link
          key={choice.tab}
          to={choice.tab === 'report' ? '?' : `?view=${choice.tab}`}
          aria-current={choice.tab === tab ? 'page' : undefined}
          className={`border-b-2 pb-0.5 ${choice.tab === tab ? 'border-copper font-semibold' : 'border-transparent text-pencil hover:text-ink'}`}
        >
          {choice.word}
        </Link>
      ))}
      <button
        type="button"
        className="cursor-pointer border-b-2 border-transparent pb-0.5 text-pencil hover:text-ink disabled:opacity-60"
        disabled={bundle.isPending}
        onClick={() => bundle.mutate(undefined, { onError: (error) => notify('error', wordsOf(error)) })}
      >
        Bundle <span aria-hidden="true">↓</span>
        <span className="sr-only">download</span>
      </button>
    </nav>
  );
}

export function RevisionSkeleton() {
  return (
    <div role="status" aria-label="Loading the revision">
      <StripSkeleton />
      <div className="revision-grid">
        <div className="tabs">
          <Bone className="h-4 w-40" />
        </div>
        <div className="contents-column hidden wide:block">
          {Array.from({ length: 6 }, (_, index) => (
            <Bone key={index} className="mb-5 h-4 w-full" />
          ))}
        </div>
        <div className="report-column">
          <div className="border border-rule bg-sheet px-8 py-8">
            <Bone className="h-7 w-4/5" />
            <Bone className="mt-8 h-16 w-full" />
            {Array.from({ length: 9 }, (_, index) => (
              <Bone key={index} className="mt-5 h-4 w-full" />
            ))}
          </div>
        </div>
      </div>
    </div>
  );
}
