import { randomUUID } from 'node:crypto';
import { asc, eq, inArray } from 'drizzle-orm';
import type { NewRemark, Person, Remark, RemarkChange, Role } from '../../schemas/api.ts';
import type { Database } from '../db/database.ts';
import { remarks, replies } from '../db/schema/remarks.ts';
import { groupBy } from '../group-by.ts';
import { notFound, Refusal } from '../problem.ts';
import type { Context } from './context.ts';
import { membershipIn, requireRole } from './members.ts';
import { peopleById, personOf } from './people.ts';
import type { RevisionRef } from './read-revision.ts';
import { remarksOn, type Standing } from './review.ts';
import { blocksOf, revisionIn, sheetRecord, type RemarkRow, type SheetRecord } from './sheet-record.ts';

const RAISERS: readonly Role[] = ['engineer', 'checker', 'approver'];
const RESOLVERS: readonly Role[] = ['checker', 'approver'];

export function mayRaise(roles: readonly Role[]): boolean {
  return RAISERS.some((role) => roles.includes(role));
}

export function mayResolve({ roles, isAuthor }: Pick<Standing, 'roles' | 'isAuthor'>): boolean {
  return !isAuthor && RESOLVERS.some((role) => roles.includes(role));
}

export function raiseRemark(
  { db, now }: Context,
  person: Person,
  ref: RevisionRef,
  remark: NewRemark,
): Promise<Remark> {
  return db.transaction(async (tx) => {
    requireRole(await membershipIn(tx, person, ref.study), RAISERS, 'raise remarks');
    const record = await sheetRecord(tx, ref.study, ref.number, true);
    const revision = revisionIn(record, ref.revision);
    const blocks = (await blocksOf(tx, [revision.id])).get(revision.id) ?? [];
    const { path, weight, text } = remark;
    if (!blocks.some((block) => block.path === path)) {
      throw new Refusal('unknown-block', `the report has no block ${path}`);
    }
    const row: RemarkRow = {
      id: randomUUID(),
      sheetId: record.id,
      revisionId: revision.id,
      path,
      weight,
      text,
      personId: person.id,
      time: now(),
      state: 'open',
      resolvedAt: null,
      resolvedBy: null,
      version: 1,
    };
    await tx.insert(remarks).values(row);
    return toRemark(tx, record, row);
  });
}

/** A reply of the author answers the remark; a reply of anybody else opens an answered one again. */
export function replyToRemark(context: Context, person: Person, ref: RemarkRef, text: string): Promise<Remark> {
  return context.db.transaction(async (tx) => {
    requireRole(await membershipIn(tx, person, ref.study), RAISERS, 'reply to remarks');
    const { record, revision, row } = await openRemark(tx, ref);
    const position = await tx.$count(replies, eq(replies.remarkId, row.id));
    await tx.insert(replies).values({ remarkId: row.id, position, personId: person.id, text, time: context.now() });
    const isAuthor = revision.authorId === person.id;
    const state = row.state === 'resolved' ? row.state : isAuthor ? 'answered' : 'open';
    return toRemark(tx, record, await update(tx, row, { state }));
  });
}

/** Resolves or opens a remark, where it still is what the person has seen. */
export function changeRemark(
  context: Context,
  person: Person,
  ref: RemarkRef,
  { state }: RemarkChange,
  ifMatch: string | undefined,
): Promise<Remark> {
  return context.db.transaction(async (tx) => {
    const membership = await membershipIn(tx, person, ref.study);
    requireRole(membership, RESOLVERS, 'resolve remarks');
    const { record, revision, row } = await openRemark(tx, ref);
    if (revision.authorId === person.id) {
      throw new Refusal('same-person', 'you wrote this revision; someone else must resolve the remarks on it');
    }
    requireMatch(row, ifMatch);
    const isResolved = state === 'resolved';
    const resolved = { resolvedAt: isResolved ? context.now() : null, resolvedBy: isResolved ? person.id : null };
    return toRemark(tx, record, await update(tx, row, { state, ...resolved }));
  });
}

export interface RemarkRef extends RevisionRef {
  readonly id: string;
}

async function openRemark(tx: Database, ref: RemarkRef) {
  const record = await sheetRecord(tx, ref.study, ref.number, true);
  const revision = revisionIn(record, ref.revision);
  const row = remarksOn(record, revision).find(({ id }) => id === ref.id);
  if (!row) throw notFound('such remark on the revision');
  return { record, revision, row };
}

function requireMatch(row: RemarkRow, ifMatch: string | undefined): void {
  if (ifMatch === undefined) {
    throw new Refusal('precondition-required', 'send the ETag of the remark that you have seen as If-Match');
  }
  if (ifMatch === '*' || ifMatch === etagOf(row)) return;
  throw new Refusal('changed-meanwhile', 'someone has changed the remark since you saw it; look at it again');
}

async function update(tx: Database, row: RemarkRow, change: Partial<RemarkRow>): Promise<RemarkRow> {
  const changed = { ...row, ...change, version: row.version + 1 };
  await tx
    .update(remarks)
    .set({ ...change, version: changed.version })
    .where(eq(remarks.id, row.id));
  return changed;
}

function etagOf({ version }: RemarkRow): string {
  return `"${version}"`;
}

async function toRemark(db: Database, record: SheetRecord, row: RemarkRow): Promise<Remark> {
  const [remark] = await toRemarks(db, record, [row]);
  if (!remark) throw new Error('a remark was lost');
  return remark;
}

export async function toRemarks(db: Database, record: SheetRecord, rows: readonly RemarkRow[]): Promise<Remark[]> {
  if (rows.length === 0) return [];
  const ids = rows.map(({ id }) => id);
  const found = await db.select().from(replies).where(inArray(replies.remarkId, ids)).orderBy(asc(replies.position));
  const people = await peopleById(
    db,
    [...rows, ...found].map(({ personId }) => personId),
  );
  const threads = groupBy(found, ({ remarkId }) => remarkId);
  const letters = new Map(record.revisions.map(({ id, letter }) => [id, letter]));
  return rows.map((row) => ({
    id: row.id,
    path: row.path,
    weight: row.weight,
    text: row.text,
    person: personOf(people, row.personId),
    time: row.time.toISOString(),
    state: row.state,
    replies: (threads.get(row.id) ?? []).map(({ personId, time, text }) => ({
      person: personOf(people, personId),
      time: time.toISOString(),
      text,
    })),
    etag: etagOf(row),
    revision: letters.get(row.revisionId) ?? '',
  }));
}
