import type { Random } from './random.ts';

/** One change of a sheet's text. `others` are the texts of the whole corpus, to borrow from. */
export type Mutator = (text: string, random: Random, others: readonly string[]) => string;

/** The text with one stretch of it replaced. */
export function splice(text: string, start: number, end: number, scrap: string): string {
  return text.slice(0, start) + scrap + text.slice(end);
}

/** One match of the pattern gives way to another text. */
export function replaced(text: string, random: Random, pattern: RegExp, by: (match: string) => string): string {
  const matches = [...text.matchAll(pattern)];
  if (matches.length === 0) return text;
  const match = random.pick(matches);
  return splice(text, match.index, match.index + match[0].length, by(match[0]));
}
