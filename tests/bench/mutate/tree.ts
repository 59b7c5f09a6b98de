import {
  Alias,
  isAlias,
  isMap,
  isPair,
  isScalar,
  parseDocument,
  visit,
  type Document,
  type Node,
  type Pair,
} from 'yaml';
import type { Mutator } from './mutator.ts';
import type { Random } from './random.ts';
import { EXTREMES, SHEET_KEYS } from './vocabulary.ts';

/** A place in the tree that holds a value. */
interface Slot {
  readonly node: Node;
  readonly put: (node: unknown) => void;
}

interface Tree {
  readonly document: Document;
  readonly slots: readonly Slot[];
  readonly pairs: readonly { readonly pair: Pair; readonly siblings: Pair[] }[];
}

/** Changes of the sheet as YAML sees it: subtrees move, types are wrong, anchors and tags appear. */
export const mutateTree: Mutator = (text, random, others) => {
  const tree = read(text);
  if (tree.slots.length === 0) return text;
  random.weighted(CHANGES)(tree, random, others);
  try {
    return tree.document.toString(random.pick([{}, { lineWidth: 0 }, { defaultStringType: 'QUOTE_DOUBLE' }]));
  } catch {
    // The writer refuses some trees, such as an alias ahead of its anchor; the text then stays as it is.
    return text;
  }
};

type Change = (tree: Tree, random: Random, others: readonly string[]) => void;

const CHANGES: readonly (readonly [number, Change])[] = [
  [3, ({ slots }, random) => random.pick(slots).put(copyOf(random.pick(slots).node))],
  [
    3,
    ({ slots }, random) => {
      const [first, second] = [random.pick(slots), random.pick(slots)];
      const kept = copyOf(first.node);
      first.put(copyOf(second.node));
      second.put(kept);
    },
  ],
  [3, ({ slots, document }, random) => random.pick(slots).put(document.createNode(random.pick(WRONG_TYPES)))],
  [2, ({ slots }, random, others) => graft(random.pick(slots), random, others)],
  [0.5, ({ slots, document }, random) => random.pick(slots).put(document.createNode(nested(1 + random.below(140))))],
  [2, ({ pairs }, random) => onPair(pairs, random, (pair, siblings) => siblings.push(copyOfPair(pair)))],
  [2, ({ pairs }, random) => onPair(pairs, random, (pair, siblings) => siblings.splice(siblings.indexOf(pair), 1))],
  [2, ({ pairs }, random) => onPair(pairs, random, (pair) => rename(pair, random.pick(SHEET_KEYS)))],
  [1, ({ pairs }, random) => onPair(pairs, random, (pair) => rename(pair, random.pick(ODD_KEYS)))],
  [1, ({ pairs, document }, random) => addPair({ pairs, document }, random)],
  [1, anchorAndAlias],
  [1, ({ slots }, random) => tag(random.pick(slots).node, random)],
  [1, ({ slots }, random) => restyle(random.pick(slots).node, random)],
];

const WRONG_TYPES: readonly unknown[] = [
  null, true, false, 0, -0, 1, 1e308, NaN, Infinity, '', ' ', 'x', [], {}, [[]], [{}], { value: {} }, { calc: [] },
  [null], [1, 2], { '': '' }, { value: null }, { of: [] }, { from: 'a@b#c' }, { that: 'a < b' }, ['a', 'b'], 2n ** 70n,
  { columns: {}, rows: {} }, { columns: { a: '1', b: '1' }, rows: [[0, 0], [0, 1]] }, { title: 'x', steps: { z: 1 } },
]; // prettier-ignore

const ODD_KEYS: readonly string[] = [
  '<<', '', ' ', '__proto__', 'constructor', 'toString', 'hasOwnProperty', 'e', 'pi', 'to', 'K', 'psi', '1', '1a', 'é',
  'a b', 'null', 'true', 'p_d', 'x'.repeat(300), 'then', 'length', 'gas', 'max', 'speed', 'condition',
]; // prettier-ignore

function read(text: string): Tree {
  const document = parseDocument(text, { schema: 'core', uniqueKeys: false, merge: false, logLevel: 'silent' });
  const slots: Slot[] = [];
  const pairs: { pair: Pair; siblings: Pair[] }[] = [];
  visit(document, {
    Map: (_, map) => {
      for (const pair of map.items) pairs.push({ pair, siblings: map.items });
    },
    Pair: (_, pair) => {
      if (pair.value !== null) slots.push({ node: pair.value as Node, put: (node) => (pair.value = node) });
    },
    Seq: (_, sequence) => {
      for (const [at, item] of sequence.items.entries()) {
        if (!isPair(item)) slots.push({ node: item as Node, put: (node) => (sequence.items[at] = node) });
      }
    },
  });
  return { document, slots, pairs };
}

function copyOf(node: Node): unknown {
  return node.clone();
}

function copyOfPair(pair: Pair): Pair {
  return pair.clone();
}

function onPair(pairs: Tree['pairs'], random: Random, change: (pair: Pair, siblings: Pair[]) => void): void {
  if (pairs.length === 0) return;
  const { pair, siblings } = random.pick(pairs);
  change(pair, siblings);
}

function rename(pair: Pair, name: string): void {
  if (isScalar(pair.key)) pair.key.value = name;
}

/** A key of the schema where none was, with a value that may or may not suit it. */
function addPair({ pairs, document }: Pick<Tree, 'pairs' | 'document'>, random: Random): void {
  const value: unknown = random.chance(0.5) ? random.pick(WRONG_TYPES) : random.pick(EXTREMES);
  onPair(pairs, random, (_, siblings) => siblings.push(document.createPair(random.pick(SHEET_KEYS), value)));
}

/** Puts a subtree of another sheet in the place of one of this sheet. */
function graft(slot: Slot, random: Random, others: readonly string[]): void {
  const { slots } = read(random.pick(others));
  if (slots.length > 0) slot.put(copyOf(random.pick(slots).node));
}

function anchorAndAlias({ slots, pairs }: Tree, random: Random): void {
  const { node } = random.pick(slots);
  if (isAlias(node)) return;
  if ('anchor' in node) node.anchor = 'a';
  const alias = new Alias('a');
  if (random.chance(0.6)) random.pick(slots).put(alias);
  else {
    onPair(pairs, random, (pair) => {
      rename(pair, '<<');
      pair.value = alias;
    });
  }
}

const TAGS = [
  '!!binary',
  '!!map',
  '!!seq',
  '!!str',
  '!!int',
  '!!float',
  '!!null',
  '!!set',
  '!!omap',
  '!!timestamp',
  '!x',
];

function tag(node: Node, random: Random): void {
  if (!isAlias(node)) node.tag = random.pick(TAGS).replace('!!', 'tag:yaml.org,2002:');
}

function restyle(node: Node, random: Random): void {
  if (isScalar(node)) {
    node.type = random.pick(['BLOCK_FOLDED', 'BLOCK_LITERAL', 'PLAIN', 'QUOTE_DOUBLE', 'QUOTE_SINGLE']);
  } else if (!isAlias(node)) {
    (node as { flow?: boolean }).flow = random.chance(0.5);
    if (isMap(node) && random.chance(0.3)) node.items.reverse();
  }
}

function nested(depth: number): unknown {
  let value: unknown = 1;
  for (let i = 0; i < depth; i += 1) value = i % 2 === 0 ? [value] : { a: value };
  return value;
}
