/** Words longer than this are no misspelling of a name; comparing them would only cost time. */
const LONGEST_WORD = 64;

/**
 * The candidates nearest to a misspelt word, best first: at most `limit` of them, none when all are too far away.
 * Letters are compared without regard to case; case, then the order of the candidates, decides between equals.
 */
export function nearest(word: string, candidates: Iterable<string>, limit = 1): string[] {
  if (word.length === 0 || word.length > LONGEST_WORD) return [];
  const folded = word.toLowerCase();
  return [...new Set(candidates)]
    .filter((candidate) => withinReach(folded, candidate.toLowerCase()))
    .map((candidate) => ({
      candidate,
      distance: editDistance(folded, candidate.toLowerCase()),
      exact: editDistance(word, candidate),
    }))
    .filter(({ candidate, distance }) => distance <= cutOff(word, candidate))
    .sort((a, b) => a.distance - b.distance || a.exact - b.exact)
    .slice(0, limit)
    .map(({ candidate }) => candidate);
}

/** One slip for every three letters, and one in words of two; a single letter is a misspelling of nothing. */
function cutOff(word: string, candidate: string): number {
  const length = Math.max(word.length, candidate.length);
  return length < 2 ? 0 : Math.max(1, Math.floor(length / 3));
}

function withinReach(word: string, candidate: string): boolean {
  if (candidate.length === 0 || candidate.length > LONGEST_WORD) return false;
  return Math.abs(word.length - candidate.length) <= cutOff(word, candidate);
}

/** Damerau-Levenshtein distance: insertions, deletions, substitutions and swaps of two neighbours (each swapped once). */
export function editDistance(a: string, b: string): number {
  let beforeLast: number[] = [];
  let last = Array.from({ length: b.length + 1 }, (_, column) => column);
  for (let row = 1; row <= a.length; row++) {
    const current = [row];
    for (let column = 1; column <= b.length; column++) {
      const cost = a[row - 1] === b[column - 1] ? 0 : 1;
      let best = Math.min(at(last, column) + 1, at(current, column - 1) + 1, at(last, column - 1) + cost);
      const swapped = row > 1 && column > 1 && a[row - 1] === b[column - 2] && a[row - 2] === b[column - 1];
      if (swapped) best = Math.min(best, at(beforeLast, column - 2) + 1);
      current.push(best);
    }
    beforeLast = last;
    last = current;
  }
  return at(last, b.length);
}

function at(row: readonly number[], column: number): number {
  return row[column] ?? Number.POSITIVE_INFINITY;
}
