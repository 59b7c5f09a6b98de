import type { Block } from '../../../core/report/model.ts';
import type { Remark } from '../../../schemas/api.ts';

/** All that the margin says of one block. */
export interface NoteGroup {
  readonly path: string;
  readonly label: string;
  readonly remarks: readonly Remark[];
  /** A remark is being written here. */
  readonly isComposing: boolean;
  /** What the margin itself asks: a value lies outside of the range in which it would be believed. */
  readonly asks: string | null;
}

/** The notes of the margin in the order of the report. Remarks on blocks that are gone come first: they still need an answer. */
export function noteGroups(
  blocks: ReadonlyMap<string, Block>,
  remarks: readonly Remark[],
  composing: ReadonlySet<string>,
): readonly NoteGroup[] {
  const byPath = new Map<string, Remark[]>();
  for (const remark of remarks) byPath.set(remark.path, [...(byPath.get(remark.path) ?? []), remark]);
  const gone = [...byPath.keys()].filter((path) => !blocks.has(path));
  return [...gone, ...blocks.keys()].flatMap((path) => {
    const own = byPath.get(path) ?? [];
    const isComposing = composing.has(path);
    const block = blocks.get(path);
    const asks = block === undefined ? null : questionOf(block);
    if (own.length === 0 && !isComposing && asks === null) return [];
    const label = block?.label ?? `${path}, which this revision no longer has`;
    return [{ path, label, remarks: own.toSorted((a, b) => a.time.localeCompare(b.time)), isComposing, asks }];
  });
}

function questionOf(block: Block): string | null {
  if (!('expect' in block) || block.expect === undefined || block.expect.within) return null;
  const { number, unit } = block.printed;
  return `${number} ${unit}`.trim() + ` lies outside of ${block.expect.range}. Why?`;
}
