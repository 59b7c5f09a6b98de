import { count } from '../../lib/words.ts';
import { Empty } from '../../ui/empty.tsx';
import { PageTitle, SectionTitle } from '../../ui/heading.tsx';
import { Bone, BoneRows } from '../../ui/skeleton.tsx';
import { ActivityList } from './activity-list.tsx';
import { useStudy } from './api/get-study.ts';
import { PeopleList } from './people-list.tsx';
import { SheetRegister } from './sheet-register.tsx';

/** A study: its sheets as a register, its people, and what happened. */
export function StudyView({ study }: { readonly study: string }) {
  const detail = useStudy(study);
  const role = detail.roles.length === 0 ? '' : `; you are ${detail.roles.join(', ')}`;
  return (
    <>
      <PageTitle below={`${detail.place}; ${count(detail.sheets.length, 'sheet')}${role}`}>{detail.title}</PageTitle>
      <section aria-label="Sheets" className="mb-12">
        {detail.sheets.length === 0 ? (
          <Empty
            title="No sheet has been pushed yet"
            commands={['npx antinode new sheet FILE', 'npx antinode push FILE']}
          >
            An engineer of this study pushes the first one. The server evaluates it again, and keeps it as revision A.
          </Empty>
        ) : (
          <SheetRegister sheets={detail.sheets} />
        )}
      </section>
      <div className="grid gap-12 lg:grid-cols-[22rem_1fr]">
        <section>
          <SectionTitle>People</SectionTitle>
          <PeopleList people={detail.people} />
        </section>
        <section>
          <SectionTitle>Activity</SectionTitle>
          <ActivityList study={study} activity={detail.activity} />
        </section>
      </div>
    </>
  );
}

export function StudySkeleton() {
  return (
    <>
      <Bone className="mb-3 h-7 w-80" />
      <Bone className="mb-8 h-4 w-56" />
      <BoneRows rows={5} label="Loading the study" />
    </>
  );
}
