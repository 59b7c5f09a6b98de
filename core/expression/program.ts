import type { Span } from '../diagnostics/diagnostic.ts';
import type { GasModel } from '../gas/gas-model.ts';
import type { LibraryFunction } from '../library/function.ts';
import type { MathFunction } from './mathematics.ts';
import type { ArithmeticOperator } from './tree.ts';

/**
 * A compiled expression. Registers hold SI numbers: first one for each quantity that is read, then one for each constant,
 * then the intermediate results. Instructions name registers only, so the same list serves single values and, with a
 * column in each register, whole blocks of cases.
 */
export interface Program {
  /** Register i takes the value of this slot. */
  readonly inputs: readonly { readonly name: string; readonly slot: number }[];
  /** Registers behind those of the inputs. */
  readonly constants: readonly number[];
  readonly instructions: readonly Instruction[];
  readonly registers: number;
  /** Register of the result. */
  readonly result: number;
}

export type Instruction =
  | ArithmeticInstruction
  | { readonly op: 'negate'; readonly to: number; readonly from: number }
  /** Cycles to radians or back, by a factor fixed when the program was compiled. */
  | { readonly op: 'scale'; readonly to: number; readonly from: number; readonly factor: number }
  | MathInstruction
  | LibraryInstruction;

export interface ArithmeticInstruction {
  readonly op: ArithmeticOperator;
  readonly to: number;
  readonly left: number;
  readonly right: number;
  readonly span: Span;
  readonly leftSpan: Span;
  readonly rightSpan: Span;
  /** Inputs read on the right-hand side: of a divisor of zero, the ones to name. */
  readonly rightInputs: readonly number[];
}

export interface MathInstruction {
  readonly op: 'mathematics';
  readonly to: number;
  readonly function: MathFunction;
  readonly arguments: readonly number[];
  readonly span: Span;
  readonly argumentSpans: readonly Span[];
}

export interface LibraryInstruction {
  readonly op: 'library';
  readonly to: number;
  readonly function: LibraryFunction;
  readonly arguments: readonly LibraryArgument[];
  readonly span: Span;
  readonly argumentSpans: readonly Span[];
}

export type LibraryArgument = { readonly register: number } | { readonly fixed: string | GasModel };
