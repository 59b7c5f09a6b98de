import { randomUUID } from 'node:crypto';
import { and, desc, eq } from 'drizzle-orm';
import type { Report } from '../../core/report/model.ts';
import { canonicalJson } from '../../core/seal/canonical-json.ts';
import { digestText } from '../../core/seal/digest.ts';
import { buildManifest } from '../../core/seal/manifest.ts';
import type { Manifest, SourceFile } from '../../core/seal/model.ts';
import type { Person, Push, RevisionSummary } from '../../schemas/api.ts';
import type { Database } from '../db/database.ts';
import { blobs } from '../db/schema/blobs.ts';
import { revisionBlocks, revisionFiles, revisions } from '../db/schema/revisions.ts';
import { sheets } from '../db/schema/sheets.ts';
import { Refusal } from '../problem.ts';
import type { Context } from './context.ts';
import { appendEvent, nextPlace, placeAfter, type LogPlace } from './event-log.ts';
import { revisionLetter } from './letters.ts';
import { membershipIn, requireRole } from './members.ts';
import { checkFiles, checkNumber } from './push-names.ts';
import { fileList } from './read-revision.ts';
import { requireTaken } from './takes.ts';
import { count, summaryOf } from './review.ts';
import { blocksOf, revisionIn, sheetRecord, type RevisionRow } from './sheet-record.ts';

/**
 * Takes a sheet as the next revision: checks names, evaluates it again, refuses a report that is not its own result, and
 * records sources, report, manifest and event together or not at all.
 */
export async function pushSheet(context: Context, person: Person, study: string, push: Push): Promise<RevisionSummary> {
  const { db, now } = context;
  requireRole(await membershipIn(db, person, study), ['engineer'], 'push sheets');
  checkFiles(push);
  const files = sheetFirst(push);
  const report = await evaluateAgain(context, push);
  checkNumber(report.sheet.number);
  return db.transaction(async (tx) => {
    const sheetId = await sheetOf(tx, study, report.sheet.number, now());
    const former = await newestOf(tx, sheetId);
    if (former) await refuseUnchanged(tx, former, files);
    const taken = await requireTaken(tx, study, report);
    const place = await nextPlace(tx, now());
    const pushed: NewRevision = { study, sheetId, person, files, report, taken, former, time: place.time };
    const revision = await writeRevision(tx, pushed);
    await recordPush(tx, pushed, revision, place);
    const record = await sheetRecord(tx, study, report.sheet.number);
    const blocks = await blocksOf(tx, [revision.id]);
    return summaryOf(record, revisionIn(record, revision.letter), blocks.get(revision.id) ?? []);
  });
}

/** The manifest lists the sheet first, and the rest in the order of their names. */
function sheetFirst({ entry, files }: Push): SourceFile[] {
  const byName = [...files].sort((a, b) => (a.name < b.name ? -1 : 1)).map(({ name, text }) => ({ name, text }));
  return [...byName.filter(({ name }) => name === entry), ...byName.filter(({ name }) => name !== entry)];
}

async function evaluateAgain({ pool }: Context, { entry, files, report: claimed }: Push): Promise<Report> {
  const { report, diagnostics, fault, differences } = await pool.evaluate({ entry, files, claimed });
  if (report === null) {
    const errors = diagnostics.filter(({ severity }) => severity === 'error').length;
    throw new Refusal('sheet-has-errors', `the sheet has ${count(errors, 'error')}`, { diagnostics });
  }
  if (fault !== undefined) throw new Refusal('bad-report', fault);
  const [first] = differences;
  if (!first) return report;
  const detail = `${first.path} is ${first.yours} in the report that was sent, and ${first.ours} when evaluated here`;
  throw new Refusal('report-differs', detail, { differences });
}

/** The sheet's row, made at its first push, and locked until the transaction ends. */
async function sheetOf(tx: Database, study: string, number: string, created: Date): Promise<string> {
  await tx.insert(sheets).values({ id: randomUUID(), studyId: study, number, created }).onConflictDoNothing();
  const own = and(eq(sheets.studyId, study), eq(sheets.number, number));
  const [sheet] = await tx.select({ id: sheets.id }).from(sheets).where(own).for('update');
  if (!sheet) throw new Error('the sheet’s row is missing');
  return sheet.id;
}

