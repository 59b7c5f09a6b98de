import type { Desk, DeskItem, Person, RevisionSummary } from '../../schemas/api.ts';
import type { Context } from './context.ts';
import { membershipsOf, type Membership } from './members.ts';
import { count, remarksOn, standingOf, summaryOf, type Standing } from './review.ts';
import { blocksOf, sheetRecordsOf, type RemarkRow, type RevisionRow, type SheetRecord } from './sheet-record.ts';
import { hasChecked } from './signatures.ts';
import { listStudies } from './studies.ts';

/** What waits on the person, oldest first, and their studies. */
export async function deskOf(context: Context, person: Person): Promise<Desk> {
  const { db } = context;
  const memberships = await membershipsOf(db, person.id);
  const records = await sheetRecordsOf(
    db,
    memberships.map(({ study }) => study),
  );
  const blocks = await blocksOf(
    db,
    records.flatMap(({ revisions }) => revisions.slice(0, 1)).map(({ id }) => id),
  );
  const waiting: DeskItem[] = [];
  for (const record of records) {
    const membership = memberships.find(({ study }) => study === record.study);
    const [revision] = record.revisions;
    if (!membership || !revision) continue;
    const summary = summaryOf(record, revision, blocks.get(revision.id) ?? []);
    const viewer = { person, roles: membership.roles, hasChecked: await hasChecked(db, revision.id, person.id) };
    const standing = standingOf(record, revision, summary, viewer);
    const reason = reasonFor(standing, summary, remarksOn(record, revision));
    if (reason !== null) waiting.push(itemOf(record, revision, membership, reason));
  }
  waiting.sort((a, b) => (a.since < b.since ? -1 : a.since > b.since ? 1 : 0));
  return { waiting, studies: await listStudies(context, person) };
}

function itemOf(record: SheetRecord, revision: RevisionRow, { title }: Membership, reason: string): DeskItem {
  return {
    study: record.study,
    studyTitle: title,
    number: record.number,
    title: revision.title,
    revision: revision.letter,
    state: revision.state,
    reason,
    since: revision.stateSince.toISOString(),
  };
}

/** Why the newest revision of a sheet waits on the person, in words; null where it does not. */
function reasonFor(standing: Standing, summary: RevisionSummary, remarks: readonly RemarkRow[]): string | null {
  const open = remarks.filter(({ state }) => state === 'open');
  if (standing.isAuthor) return authorsReason(standing, open.length);
  if (standing.state === 'in check' && standing.roles.includes('checker')) return checkersReason(summary, remarks);
  if (standing.state === 'checked' && standing.roles.includes('approver') && !standing.hasChecked) {
    return approversReason(standing);
  }
  return null;
}

function authorsReason({ state }: Standing, open: number): string | null {
  const toAnswer = `${count(open, 'remark')} to answer`;
  switch (state) {
    case 'pushed':
      return open > 0 ? `${toAnswer}, then hand it over for checking` : 'pushed: hand it over for checking';
    case 'returned':
      return open > 0 ? `returned, ${toAnswer}` : 'returned to you: push a new revision';
    case 'in check':
    case 'checked':
      return open > 0 ? toAnswer : null;
    case 'approved':
      return null;
  }
}

function checkersReason({ marks }: RevisionSummary, remarks: readonly RemarkRow[]): string {
  const answered = remarks.filter(({ state }) => state === 'answered');
  const mustFix = answered.filter(({ weight }) => weight === 'must fix').length;
  if (mustFix > 0) return `${count(mustFix, 'must-fix remark')} answered: look again`;
  if (answered.length > 0) return `${count(answered.length, 'remark')} answered: look again`;
  const unmarked = marks.blocks - marks.marked;
  if (unmarked === 0) return 'all blocks are marked: close the check';
  const kept = marks.kept > 0 ? `, ${marks.kept} kept from before` : '';
  return `${count(unmarked, 'block')} to check${kept}`;
}

function approversReason({ holds, mustFix, failed }: Standing): string {
  if (mustFix > 0) return `checked, but ${count(mustFix, 'must-fix remark')} not resolved`;
  if (holds > 0) return `checked, but ${count(holds, 'hold')} open: it can’t be approved yet`;
  if (failed > 0) return `checked, ${count(failed, 'check')} failed: approve with a note, or return it`;
  return 'checked: approve or return it';
}
