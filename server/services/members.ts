import { and, asc, eq } from 'drizzle-orm';
import type { Person, Role } from '../../schemas/api.ts';
import type { Database } from '../db/database.ts';
import { studies, studyMembers } from '../db/schema/studies.ts';
import { groupBy } from '../group-by.ts';
import { notFound, Refusal } from '../problem.ts';

export interface Membership {
  readonly study: string;
  readonly title: string;
  readonly place: string;
  readonly roles: readonly Role[];
}

/** All studies of a person, with the person's roles, by title. */
export async function membershipsOf(db: Database, personId: string): Promise<Membership[]> {
  const rows = await db
    .select({ study: studies.id, title: studies.title, place: studies.place, role: studyMembers.role })
    .from(studyMembers)
    .innerJoin(studies, eq(studies.id, studyMembers.studyId))
    .where(eq(studyMembers.personId, personId))
    .orderBy(asc(studies.title), asc(studyMembers.role));
  return [...groupBy(rows, ({ study }) => study)].map(([study, own]) => ({
    study,
    title: own[0]?.title ?? '',
    place: own[0]?.place ?? '',
    roles: own.map(({ role }) => role),
  }));
}

/** The person's place in a study. A study of others is answered as one that does not exist. */
export async function membershipIn(db: Database, person: Person, study: string): Promise<Membership> {
  const rows = await db
    .select({ title: studies.title, place: studies.place, role: studyMembers.role })
    .from(studyMembers)
    .innerJoin(studies, eq(studies.id, studyMembers.studyId))
    .where(and(eq(studies.id, study), eq(studyMembers.personId, person.id)))
    .orderBy(asc(studyMembers.role));
  const [first] = rows;
  if (!first) throw notFound('such study');
  return { study, title: first.title, place: first.place, roles: rows.map(({ role }) => role) };
}

/** Throws unless the person has one of the roles. `what`: what only they may do. */
export function requireRole({ roles }: Membership, wanted: readonly Role[], what: string): void {
  if (wanted.some((role) => roles.includes(role))) return;
  throw new Refusal('wrong-role', `only ${wanted.join(' or ')} of the study may ${what}`);
}
