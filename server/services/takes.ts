import { close } from '../../core/report/compare-reports.ts';
import type { Block, Quantity, Report } from '../../core/report/model.ts';
import type { Manifest } from '../../core/seal/model.ts';
import type { Person, RevisionValues } from '../../schemas/api.ts';
import type { Database } from '../db/database.ts';
import { Refusal } from '../problem.ts';
import type { Context } from './context.ts';
import { membershipIn } from './members.ts';
import { reportOf, type RevisionRef } from './read-revision.ts';
import { revisionIn, sheetRecord, type RevisionRow, type SheetRecord } from './sheet-record.ts';

type TakenBlock = Extract<Block, { block: 'taken' }>;

/**
 * Holds what a sheet takes from other sheets against the revisions on record: each must exist in the study, be the very
 * one that the sheet is pinned to, and have the value that the sheet computes with.
 *
 * @returns what the manifest says of them
 */
export async function requireTaken(tx: Database, study: string, report: Report): Promise<Manifest['taken']> {
  const taken = new Map<string, Manifest['taken'][number]>();
  for (const block of takenBlocks(report)) {
    const { number, letter, name } = partsOf(block.from);
    const revision = await recordedRevision(tx, study, number, letter, block);
    const recorded = (await reportOf(tx, revision.reportDigest)).quantities[name];
    requireValue(block, report.quantities[block.name], recorded);
    taken.set(`${number}@${letter}`, { number, revision: letter, digest: revision.manifestDigest });
  }
  return [...taken.entries()].sort(([a], [b]) => (a < b ? -1 : 1)).map(([, entry]) => entry);
}

function takenBlocks({ sections }: Report): TakenBlock[] {
  return sections.flatMap(({ blocks }) => blocks).filter((block): block is TakenBlock => block.block === 'taken');
}

/** `TH3-C-102@B#T_d`: the core has read it, so its parts are there. */
function partsOf(from: string): { number: string; letter: string; name: string } {
  const [reference = '', name = ''] = from.split('#');
  const at = reference.lastIndexOf('@');
  return { number: reference.slice(0, at), letter: reference.slice(at + 1), name };
}

async function recordedRevision(
  tx: Database,
  study: string,
  number: string,
  letter: string,
  { from, revision }: TakenBlock,
): Promise<RevisionRow> {
  const unknown = new Refusal('taken-unknown', `${from} is taken from a revision that this study has not`);
  const record = await sheetRecord(tx, study, number).catch((cause: unknown) => {
    throw cause instanceof Refusal ? unknown : cause;
  });
  const row = record.revisions.find((candidate) => candidate.letter === letter);
  if (row === undefined) throw unknown;
  if (row.manifestDigest === revision) return row;
  throw new Refusal('taken-differs', `${from} is pinned to another revision than the one on record`);
}

function requireValue({ from }: TakenBlock, used: Quantity | undefined, recorded: Quantity | undefined): void {
  if (recorded === undefined) throw new Refusal('taken-unknown', `the revision has no quantity for ${from}`);
  if (used !== undefined && used.unit === recorded.unit && close(used.si, recorded.si)) return;
  const shown = (quantity: Quantity | undefined): string =>
    quantity === undefined ? 'nothing' : `${quantity.printed.number} ${quantity.printed.unit}`.trim();
  throw new Refusal('taken-differs', `${from} is ${shown(used)} in the sheet, and ${shown(recorded)} on record`);
}

/** The values of a revision, for other sheets to take. */
export async function revisionValues({ db }: Context, person: Person, ref: RevisionRef): Promise<RevisionValues> {
  await membershipIn(db, person, ref.study);
  const record = await sheetRecord(db, ref.study, ref.number);
  const revision = revisionIn(record, ref.revision);
  const { quantities } = await reportOf(db, revision.reportDigest);
  return {
    number: ref.number,
    revision: revision.letter,
    state: revision.state,
    manifestDigest: revision.manifestDigest,
    newest: newestApproved(record, revision),
    quantities: Object.fromEntries(
      Object.entries(quantities).map(([name, { unit, si, axes }]) => [name, { unit, si, axes }]),
    ),
  };
}

/** The latest approved revision behind this one; null where there is none. */
function newestApproved({ revisions }: SheetRecord, { ordinal }: RevisionRow): string | null {
  return revisions.find((later) => later.ordinal > ordinal && later.state === 'approved')?.letter ?? null;
}
