import { nearest } from '../diagnostics/nearest.ts';
import type { Block, Report } from './model.ts';
import { numbersPutIn } from './numbers-put-in.ts';
import { usedBy } from './used-by.ts';

/** One block of an explanation, and beneath it the blocks that it reads. */
export interface ExplainedBlock {
  readonly block: Block;
  /** Of a step or check: its formula as the sheet writes it, with numbers put in. */
  readonly numbers?: string;
  /**
   * `here`: all that it reads stands beneath it. `above`: it has been shown before, and is not shown again. `deeper`: the
   * explanation ends here; an explanation of this block goes on.
   */
  readonly shown: 'here' | 'above' | 'deeper';
  readonly uses: readonly ExplainedBlock[];
}

/** Formulas in formulas beyond this are left to an explanation of their own. */
export const MAX_DEPTH = 60;

/**
 * Explains one result of a report: its formula, its numbers, and the same of all that it reads, back to inputs, taken
 * values, gases and tables. Every block is shown once.
 *
 * @param wanted name of a quantity, gas or table, or path or label of a check
 * @returns the tree, or the names nearest to one that the report does not have
 */
export function explainBlock(
  report: Report,
  wanted: string,
): { readonly tree: ExplainedBlock } | { readonly nearest: readonly string[] } {
  const blocks = report.sections.flatMap((section) => section.blocks);
  const found = findBlock(blocks, wanted);
  if (found === undefined) return { nearest: nearest(wanted, blocks.flatMap(namesOf), 3) };
  const byPath = new Map(blocks.map((block) => [block.path, block]));
  return { tree: explained(found, { report, byPath, seen: new Set() }, 0) };
}

/** A name comes before a label, and a label before the path: labels are free text, and may be the name of another block. */
function findBlock(blocks: readonly Block[], wanted: string): Block | undefined {
  const explainable = blocks.filter((block) => namesOf(block).length > 0);
  return (
    explainable.find((block) => 'name' in block && block.name === wanted) ??
    explainable.find(({ path }) => path === wanted) ??
    explainable.find((block) => block.label === wanted || (block.block === 'check' && block.that === wanted))
  );
}

/** What a block may be asked for by. */
function namesOf(block: Block): string[] {
  if (block.block === 'check') return [block.label, block.that, block.path];
  return 'name' in block ? [block.name, block.label] : [];
}

interface Walk {
  readonly report: Report;
  readonly byPath: ReadonlyMap<string, Block>;
  readonly seen: Set<string>;
}

function explained(block: Block, walk: Walk, depth: number): ExplainedBlock {
  const numbers = numbersOf(block, walk.report);
  const base = { block, ...(numbers === undefined ? {} : { numbers }) };
  const paths = usedBy(block, walk.report).filter((path) => walk.byPath.has(path));
  if (walk.seen.has(block.path)) return { ...base, shown: 'above', uses: [] };
  if (depth >= MAX_DEPTH && paths.length > 0) return { ...base, shown: 'deeper', uses: [] };
  walk.seen.add(block.path);
  const uses = paths.flatMap((path) => {
    const used = walk.byPath.get(path);
    return used === undefined ? [] : [explained(used, walk, depth + 1)];
  });
  return { ...base, shown: 'here', uses };
}

function numbersOf(block: Block, report: Report): string | undefined {
  if (block.block === 'step') return numbersPutIn({ ...block, text: block.calc }, report);
  return block.block === 'check' ? numbersPutIn({ ...block, text: block.that }, report) : undefined;
}
