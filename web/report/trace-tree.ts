import type { Block } from '../../core/report/model.ts';

/** One line of a trace, with the lines that explain it. */
export interface TraceNode {
  readonly block: Block;
  readonly uses: readonly TraceNode[];
  /** The block's own uses stand higher up in this trace, and are not told again. */
  readonly isRepeated: boolean;
}

/** The blocks that a block reads directly. */
export function usesOf(block: Block): readonly string[] {
  return 'uses' in block ? block.uses : [];
}

/**
 * Where the numbers of a block come from, back to inputs and holds. Each block is explained once: a value that many
 * formulas share would otherwise make the tree grow with every path that leads to it.
 *
 * @param depth levels to follow; 1 is the direct uses
 */
export function traceOf(block: Block, blocks: ReadonlyMap<string, Block>, depth = Infinity): readonly TraceNode[] {
  const explained = new Set([block.path]);
  const follow = (from: Block, levels: number): TraceNode[] =>
    usesOf(from).flatMap((path) => {
      const used = blocks.get(path);
      if (used === undefined) return [];
      const isRepeated = explained.has(path) && usesOf(used).length > 0;
      explained.add(path);
      return [{ block: used, uses: isRepeated || levels <= 1 ? [] : follow(used, levels - 1), isRepeated }];
    });
  return follow(block, depth);
}
