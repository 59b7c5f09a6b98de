import type { Unit } from '../units/unit.ts';
import type { ArithmeticOperator, ComparisonOperator } from './tree.ts';

/** A word or sign of a formula; `start` and `end` are offsets in the formula's text. */
export type Token = { readonly start: number; readonly end: number } & (
  | { readonly kind: 'number'; readonly value: number; readonly text: string }
  | { readonly kind: 'quantity'; readonly number: number; readonly text: string; readonly unit: Unit }
  | { readonly kind: 'name' | 'function' | 'text'; readonly text: string }
  | { readonly kind: 'operator'; readonly text: ArithmeticOperator }
  | { readonly kind: 'comparison'; readonly text: ComparisonOperator }
  | { readonly kind: 'open' | 'close' | 'comma'; readonly text: string }
);

/** True for tokens that can be the last of a value: another value may not follow without an operator. */
export function endsValue({ kind }: Token): boolean {
  return kind === 'number' || kind === 'quantity' || kind === 'name' || kind === 'text' || kind === 'close';
}

export function startsValue({ kind }: Token): boolean {
  return kind !== 'operator' && kind !== 'comparison' && kind !== 'close' && kind !== 'comma';
}
