import type { Paint } from '../../terminal.ts';
import { INDENT } from './layout.ts';

export function cutAfter<T>(rows: readonly T[], most: number): readonly T[] {
  return rows.slice(0, most);
}

/** Says how many rows of a long table are left out. */
export function moreLine(rows: number, most: number, paint: Paint): string[] {
  if (rows <= most) return [];
  const left = rows - most;
  return [paint('dim', `${INDENT}… and ${left} more ${left === 1 ? 'row' : 'rows'}; \`--format json\` has all`)];
}

/**
 * At most `most` of the places 0 … count − 1, evenly spread: with the first, the last, and one that must not be missed.
 */
export function thinned(count: number, most: number, keep: number | undefined): number[] {
  if (count <= most) return Array.from({ length: count }, (_, place) => place);
  const even = most - (keep === undefined ? 0 : 1);
  const places = Array.from({ length: even }, (_, i) => Math.round((i * (count - 1)) / (even - 1)));
  return [...new Set(keep === undefined ? places : [...places, keep])].toSorted((a, b) => a - b);
}
