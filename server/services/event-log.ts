import { asc, desc, eq, sql } from 'drizzle-orm';
import { canonicalJson } from '../../core/seal/canonical-json.ts';
import { logLeaf } from '../../core/seal/log-leaf.ts';
import { treeRoot } from '../../core/seal/merkle.ts';
import type { LogEvent } from '../../core/seal/model.ts';
import { signLogHead } from '../../core/seal/sign.ts';
import type { Person, RevisionEvent } from '../../schemas/api.ts';
import type { ServerKey } from '../auth/server-key.ts';
import type { Database } from '../db/database.ts';
import { people } from '../db/schema/people.ts';
import { events, logHeads } from '../db/schema/log.ts';
import { revisions } from '../db/schema/revisions.ts';
import { sheets } from '../db/schema/sheets.ts';
import { PERSON } from './people.ts';

/** Any number, the same on every server: events are appended one at a time. */
const LOG_LOCK = 5_181_002;

/** The next place in the log, held until the transaction ends. */
export interface LogPlace {
  readonly index: number;
  /** Never before the last event, even where the clock was set back. */
  readonly time: Date;
}

export interface NewEvent {
  readonly revision: { readonly id: string; readonly letter: string; readonly manifestDigest: string };
  readonly study: string;
  readonly number: string;
  readonly event: RevisionEvent['event'];
  readonly person: Person;
  readonly note: string;
}

/** Takes the next place in the log. Everything else that the transaction locks must be locked before. */
export async function nextPlace(tx: Database, now: Date): Promise<LogPlace> {
  await tx.execute(sql`select pg_advisory_xact_lock(${LOG_LOCK}::bigint)`);
  const [last] = await tx
    .select({ index: events.index, time: events.time })
    .from(events)
    .orderBy(desc(events.index))
    .limit(1);
  return last ? placeAfter(last, now) : { index: 0, time: now };
}

export function placeAfter(last: LogPlace, now: Date): LogPlace {
  return { index: last.index + 1, time: last.time > now ? last.time : now };
}

export async function appendEvent(tx: Database, { index, time }: LogPlace, event: NewEvent): Promise<void> {
  const { revision, study, number, person, note } = event;
  const leaf: LogEvent = {
    index,
    event: event.event,
    study,
    number,
    revision: revision.letter,
    manifest: revision.manifestDigest,
    actor: person.email,
    time: time.toISOString(),
    note,
  };
  await tx.insert(events).values({
    index,
    revisionId: revision.id,
    event: event.event,
    personId: person.id,
    time,
    note,
    leaf: canonicalJson(leaf),
    leafHash: logLeaf(leaf),
  });
}

/** Hashes of all leaves, in order. */
export async function leafHashes(db: Database): Promise<string[]> {
  const rows = await db.select({ hash: events.leafHash }).from(events).orderBy(asc(events.index));
  return rows.map(({ hash }) => hash);
}

/** The signed head over the leaves: one for each size of the log, made when it is first asked for. */
export async function signedHead(
  db: Database,
  { signingKey }: ServerKey,
  leaves: readonly string[],
  now: Date,
): Promise<string> {
  const size = leaves.length;
  const known = await db.select({ jws: logHeads.jws }).from(logHeads).where(eq(logHeads.size, size));
  if (known[0]) return known[0].jws;
  const [last] = await db
    .select({ time: events.time })
    .from(events)
    .where(eq(events.index, size - 1));
  const time = last && last.time > now ? last.time : now;
  const root = treeRoot(leaves);
  const jws = await signLogHead({ antinode: 'log-head/1', size, root, time: time.toISOString() }, signingKey);
  await db.insert(logHeads).values({ size, root, time, jws }).onConflictDoNothing();
  const [stored] = await db.select({ jws: logHeads.jws }).from(logHeads).where(eq(logHeads.size, size));
  return stored?.jws ?? jws;
}

/** Events of a revision, oldest first, as they stand in the log. */
export async function leavesOf(db: Database, revisionId: string): Promise<LogEvent[]> {
  const rows = await db
    .select({ leaf: events.leaf })
    .from(events)
    .where(eq(events.revisionId, revisionId))
    .orderBy(asc(events.index));
  return rows.map(({ leaf }) => JSON.parse(leaf) as LogEvent);
}

const EVENT = {
  number: sheets.number,
  revision: revisions.letter,
  event: events.event,
  person: PERSON,
  time: events.time,
  note: events.note,
} as const;

/** What has happened to a sheet, newest first. */
export async function eventsOfSheet(db: Database, sheetId: string): Promise<RevisionEvent[]> {
  const rows = await selectEvents(db).where(eq(revisions.sheetId, sheetId)).orderBy(desc(events.index));
  return rows.map(toEvent);
}

/** What has happened in a study lately, newest first. */
export async function eventsOfStudy(db: Database, study: string, limit: number): Promise<RevisionEvent[]> {
  const rows = await selectEvents(db).where(eq(sheets.studyId, study)).orderBy(desc(events.index)).limit(limit);
  return rows.map(toEvent);
}

function selectEvents(db: Database) {
  return db
    .select(EVENT)
    .from(events)
    .innerJoin(revisions, eq(revisions.id, events.revisionId))
    .innerJoin(sheets, eq(sheets.id, revisions.sheetId))
    .innerJoin(people, eq(people.id, events.personId))
    .$dynamic();
}

function toEvent({ time, ...event }: Omit<RevisionEvent, 'time'> & { readonly time: Date }): RevisionEvent {
  return { ...event, time: time.toISOString() };
}
