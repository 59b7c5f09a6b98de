import type { Mark, MarkRequest, Person } from '../../schemas/api.ts';
import type { Database } from '../db/database.ts';
import { marks } from '../db/schema/marks.ts';
import { notFound, Refusal } from '../problem.ts';
import type { Context } from './context.ts';
import { refuseMark } from './marks-rules.ts';
import { membershipIn } from './members.ts';
import type { RevisionRef } from './read-revision.ts';
import { marksOn, standingOf, summaryOf } from './review.ts';
import { blocksOf, revisionIn, sheetRecord, type BlockRow } from './sheet-record.ts';

/** Marks a block as verified. The digest says which block the checker has seen. A block that is marked stays as it is. */
export function putMark(context: Context, person: Person, ref: RevisionRef, request: MarkRequest): Promise<Mark> {
  return context.db.transaction(async (tx) => {
    const { revision, block, marked } = await openForMarks(tx, person, ref, request.path);
    if (block.digest !== request.digest) {
      throw new Refusal('digest-differs', 'the block is not the one that you have seen; load the revision again');
    }
    if (marked) return marked;
    const { path, digest } = block;
    const time = context.now();
    await writeMark(tx, { revisionId: revision.id, path, digest, personId: person.id, isWithdrawn: false, time });
    return { path, digest, person, time: time.toISOString(), keptFrom: null };
  });
}

/** Takes a mark off a block: one made on this revision, or one kept from before. */
export function removeMark({ db, now }: Context, person: Person, ref: RevisionRef, path: string): Promise<void> {
  return db.transaction(async (tx) => {
    const { revision, block, marked } = await openForMarks(tx, person, ref, path);
    if (!marked) throw notFound('mark on this block');
    const { digest } = block;
    await writeMark(tx, { revisionId: revision.id, path, digest, personId: person.id, isWithdrawn: true, time: now() });
  });
}

async function openForMarks(tx: Database, person: Person, ref: RevisionRef, path: string) {
  const { roles } = await membershipIn(tx, person, ref.study);
  const record = await sheetRecord(tx, ref.study, ref.number, true);
  const revision = revisionIn(record, ref.revision);
  const blocks: readonly BlockRow[] = (await blocksOf(tx, [revision.id])).get(revision.id) ?? [];
  const viewer = { person, roles, hasChecked: false };
  const refusal = refuseMark(standingOf(record, revision, summaryOf(record, revision, blocks), viewer));
  if (refusal) throw refusal;
  const block = blocks.find((candidate) => candidate.path === path);
  if (!block) throw new Refusal('unknown-block', `the report has no block ${path}`);
  return { revision, block, marked: marksOn(record, revision, blocks).find((mark) => mark.path === path) };
}

async function writeMark(tx: Database, row: typeof marks.$inferInsert): Promise<void> {
  const { digest, personId, isWithdrawn, time } = row;
  await tx
    .insert(marks)
    .values(row)
    .onConflictDoUpdate({ target: [marks.revisionId, marks.path], set: { digest, personId, isWithdrawn, time } });
}
