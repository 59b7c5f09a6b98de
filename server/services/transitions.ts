import { eq } from 'drizzle-orm';
import type { SigningKey } from '../../core/seal/model.ts';
import type { Person, RevisionDetail, Transition } from '../../schemas/api.ts';
import type { Database } from '../db/database.ts';
import { revisions } from '../db/schema/revisions.ts';
import { Refusal } from '../problem.ts';
import type { Context } from './context.ts';
import { appendEvent, nextPlace } from './event-log.ts';
import { membershipIn } from './members.ts';
import { MOVES, refuseWithoutNote, whyNot } from './move-rules.ts';
import { revisionDetail, type RevisionRef } from './read-revision.ts';
import { standingOf, summaryOf } from './review.ts';
import { blocksOf, revisionIn, sheetRecord, type RevisionRow } from './sheet-record.ts';
import { addSignature, hasChecked, openSigningKey } from './signatures.ts';
import { checkPassword } from './sign-in.ts';

/**
 * Moves a revision to its next state. The rules come first, then the password, which takes its time; then, with the sheet
 * locked, the rules once more, and signature, state and event together or not at all.
 */
export async function moveRevision(
  context: Context,
  person: Person,
  ref: RevisionRef,
  transition: Transition,
): Promise<RevisionDetail> {
  await requireMove(context.db, person, ref, transition, false);
  const key = await signingKeyFor(context, person, transition);
  await context.db.transaction(async (tx) => {
    const revision = await requireMove(tx, person, ref, transition, true);
    const { to, event, signs } = MOVES[transition.move];
    const note = transition.note.trim();
    const place = await nextPlace(tx, context.now());
    if (signs && key) await addSignature(tx, { revision, ...signs, person, key, time: place.time });
    await tx.update(revisions).set({ state: to, stateSince: place.time }).where(eq(revisions.id, revision.id));
    await appendEvent(tx, place, { revision, study: ref.study, number: ref.number, event, person, note });
  });
  return revisionDetail(context, person, ref);
}

async function requireMove(
  db: Database,
  person: Person,
  ref: RevisionRef,
  { move, note }: Transition,
  lock: boolean,
): Promise<RevisionRow> {
  const { roles } = await membershipIn(db, person, ref.study);
  const record = await sheetRecord(db, ref.study, ref.number, lock);
  const revision = revisionIn(record, ref.revision);
  const blocks = (await blocksOf(db, [revision.id])).get(revision.id) ?? [];
  const viewer = { person, roles, hasChecked: await hasChecked(db, revision.id, person.id) };
  const standing = standingOf(record, revision, summaryOf(record, revision, blocks), viewer);
  const refusal = whyNot(move, standing) ?? refuseWithoutNote(move, standing, note);
  if (refusal) throw refusal;
  return revision;
}

/** The person's key, opened with the password that is asked again for every signature; null where nothing is signed. */
async function signingKeyFor(
  context: Context,
  person: Person,
  { move, password }: Transition,
): Promise<SigningKey | null> {
  if (!MOVES[move].signs) return null;
  if (password === undefined) throw new Refusal('password-required', 'a signature needs your password again');
  await checkPassword(context, person.email, password, 403);
  return openSigningKey(context.db, person, password);
}
