import type { Expression } from '../../../core/expression/tree.ts';

/** Writes a tree back as a formula, with brackets around every operation. */
export function printExpression(expression: Expression): string {
  switch (expression.node) {
    case 'number':
      return expression.text;
    case 'quantity':
      return `(${expression.text} ${expression.unit.text})`;
    case 'name':
      return expression.name;
    case 'text':
      return `'${expression.value}'`;
    case 'negate':
      return `(-${printExpression(expression.operand)})`;
    case 'binary':
    case 'comparison':
      return `(${printExpression(expression.left)} ${expression.operator} ${printExpression(expression.right)})`;
    case 'call':
      return `${expression.function}(${expression.arguments.map(printExpression).join(', ')})`;
  }
}
