import type { BlockMention } from './comparison.ts';
import type { Block } from './model.ts';

/** A block by its path, kind, label and name. */
export function mention(block: Block): BlockMention {
  const { path, label } = block;
  const name = block.block === 'check' ? block.that : 'name' in block ? block.name : undefined;
  return { path, block: block.block, label, ...(name === undefined ? {} : { name }) };
}
