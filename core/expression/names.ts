import { CONSTANTS } from './constants.ts';
import { isBuiltIn } from './built-in.ts';
import type { Expression } from './tree.ts';

/** Names of quantities and gases that an expression reads, in order of appearance; constants are not among them. */
export function namesIn(expression: Expression): Set<string> {
  const names = new Set<string>();
  visit(expression, (node) => {
    if (node.node === 'name' && !CONSTANTS.has(node.name)) names.add(node.name);
  });
  return names;
}

/** Names of the functions that an expression calls, in order of appearance. */
export function functionsIn(expression: Expression): Set<string> {
  const names = new Set<string>();
  visit(expression, (node) => {
    if (node.node === 'call') names.add(node.function);
  });
  return names;
}

/** True for names that no quantity of a sheet may have: constants, built-in functions and `to`. */
export function isReservedName(name: string): boolean {
  return name === 'to' || CONSTANTS.has(name) || isBuiltIn(name);
}

/** Calls `see` for a node and all below it, from left to right. */
export function visit(expression: Expression, see: (node: Expression) => void): void {
  see(expression);
  switch (expression.node) {
    case 'negate':
      visit(expression.operand, see);
      return;
    case 'binary':
    case 'comparison':
      visit(expression.left, see);
      visit(expression.right, see);
      return;
    case 'call':
      for (const argument of expression.arguments) visit(argument, see);
      return;
    case 'number':
    case 'quantity':
    case 'name':
    case 'text':
      return;
  }
}
