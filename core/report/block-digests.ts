import { digestJson } from '../seal/digest.ts';
import type { Digest } from './model.ts';

/** What a block says, and which blocks it rests on, by path. */
export interface BlockContent {
  readonly path: string;
  readonly content: unknown;
  readonly uses: readonly string[];
}

/**
 * Digest of every block over its own content and the digests of all blocks it uses, so that an equal digest means that
 * neither the block nor anything behind it has changed.
 *
 * @param blocks without circles among `uses`; paths that are not among the blocks are left out
 */
export function blockDigests(blocks: readonly BlockContent[]): ReadonlyMap<string, Digest> {
  const byPath = new Map(blocks.map((block) => [block.path, block]));
  const digests = new Map<string, Digest>();
  for (const path of byPath.keys()) digestOf(path, byPath, digests);
  return digests;
}

/** Walks with its own stack: a chain of dependence may be as long as a sheet. */
function digestOf(start: string, blocks: ReadonlyMap<string, BlockContent>, digests: Map<string, Digest>): void {
  const stack = [start];
  for (let path = stack.at(-1); path !== undefined; path = stack.at(-1)) {
    const block = blocks.get(path);
    const missing = block?.uses.filter((used) => blocks.has(used) && !digests.has(used)) ?? [];
    if (missing.length > 0) {
      stack.push(...missing);
      continue;
    }
    stack.pop();
    if (block !== undefined && !digests.has(path)) digests.set(path, digestBlock(block, digests));
  }
}

/** Only digests of what is used go in, not its path: a step keeps its digest when a section is put before its own. */
function digestBlock(block: BlockContent, digests: ReadonlyMap<string, Digest>): Digest {
  const uses = [...new Set(block.uses)].flatMap((path) => digests.get(path) ?? []).toSorted();
  return digestJson({ content: block.content, uses });
}
