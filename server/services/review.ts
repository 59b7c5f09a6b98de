import type { Mark, Person, RevisionSummary, State } from '../../schemas/api.ts';
import { personOf } from './people.ts';
import type { BlockRow, MarkRow, RemarkRow, RevisionRow, SheetRecord } from './sheet-record.ts';

/**
 * The marks that count on a revision, in the order of the report: those made on it, and those kept from earlier revisions
 * because the block's digest has not changed and the checker may still check.
 */
export function marksOn(record: SheetRecord, revision: RevisionRow, blocks: readonly BlockRow[]): Mark[] {
  const earlier = record.revisions.filter(({ ordinal }) => ordinal <= revision.ordinal);
  const rows = new Map(record.marks.map((mark) => [markKey(mark.revisionId, mark.path), mark]));
  return blocks.flatMap((block) => {
    for (const from of earlier) {
      const mark = rows.get(markKey(from.id, block.path));
      if (!mark || mark.digest !== block.digest) continue;
      if (mark.isWithdrawn) return [];
      const isOwn = from.id === revision.id;
      if (!isOwn && !mayStillCheck(record, revision, mark)) continue;
      return [toMark(mark, record, isOwn ? null : from.letter)];
    }
    return [];
  });
}

function markKey(revisionId: string, path: string): string {
  return `${revisionId} ${path}`;
}

function mayStillCheck({ checkers }: SheetRecord, { authorId }: RevisionRow, { personId }: MarkRow): boolean {
  return checkers.has(personId) && personId !== authorId;
}

export function toMark(mark: MarkRow, { people }: Pick<SheetRecord, 'people'>, keptFrom: string | null): Mark {
  const { path, digest, personId, time } = mark;
  return { path, digest, person: personOf(people, personId), time: time.toISOString(), keptFrom };
}

/** Remarks that stand on a revision: those raised on it, and earlier ones that were not resolved when it was pushed. */
export function remarksOn({ remarks, revisions }: SheetRecord, revision: RevisionRow): RemarkRow[] {
  const ordinals = new Map(revisions.map(({ id, ordinal }) => [id, ordinal]));
  return remarks.filter(({ revisionId, resolvedAt }) => {
    if (revisionId === revision.id) return true;
    const isEarlier = (ordinals.get(revisionId) ?? Number.POSITIVE_INFINITY) < revision.ordinal;
    return isEarlier && (resolvedAt === null || resolvedAt > revision.pushed);
  });
}

export function isNewest({ revisions }: SheetRecord, { id }: RevisionRow): boolean {
  return revisions[0]?.id === id;
}

export function summaryOf(record: SheetRecord, revision: RevisionRow, blocks: readonly BlockRow[]): RevisionSummary {
  const marked = marksOn(record, revision, blocks);
  const open = remarksOn(record, revision).filter(({ state }) => state !== 'resolved');
  return {
    study: record.study,
    number: record.number,
    title: revision.title,
    revision: revision.letter,
    state: revision.state,
    author: personOf(record.people, revision.authorId),
    pushed: revision.pushed.toISOString(),
    governing: governingOf(revision),
    passed: revision.passed,
    failed: revision.failed,
    holds: revision.holds,
    remarks: { open: open.length, mustFix: open.filter(({ weight }) => weight === 'must fix').length },
    marks: {
      marked: marked.length,
      blocks: blocks.length,
      kept: marked.filter(({ keptFrom }) => keptFrom !== null).length,
    },
    waitsOn: isNewest(record, revision) ? WAITS_ON[revision.state] : '',
    manifest: revision.manifestDigest,
  };
}

/** Whom the newest revision of a sheet waits on, in words. */
const WAITS_ON: Readonly<Record<State, string>> = {
  pushed: 'the author',
  'in check': 'a checker',
  checked: 'an approver',
  approved: '',
  returned: 'the author',
};

function governingOf(revision: RevisionRow): RevisionSummary['governing'] {
  const { governingPath: path, governingLabel: label, governingUtilisation: utilisation } = revision;
  return path === null || label === null || utilisation === null ? null : { path, label, utilisation };
}

/** `1 hold`, `2 holds`. */
export function count(number: number, noun: string): string {
  return `${number} ${noun}${number === 1 ? '' : 's'}`;
}

/** How a person stands to a revision, and the revision to its rules. */
export interface Standing {
  readonly state: State;
  readonly isNewest: boolean;
  readonly isAuthor: boolean;
  /** Has signed this revision as its checker. */
  readonly hasChecked: boolean;
  readonly roles: readonly string[];
  readonly holds: number;
  readonly failed: number;
  readonly unmarked: number;
  /** Must-fix remarks that are open, or answered and not resolved. */
  readonly mustFix: number;
}

export function standingOf(
  record: SheetRecord,
  revision: RevisionRow,
  summary: RevisionSummary,
  viewer: { readonly person: Person; readonly roles: readonly string[]; readonly hasChecked: boolean },
): Standing {
  return {
    state: revision.state,
    isNewest: isNewest(record, revision),
    isAuthor: revision.authorId === viewer.person.id,
    hasChecked: viewer.hasChecked,
    roles: viewer.roles,
    holds: revision.holds,
    failed: revision.failed,
    unmarked: summary.marks.blocks - summary.marks.marked,
    mustFix: summary.remarks.mustFix,
  };
}
