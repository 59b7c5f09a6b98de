import { and, asc, desc, eq, inArray } from 'drizzle-orm';
import type { Person } from '../../schemas/api.ts';
import type { Database } from '../db/database.ts';
import { marks } from '../db/schema/marks.ts';
import { remarks } from '../db/schema/remarks.ts';
import { revisionBlocks, revisions } from '../db/schema/revisions.ts';
import { sheets } from '../db/schema/sheets.ts';
import { studyMembers } from '../db/schema/studies.ts';
import { groupBy } from '../group-by.ts';
import { notFound } from '../problem.ts';
import { peopleById } from './people.ts';

export type RevisionRow = typeof revisions.$inferSelect;
export type MarkRow = typeof marks.$inferSelect;
export type RemarkRow = typeof remarks.$inferSelect;
export type BlockRow = Pick<typeof revisionBlocks.$inferSelect, 'path' | 'digest'>;

/** A sheet with all that its review rests on: enough to say what is marked, what is open, and who may do what. */
export interface SheetRecord {
  readonly id: string;
  readonly study: string;
  readonly number: string;
  /** Newest first; never empty. */
  readonly revisions: readonly RevisionRow[];
  readonly marks: readonly MarkRow[];
  /** In the order in which they were raised. */
  readonly remarks: readonly RemarkRow[];
  /** Those who are checkers of the study now. */
  readonly checkers: ReadonlySet<string>;
  readonly people: ReadonlyMap<string, Person>;
}

/** All sheets of the studies, by number. */
export async function sheetRecordsOf(db: Database, studies: readonly string[]): Promise<SheetRecord[]> {
  if (studies.length === 0) return [];
  const found = await db
    .select()
    .from(sheets)
    .where(inArray(sheets.studyId, [...studies]))
    .orderBy(asc(sheets.number));
  return recordsOf(db, found);
}

/**
 * One sheet. With `lock`, inside a transaction, it stays as it is until the transaction ends: everything that changes a
 * sheet's revisions, marks or remarks takes this lock first.
 */
export async function sheetRecord(db: Database, study: string, number: string, lock = false): Promise<SheetRecord> {
  const query = db
    .select()
    .from(sheets)
    .where(and(eq(sheets.studyId, study), eq(sheets.number, number)));
  const [record] = await recordsOf(db, await (lock ? query.for('update') : query));
  if (!record) throw notFound('such sheet in the study');
  return record;
}

async function recordsOf(db: Database, found: readonly (typeof sheets.$inferSelect)[]): Promise<SheetRecord[]> {
  if (found.length === 0) return [];
  const ids = found.map(({ id }) => id);
  const revisionRows = await db
    .select()
    .from(revisions)
    .where(inArray(revisions.sheetId, ids))
    .orderBy(desc(revisions.ordinal));
  const markRows = await db
    .select({ mark: marks, sheetId: revisions.sheetId })
    .from(marks)
    .innerJoin(revisions, eq(revisions.id, marks.revisionId))
    .where(inArray(revisions.sheetId, ids));
  const remarkRows = await db
    .select()
    .from(remarks)
    .where(inArray(remarks.sheetId, ids))
    .orderBy(asc(remarks.time), asc(remarks.id));
  const checkers = await checkersOf(db, [...new Set(found.map(({ studyId }) => studyId))]);
  const people = await peopleById(db, [
    ...revisionRows.map(({ authorId }) => authorId),
    ...markRows.map(({ mark }) => mark.personId),
    ...remarkRows.map(({ personId }) => personId),
  ]);
  const bySheet = {
    revisions: groupBy(revisionRows, ({ sheetId }) => sheetId),
    marks: groupBy(markRows, ({ sheetId }) => sheetId),
    remarks: groupBy(remarkRows, ({ sheetId }) => sheetId),
  };
  return found
    .filter(({ id }) => bySheet.revisions.has(id))
    .map(({ id, studyId, number }) => ({
      id,
      study: studyId,
      number,
      revisions: bySheet.revisions.get(id) ?? [],
      marks: (bySheet.marks.get(id) ?? []).map(({ mark }) => mark),
      remarks: bySheet.remarks.get(id) ?? [],
      checkers: checkers.get(studyId) ?? new Set(),
      people,
    }));
}

async function checkersOf(db: Database, studies: readonly string[]): Promise<ReadonlyMap<string, ReadonlySet<string>>> {
  const rows = await db
    .select({ study: studyMembers.studyId, person: studyMembers.personId })
    .from(studyMembers)
    .where(and(inArray(studyMembers.studyId, [...studies]), eq(studyMembers.role, 'checker')));
  const grouped = groupBy(rows, ({ study }) => study);
  return new Map([...grouped].map(([study, own]) => [study, new Set(own.map(({ person }) => person))]));
}

export function revisionIn(record: SheetRecord, letter: string): RevisionRow {
  const revision = record.revisions.find((candidate) => candidate.letter === letter);
  if (!revision) throw notFound('such revision of the sheet');
  return revision;
}

/** Blocks of the revisions' reports, in the order of the report. */
export async function blocksOf(
  db: Database,
  revisionIds: readonly string[],
): Promise<ReadonlyMap<string, readonly BlockRow[]>> {
  if (revisionIds.length === 0) return new Map();
  const rows = await db
    .select({ revisionId: revisionBlocks.revisionId, path: revisionBlocks.path, digest: revisionBlocks.digest })
    .from(revisionBlocks)
    .where(inArray(revisionBlocks.revisionId, [...revisionIds]))
    .orderBy(asc(revisionBlocks.position));
  return groupBy(rows, ({ revisionId }) => revisionId);
}
