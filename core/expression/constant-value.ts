import { arithmetic } from './arithmetic.ts';
import { CONSTANTS } from './constants.ts';
import type { Expression } from './tree.ts';

/** Value of an expression of numbers and constants alone, such as `1/2`; undefined where a quantity or a function stands in it. */
export function constantValue(expression: Expression): number | undefined {
  switch (expression.node) {
    case 'number':
      return expression.value;
    case 'name':
      return CONSTANTS.get(expression.name)?.value;
    case 'negate': {
      const operand = constantValue(expression.operand);
      return operand === undefined ? undefined : -operand;
    }
    case 'binary':
      return constantOperation(expression);
    case 'quantity':
    case 'text':
    case 'call':
    case 'comparison':
      return undefined;
  }
}

function constantOperation({ operator, left, right }: Expression & { node: 'binary' }): number | undefined {
  const [a, b] = [constantValue(left), constantValue(right)];
  return a === undefined || b === undefined ? undefined : arithmetic(operator, a, b);
}