async function newestOf(tx: Database, sheetId: string): Promise<RevisionRow | undefined> {
  const [newest] = await tx
    .select()
    .from(revisions)
    .where(eq(revisions.sheetId, sheetId))
    .orderBy(desc(revisions.ordinal))
    .limit(1);
  return newest;
}

async function refuseUnchanged(tx: Database, former: RevisionRow, files: readonly SourceFile[]): Promise<void> {
  const before = (await fileList(tx, former.id)).map(({ name, digest }) => `${digest} ${name}`);
  const after = files.map(({ name, text }) => `${digestText(text)} ${name}`);
  if (before.join('\n') !== after.join('\n')) return;
  throw new Refusal('unchanged', `the sources are those of revision ${former.letter}`);
}

interface NewRevision {
  readonly study: string;
  readonly sheetId: string;
  readonly person: Person;
  readonly files: readonly SourceFile[];
  readonly report: Report;
  readonly taken: Manifest['taken'];
  readonly former: RevisionRow | undefined;
  readonly time: Date;
}

interface WrittenRevision {
  readonly id: string;
  readonly letter: string;
  readonly manifestDigest: string;
}

async function writeRevision(tx: Database, pushed: NewRevision): Promise<WrittenRevision> {
  const { study, sheetId, person, files, report, taken, former, time } = pushed;
  const ordinal = (former?.ordinal ?? 0) + 1;
  const letter = revisionLetter(ordinal);
  const previous = former?.manifestDigest ?? null;
  const manifest = canonicalJson(buildManifest({ study, revision: letter, files, report, taken, previous }));
  const reportText = canonicalJson(report);
  const row = {
    id: randomUUID(),
    sheetId,
    ordinal,
    letter,
    title: report.sheet.title,
    authorId: person.id,
    pushed: time,
    state: 'pushed',
    stateSince: time,
    manifest,
    manifestDigest: digestText(manifest),
    reportDigest: digestText(reportText),
    ...countsOf(report),
  } as const;
  await writeBlobs(tx, [reportText, ...files.map(({ text }) => text)]);
  await tx.insert(revisions).values(row);
  const fileRows = files.map(({ name, text }, position) => ({ position, name, digest: digestText(text) }));
  await tx.insert(revisionFiles).values(fileRows.map((file) => ({ revisionId: row.id, ...file })));
  await writeBlocks(tx, row.id, report);
  return row;
}

function countsOf({ summary: { passed, failed, holds, governing } }: Report) {
  return {
    passed,
    failed,
    holds,
    governingPath: governing?.path ?? null,
    governingLabel: governing?.label ?? null,
    governingUtilisation: governing?.utilisation ?? null,
  };
}

async function writeBlobs(tx: Database, texts: readonly string[]): Promise<void> {
  const rows = texts.map((text) => ({ digest: digestText(text), text }));
  await tx.insert(blobs).values(rows).onConflictDoNothing();
}

async function writeBlocks(tx: Database, revisionId: string, { sections }: Report): Promise<void> {
  const rows = sections
    .flatMap(({ blocks }) => blocks)
    .map(({ path, digest }, position) => ({ revisionId, position, path, digest }));
  if (rows.length > 0) await tx.insert(revisionBlocks).values(rows);
}

/** The event of the push, after that of the return of an unfinished former revision, which it replaces. */
async function recordPush(
  tx: Database,
  pushed: NewRevision,
  revision: WrittenRevision,
  place: LogPlace,
): Promise<void> {
  const { study, report, person, former, time } = pushed;
  const about = { study, number: report.sheet.number, person };
  let next = place;
  if (former && former.state !== 'approved' && former.state !== 'returned') {
    const note = `replaced by revision ${revision.letter}`;
    await tx.update(revisions).set({ state: 'returned', stateSince: time }).where(eq(revisions.id, former.id));
    await appendEvent(tx, next, { ...about, revision: former, event: 'returned', note });
    next = placeAfter(place, time);
  }
  await appendEvent(tx, next, { ...about, revision, event: 'pushed', note: '' });
}
