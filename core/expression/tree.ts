import type { Span } from '../diagnostics/diagnostic.ts';
import type { Unit } from '../units/unit.ts';

export type ArithmeticOperator = '+' | '-' | '*' | '/' | '^';
export type ComparisonOperator = '<' | '<=' | '>' | '>=';

/** The tree of a formula: the only node kinds that a sheet may use. Every node knows where it stands in the source. */
export type Expression =
  | { readonly node: 'number'; readonly span: Span; readonly value: number; readonly text: string }
  | {
      readonly node: 'quantity';
      readonly span: Span;
      readonly number: number;
      readonly text: string;
      readonly unit: Unit;
      /** Stands alone in brackets, so that its unit is meant just as it is written. */
      readonly bracketed?: true;
    }
  | { readonly node: 'name'; readonly span: Span; readonly name: string }
  | { readonly node: 'text'; readonly span: Span; readonly value: string }
  | { readonly node: 'negate'; readonly span: Span; readonly operand: Expression }
  | {
      readonly node: 'binary';
      readonly span: Span;
      readonly operator: ArithmeticOperator;
      readonly left: Expression;
      readonly right: Expression;
    }
  /** Only as the first argument of `where`. */
  | {
      readonly node: 'comparison';
      readonly span: Span;
      readonly operator: ComparisonOperator;
      readonly left: Expression;
      readonly right: Expression;
    }
  | {
      readonly node: 'call';
      readonly span: Span;
      readonly nameSpan: Span;
      readonly function: string;
      readonly arguments: readonly Expression[];
    };

export type Call = Expression & { readonly node: 'call' };

/** A formula: an expression, and after `to` the unit in which its result is shown. */
export interface Formula {
  readonly expression: Expression;
  readonly to?: { readonly unit: Unit; readonly span: Span };
}

/** What a check holds against what. */
export interface Comparison {
  readonly operator: ComparisonOperator;
  readonly left: Expression;
  readonly right: Expression;
  readonly span: Span;
}
