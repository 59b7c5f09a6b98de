import type { Block } from '../../../core/report/model.ts';
import type { Remark } from '../../../schemas/api.ts';

/** All that the margin says of one block. */
export interface NoteGroup {
  readonly path: string;
  readonly label: string;
  readonly remarks: readonly Remark[];
  /** A remark is being written here. */
  readonly isComposing: boolean;
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
    if (own.length === 0 && !isComposing) return [];
    const label = blocks.get(path)?.label ?? `${path}, which this revision no longer has`;
    return [{ path, label, remarks: own.toSorted((a, b) => a.time.localeCompare(b.time)), isComposing }];
  });
}
