/** A note of the margin: where the block that it speaks of stands, and how high the note is. Pixels. */
export interface Note {
  readonly id: string;
  readonly anchor: number;
  readonly height: number;
}

interface Placing {
  readonly gap: number;
  /** A note that stands level with its block whatever the others must give way. */
  readonly pinned?: string | undefined;
}

const PINNED_WEIGHT = 1e6;

interface Pool {
  weight: number;
  sum: number;
  count: number;
}

/**
 * Tops of the notes, in the order of their blocks: none overlaps, and the sum of the squared distances to their blocks is
 * least. Without overlap means that each top is at least the one before it plus its height; with those heights taken off,
 * the tops must only not decrease, which is isotonic regression (pool adjacent violators).
 */
export function placeNotes(notes: readonly Note[], { gap, pinned }: Placing): ReadonlyMap<string, number> {
  const sorted = notes.toSorted((a, b) => a.anchor - b.anchor);
  const offsets: number[] = [];
  let offset = 0;
  for (const note of sorted) {
    offsets.push(offset);
    offset += note.height + gap;
  }
  const pools: Pool[] = [];
  sorted.forEach((note, index) => {
    const weight = note.id === pinned ? PINNED_WEIGHT : 1;
    pools.push({ weight, sum: weight * (note.anchor - (offsets[index] ?? 0)), count: 1 });
    mergeViolators(pools);
  });
  // Above the column there is no room: what would stand there is pushed down together with all that it touches.
  const levels = pools.flatMap((pool) => Array.from({ length: pool.count }, () => Math.max(0, mean(pool))));
  return new Map(sorted.map((note, index) => [note.id, (levels[index] ?? 0) + (offsets[index] ?? 0)]));
}

function mergeViolators(pools: Pool[]): void {
  for (;;) {
    const last = pools.at(-1);
    const before = pools.at(-2);
    if (last === undefined || before === undefined || mean(before) <= mean(last)) return;
    pools.splice(-2, 2, {
      weight: before.weight + last.weight,
      sum: before.sum + last.sum,
      count: before.count + last.count,
    });
  }
}

function mean({ sum, weight }: Pool): number {
  return sum / weight;
}
