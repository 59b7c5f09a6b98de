import { asc, eq } from 'drizzle-orm';
import type { Report } from '../../core/report/model.ts';
import type { SourceFile } from '../../core/seal/model.ts';
import type { Person, RevisionDetail, RevisionSummary } from '../../schemas/api.ts';
import type { Database } from '../db/database.ts';
import { blobs } from '../db/schema/blobs.ts';
import { revisionFiles } from '../db/schema/revisions.ts';
import { notFound } from '../problem.ts';
import type { Context } from './context.ts';
import { eventsOfSheet } from './event-log.ts';
import { membershipIn } from './members.ts';
import { refuseMark } from './marks-rules.ts';
import { movesFor } from './move-rules.ts';
import { mayRaise, mayResolve, toRemarks } from './remarks.ts';
import { marksOn, remarksOn, standingOf, summaryOf } from './review.ts';
import { blocksOf, revisionIn, sheetRecord } from './sheet-record.ts';
import { hasChecked, standingSignatures, toSignature } from './signatures.ts';

export interface RevisionRef {
  readonly study: string;
  readonly number: string;
  readonly revision: string;
}

export async function listRevisions(
  { db }: Context,
  person: Person,
  study: string,
  number: string,
): Promise<RevisionSummary[]> {
  await membershipIn(db, person, study);
  const record = await sheetRecord(db, study, number);
  const blocks = await blocksOf(
    db,
    record.revisions.map(({ id }) => id),
  );
  return record.revisions.map((revision) => summaryOf(record, revision, blocks.get(revision.id) ?? []));
}

/** All that the page of a revision shows, and what the person may do there. */
export async function revisionDetail({ db }: Context, person: Person, ref: RevisionRef): Promise<RevisionDetail> {
  const { roles } = await membershipIn(db, person, ref.study);
  const record = await sheetRecord(db, ref.study, ref.number);
  const revision = revisionIn(record, ref.revision);
  const blocks = (await blocksOf(db, [revision.id])).get(revision.id) ?? [];
  const summary = summaryOf(record, revision, blocks);
  const viewer = { person, roles, hasChecked: await hasChecked(db, revision.id, person.id) };
  const standing = standingOf(record, revision, summary, viewer);
  const files = await fileList(db, revision.id);
  return {
    summary,
    report: await reportOf(db, revision.reportDigest),
    marks: marksOn(record, revision, blocks),
    remarks: await toRemarks(db, record, remarksOn(record, revision)),
    events: await eventsOfSheet(db, record.id),
    signatures: (await standingSignatures(db, revision.id)).map(toSignature),
    files: files.map(({ name }) => name),
    revisions: record.revisions.map(({ letter }) => letter),
    may: {
      mark: refuseMark(standing) === null,
      remark: mayRaise(roles),
      resolve: mayResolve(standing),
      moves: movesFor(standing),
    },
  };
}

export async function reportOf(db: Database, digest: string): Promise<Report> {
  return JSON.parse(await blobText(db, digest)) as Report;
}

/** Names and digests of the source files, the sheet first. */
export async function fileList(db: Database, revisionId: string): Promise<{ name: string; digest: string }[]> {
  return db
    .select({ name: revisionFiles.name, digest: revisionFiles.digest })
    .from(revisionFiles)
    .where(eq(revisionFiles.revisionId, revisionId))
    .orderBy(asc(revisionFiles.position));
}

export async function sourceFiles(db: Database, revisionId: string): Promise<SourceFile[]> {
  return db
    .select({ name: revisionFiles.name, text: blobs.text })
    .from(revisionFiles)
    .innerJoin(blobs, eq(blobs.digest, revisionFiles.digest))
    .where(eq(revisionFiles.revisionId, revisionId))
    .orderBy(asc(revisionFiles.position));
}

export async function sourceText({ db }: Context, person: Person, ref: RevisionRef, name: string): Promise<string> {
  await membershipIn(db, person, ref.study);
  const revision = revisionIn(await sheetRecord(db, ref.study, ref.number), ref.revision);
  const file = (await fileList(db, revision.id)).find((candidate) => candidate.name === name);
  if (!file) throw notFound('such file in the revision');
  return blobText(db, file.digest);
}

async function blobText(db: Database, digest: string): Promise<string> {
  const [row] = await db.select({ text: blobs.text }).from(blobs).where(eq(blobs.digest, digest));
  if (!row) throw new Error(`blob ${digest} is missing`);
  return row.text;
}
