import { asc, eq, inArray, sql } from 'drizzle-orm';
import type { Person, Role, StudyDetail, StudySummary } from '../../schemas/api.ts';
import { people } from '../db/schema/people.ts';
import { sheets } from '../db/schema/sheets.ts';
import { studies, studyMembers } from '../db/schema/studies.ts';
import { groupBy } from '../group-by.ts';
import type { Context } from './context.ts';
import { eventsOfStudy } from './event-log.ts';
import { membershipIn, membershipsOf } from './members.ts';
import { PERSON } from './people.ts';
import { summaryOf } from './review.ts';
import { blocksOf, sheetRecordsOf } from './sheet-record.ts';

const ACTIVITY_SHOWN = 30;

export interface NewStudy {
  readonly id: string;
  readonly title: string;
  readonly place: string;
}

export async function createStudy({ db, now }: Context, study: NewStudy): Promise<void> {
  await db.insert(studies).values({ ...study, created: now() });
}

export async function addMember({ db }: Context, studyId: string, person: Person, role: Role): Promise<void> {
  await db.insert(studyMembers).values({ studyId, personId: person.id, role }).onConflictDoNothing();
}

export async function listStudies({ db }: Context, person: Person): Promise<StudySummary[]> {
  const memberships = await membershipsOf(db, person.id);
  if (memberships.length === 0) return [];
  const ids = memberships.map(({ study }) => study);
  const rows = await db
    .select({ study: sheets.studyId, sheets: sql<number>`count(*)::int` })
    .from(sheets)
    .where(inArray(sheets.studyId, ids))
    .groupBy(sheets.studyId);
  const counts = new Map(rows.map((row) => [row.study, row.sheets]));
  return memberships.map((membership) => ({ ...membership, sheets: counts.get(membership.study) ?? 0 }));
}

export async function studyDetail({ db }: Context, person: Person, study: string): Promise<StudyDetail> {
  const membership = await membershipIn(db, person, study);
  const records = await sheetRecordsOf(db, [study]);
  const newest = records.flatMap((record) => {
    const [revision] = record.revisions;
    return revision === undefined ? [] : [{ record, revision }];
  });
  const blocks = await blocksOf(
    db,
    newest.map(({ revision }) => revision.id),
  );
  return {
    ...membership,
    people: await membersOf({ db }, study),
    sheets: newest.map(({ record, revision }) => summaryOf(record, revision, blocks.get(revision.id) ?? [])),
    activity: await eventsOfStudy(db, study, ACTIVITY_SHOWN),
  };
}

async function membersOf({ db }: Pick<Context, 'db'>, study: string): Promise<StudyDetail['people']> {
  const rows = await db
    .select({ person: PERSON, role: studyMembers.role })
    .from(studyMembers)
    .innerJoin(people, eq(people.id, studyMembers.personId))
    .where(eq(studyMembers.studyId, study))
    .orderBy(asc(people.name), asc(studyMembers.role));
  return [...groupBy(rows, ({ person }) => person.id).values()].flatMap((own) =>
    own[0] === undefined ? [] : [{ person: own[0].person, roles: own.map(({ role }) => role) }],
  );
}
