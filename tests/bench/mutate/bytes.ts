import { splice, type Mutator } from './mutator.ts';
import type { Random } from './random.ts';
import { SCRAPS } from './vocabulary.ts';

/** Changes that know nothing of what the text says. */
export const mutateBytes: Mutator = (text, random, others) => random.pick(CHANGES)(text, random, others);

const CHANGES: readonly Mutator[] = [
  insertScrap,
  insertScrap,
  (text, random) => {
    const { start, end } = stretch(text, random, 40);
    return splice(text, start, end, '');
  },
  (text, random) => {
    const { start, end } = stretch(text, random, 40);
    return splice(text, end, end, text.slice(start, end).repeat(1 + random.below(3)));
  },
  (text, random) => {
    const { start, end } = stretch(text, random, 20);
    const middle = start + random.below(end - start + 1);
    return splice(text, start, end, text.slice(middle, end) + text.slice(start, middle));
  },
  (text, random) => {
    const at = random.below(text.length + 1);
    return splice(
      text,
      at,
      at + 1,
      String.fromCharCode(random.chance(0.8) ? random.below(128) : random.below(0x10000)),
    );
  },
  (text, random) => text.slice(0, random.below(text.length + 1)),
  (text, random, others) => {
    const other = random.pick(others);
    const { start, end } = stretch(other, random, 200);
    const at = random.below(text.length + 1);
    return splice(text, at, at, other.slice(start, end));
  },
  (text) => text.replaceAll('\n', '\r\n'),
  (text) => `\uFEFF${text}`,
];

function insertScrap(text: string, random: Random): string {
  const { start, end } = stretch(text, random, random.chance(0.7) ? 0 : 10);
  return splice(text, start, end, random.pick(SCRAPS).repeat(random.chance(0.02) ? 200 : 1));
}

function stretch(text: string, random: Random, longest: number): { readonly start: number; readonly end: number } {
  const start = random.below(text.length + 1);
  return { start, end: Math.min(text.length, start + random.below(longest + 1)) };
}
