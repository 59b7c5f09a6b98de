import type { Block, Report } from './model.ts';

/** The same block in two reports; null on the side that has none. */
export interface BlockPair {
  readonly before: Block | null;
  readonly after: Block | null;
}

interface Placed {
  readonly block: Block;
  readonly title: string;
}

/**
 * Finds for each block of one report the same block in another. Names are unique in a sheet, so blocks with a name are
 * the same wherever they stand. Others are paired by what they say, then by their label, then, where their kind allows
 * it, by their place.
 *
 * @returns all pairs, in the order of the second report; what only the first has comes last
 */
export function pairBlocks(before: Report, after: Report): readonly BlockPair[] {
  const [left, right] = [placed(before), placed(after)];
  const partner = new Map<Placed, Placed>();
  const open = new Set(left);
  for (let level = 0; level < LEVELS; level += 1) {
    const waiting = new Map<string, Placed[]>();
    for (const one of open) {
      const key = keysOf(one)[level];
      if (key !== undefined) waiting.set(key, [...(waiting.get(key) ?? []), one]);
    }
    for (const other of right.filter((block) => !partner.has(block))) {
      const key = keysOf(other)[level];
      const found = key === undefined ? undefined : waiting.get(key)?.shift();
      if (found === undefined) continue;
      partner.set(other, found);
      open.delete(found);
    }
  }
  return [
    ...right.map((other) => ({ before: partner.get(other)?.block ?? null, after: other.block })),
    ...[...open].map(({ block }) => ({ before: block, after: null })),
  ];
}

function placed({ sections }: Report): Placed[] {
  return sections.flatMap(({ title, blocks }) => blocks.map((block) => ({ block, title })));
}

const LEVELS = 4;

/** What a block is known by, the surest first. Keys of different levels are never held against each other. */
function keysOf({ block, title }: Placed): readonly string[] {
  const key = (...parts: readonly string[]): string => JSON.stringify([block.block, ...parts]);
  switch (block.block) {
    case 'input':
    case 'column':
    case 'taken':
    case 'lookup':
    case 'step':
    case 'gas':
      return [JSON.stringify(['name', block.path === block.name ? block.path : '', block.name])];
    case 'check':
      return [key(block.digest), key(block.label, block.that), key(block.label), key(block.that)];
    case 'text':
      return [key(block.digest), key(title), key(block.path)];
    case 'table':
    case 'figure':
      return [key(block.digest), key(title, block.label), key(block.label), key(block.path)];
    case 'assumption':
    case 'exclusion':
    case 'reference':
      return [key(block.text), key(block.path)];
  }
}
