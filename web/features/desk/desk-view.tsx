import { Link } from 'react-router';
import type { DeskItem, StudySummary } from '../../../schemas/api.ts';
import { paths } from '../../app/paths.ts';
import { count } from '../../lib/words.ts';
import { BoneRows } from '../../ui/skeleton.tsx';
import { Empty } from '../../ui/empty.tsx';
import { SectionTitle } from '../../ui/heading.tsx';
import { StateCurve } from '../../ui/state-curve.tsx';
import { StateWord } from '../../ui/state-word.tsx';
import { Time } from '../../ui/time.tsx';
import { useDesk } from './api/get-desk.ts';

/** What waits on me, oldest first, with the reason; below it my studies. */
export function DeskView() {
  const { waiting, studies } = useDesk();
  return (
    <>
      <section aria-labelledby="waiting" className="mb-12">
        <h2 id="waiting" className="sr-only">
          Waits on you
        </h2>
        {waiting.length === 0 ? <NothingWaits hasStudies={studies.length > 0} /> : <WaitingList items={waiting} />}
      </section>
      <section>
        <SectionTitle>Your studies</SectionTitle>
        {studies.length === 0 ? <NoStudies /> : <StudyList studies={studies} />}
      </section>
    </>
  );
}

export function DeskSkeleton() {
  return (
    <>
      <div className="mb-12">
        <BoneRows rows={3} label="Loading what waits on you" />
      </div>
      <BoneRows rows={2} label="Loading your studies" />
    </>
  );
}

function WaitingList({ items }: { readonly items: readonly DeskItem[] }) {
  return (
    <ul className="border-t border-ink">
      {items.map((item) => (
        <li key={`${item.study} ${item.number} ${item.revision}`} className="relative border-b border-rule">
          <div className="grid items-center gap-x-8 gap-y-1 py-4 hover:bg-wash md:grid-cols-[1fr_auto_auto]">
            <div>
              <Link
                to={paths.revision.href(item.study, item.number, item.revision)}
                className="font-serif text-[1.0625rem] font-semibold after:absolute after:inset-0 hover:text-copper"
              >
                {item.reason}
              </Link>
              <p className="text-pencil">
                <span className="text-ink">
                  {item.number} rev {item.revision}
                </span>{' '}
                {item.title}, {item.studyTitle}
              </p>
            </div>
            <div className="hidden md:block">
              <StateCurve state={item.state} size="small" />
            </div>
            <p className="text-pencil md:w-48 md:text-right">
              <StateWord state={item.state} />{' '}
              <span className="whitespace-nowrap">
                since <Time iso={item.since} />
              </span>
            </p>
          </div>
        </li>
      ))}
    </ul>
  );
}

function StudyList({ studies }: { readonly studies: readonly StudySummary[] }) {
  return (
    <ul className="grid gap-4 sm:grid-cols-2">
      {studies.map((study) => (
        <li key={study.study} className="relative border border-rule bg-sheet px-5 py-4 hover:border-pencil">
          <Link
            to={paths.study.href(study.study)}
            className="font-serif text-[1.0625rem] font-semibold after:absolute after:inset-0"
          >
            {study.title}
          </Link>
          <p className="text-pencil">{study.place}</p>
          <p className="mt-2">
            {count(study.sheets, 'sheet')} <span className="text-pencil">· you are {study.roles.join(', ')}</span>
          </p>
        </li>
      ))}
    </ul>
  );
}

function NothingWaits({ hasStudies }: { readonly hasStudies: boolean }) {
  return (
    <Empty title="Nothing waits on you" commands={hasStudies ? ['npx antinode push FILE'] : []}>
      {hasStudies
        ? 'When a sheet is handed over to you, or comes back, it stands here. To put a sheet before your checker, push it:'
        : 'When a sheet is handed over to you, or comes back, it stands here.'}
    </Empty>
  );
}

function NoStudies() {
  return (
    <Empty title="You are in no study yet" commands={['npx antinode new study DIR', 'npx antinode run FILE']}>
      An administrator adds you to a study, as engineer, checker, approver or reader. Until then you can write and
      evaluate sheets on your own machine:
    </Empty>
  );
}
