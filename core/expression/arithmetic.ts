import { power } from '../numeric/math.ts';
import type { ArithmeticOperator } from './tree.ts';

/** The one place where an operator of a formula becomes an operation on numbers. */
export function arithmetic(operator: ArithmeticOperator, a: number, b: number): number {
  switch (operator) {
    case '+':
      return a + b;
    case '-':
      return a - b;
    case '*':
      return a * b;
    case '/':
      return a / b;
    case '^':
      return power(a, b);
  }
}
