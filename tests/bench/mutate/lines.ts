import { replaced, splice, type Mutator } from './mutator.ts';
import type { Random } from './random.ts';
import { SHEET_KEYS } from './vocabulary.ts';

/** Changes that take lines, words and keys as they stand: what a slip of the editor does. */
export const mutateLines: Mutator = (text, random, others) => random.pick(CHANGES)(text, random, others);

const VALUE = /(?<=: )[^\n,}]+/g;

const CHANGES: readonly Mutator[] = [
  onLines((lines, at) => lines.toSpliced(at, 1)),
  onLines((lines, at, random) => lines.toSpliced(at, 1 + random.below(6))),
  onLines((lines, at) => lines.toSpliced(at, 0, lines[at] ?? '')),
  onLines((lines, at, random) => lines.toSpliced(random.below(lines.length), 0, lines[at] ?? '')),
  onLines((lines, at, random) => {
    const other = random.below(lines.length);
    return lines.with(at, lines[other] ?? '').with(other, lines[at] ?? '');
  }),
  onLines((lines, at, random) => lines.with(at, ' '.repeat(random.below(9)) + (lines[at] ?? '').trimStart())),
  onLines((lines, at) => lines.with(at, `\t${(lines[at] ?? '').trimStart()}`)),
  onLines((lines, at) => lines.toSpliced(at, 2, `${lines[at] ?? ''} ${(lines[at + 1] ?? '').trimStart()}`)),
  onLines((lines, at) => lines.with(at, `${lines[at] ?? ''} # ${lines[at] ?? ''}`)),
  (text, random, others) => {
    const borrowed = random.pick(others).split('\n');
    const from = random.below(borrowed.length);
    const lines = text.split('\n');
    return lines
      .toSpliced(random.below(lines.length), 0, ...borrowed.slice(from, from + 1 + random.below(5)))
      .join('\n');
  },
  (text, random) => swapped(text, random, /[A-Za-z_][A-Za-z0-9_]*/g),
  (text, random) => swapped(text, random, /[^\s,:{}[\]"']+/g),
  (text, random) => swapped(text, random, /[A-Za-z_][A-Za-z0-9_]*(?=:)/g),
  (text, random) => swapped(text, random, VALUE),
  (text, random) => {
    const key = random.pick(SHEET_KEYS);
    return replaced(text, random, /[A-Za-z_][A-Za-z0-9_]*(?=:)/g, () => key);
  },
  (text, random) => (random.chance(0.05) ? replaced(text, random, VALUE, () => longList(random)) : text),
  (text, random) => replaced(text, random, /[A-Za-z_][A-Za-z0-9_]*/g, (word) => misspelt(word, random)),
  (text, random) => replaced(text, random, /[+*/^-]|<=?|>=?/g, () => random.pick(['+', '-', '*', '/', '^', '<', '>='])),
];

function onLines(change: (lines: string[], at: number, random: Random) => string[]): Mutator {
  return (text, random) => {
    const lines = text.split('\n');
    return change(lines, random.below(lines.length), random).join('\n');
  };
}

/** Two matches of the pattern change places. */
function swapped(text: string, random: Random, pattern: RegExp): string {
  const matches = [...text.matchAll(pattern)];
  if (matches.length < 2) return text;
  const [first, second] = [random.pick(matches), random.pick(matches)].sort((a, b) => a.index - b.index);
  if (first === undefined || second === undefined || first === second) return text;
  const later = splice(text, second.index, second.index + second[0].length, first[0]);
  return splice(later, first.index, first.index + first[0].length, second[0]);
}

function misspelt(word: string, random: Random): string {
  const at = random.below(word.length);
  return random.pick([splice(word, at, at + 1, ''), word + word.charAt(at), word.toUpperCase(), word.toLowerCase()]);
}

/** Up to some more than a sheet may hold. */
function longList(random: Random): string {
  const item = random.pick(['x', '1', '{ that: 1 < 2 }', '{ title: x }', '[1, 2]']);
  return `[${`${item}, `.repeat(random.pick([100, 5000, 20_000, 51_000]))}]`;
}
