import type { ComparisonOperator } from './tree.ts';

/** The one place where a comparison of a formula becomes a comparison of numbers. */
export function compareNumbers(operator: ComparisonOperator, a: number, b: number): boolean {
  switch (operator) {
    case '<':
      return a < b;
    case '<=':
      return a <= b;
    case '>':
      return a > b;
    case '>=':
      return a >= b;
  }
}
