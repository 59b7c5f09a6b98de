import { expect } from 'vitest';

/**
 * One value checked against the outside.
 * - `published`    printed in a book, paper or standard
 * - `independent`  computed by other code than ours
 * - `hand`         computed by hand from the formula
 * - `regression`   printed by our own code; never proof by itself
 */
export interface Row<Inputs> {
  readonly id: string;
  readonly source: string;
  readonly page?: string;
  readonly inputs: Inputs;
  readonly expected: number;
  /** Largest difference, in the unit of `expected`. */
  readonly tolerance: number;
  readonly whyTolerance: string;
  readonly kind: 'published' | 'independent' | 'hand' | 'regression';
}

export function byId<Inputs>(rows: readonly Row<Inputs>[]): (readonly [string, Row<Inputs>])[] {
  return rows.map((row) => [row.id, row] as const);
}

export function expectRow<Inputs>(actual: number, { expected, tolerance, whyTolerance }: Row<Inputs>): void {
  const difference = Math.abs(actual - expected);
  expect(difference, `${actual} against ${expected}; tolerance ${tolerance}: ${whyTolerance}`).toBeLessThanOrEqual(
    tolerance,
  );
}
