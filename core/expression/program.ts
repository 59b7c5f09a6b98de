import type { AxisName } from '../axes/axis.ts';
import type { Shape } from '../axes/shape.ts';
import type { Span } from '../diagnostics/diagnostic.ts';
import type { GasModel } from '../gas/gas-model.ts';
import type { LibraryFunction } from '../library/function.ts';
import type { Reduction } from './axis-functions.ts';
import type { LookupTable } from './lookup-table.ts';
import type { MathFunction } from './mathematics.ts';
import type { ArithmeticOperator, ComparisonOperator } from './tree.ts';

/**
 * A compiled formula: stages that run in order, each making one intermediate column. A part of the formula that varies
 * along fewer axes than the whole is a stage of its own, and so runs no more often than its own values are many.
 */
export interface Program {
  readonly stages: readonly Stage[];
  /** Number of intermediate columns. */
  readonly temps: number;
  readonly result: Source;
}

/** Where a column is found: in the slot of a quantity, or among the program's own. */
export type Source = { readonly slot: number; readonly name: string } | { readonly temp: number };

/** What every stage has: the intermediate column it makes. */
interface Makes {
  readonly to: number;
}

export type Stage = KernelStage | ReduceStage | PickStage | CountStage;

export interface KernelStage extends Makes {
  readonly stage: 'kernel';
  readonly kernel: Kernel;
}

export interface ReduceStage extends Makes {
  readonly stage: 'reduce';
  readonly how: Reduction;
  readonly over: readonly AxisName[];
  readonly from: Source;
}

export interface PickStage extends Makes {
  readonly stage: 'pick';
  readonly axis: AxisName;
  readonly index: number;
  readonly from: Source;
}

/** The coordinates of an axis, as values along it. */
export interface CountStage extends Makes {
  readonly stage: 'count';
  readonly axis: AxisName;
}

/**
 * Instructions over registers. Registers are numbered: first one for each input, then one for each constant, then those
 * of intermediate results. The same list serves single values and, with a column in each register, blocks of cases.
 */
export interface Kernel {
  /** Axes of the result: those of all inputs and gases together. */
  readonly axes: Shape;
  readonly inputs: readonly Source[];
  readonly constants: readonly number[];
  readonly instructions: readonly Instruction[];
  readonly registers: number;
  readonly result: number;
}

export type Instruction =
  | ArithmeticInstruction
  | { readonly op: 'negate'; readonly to: number; readonly from: number }
  /** Cycles to radians or back, by a factor fixed when the program was compiled. */
  | { readonly op: 'scale'; readonly to: number; readonly from: number; readonly factor: number }
  /** A value times one factor after another, each the same in all cases: `dp*pi/4*D^2`, in one go. */
  | ChainInstruction
  | ChooseInstruction
  | MathInstruction
  | InterpolateInstruction
  | LibraryInstruction;

export interface ArithmeticInstruction {
  readonly op: ArithmeticOperator;
  readonly to: number;
  readonly left: number;
  readonly right: number;
  /** Value of the right-hand side where it is known, so that squares and roots need no general power. */
  readonly exponent?: number;
  readonly span: Span;
  readonly leftSpan: Span;
  readonly rightSpan: Span;
  /** Names of the quantities read on the right-hand side, with their registers: of a divisor of zero, the ones to name. */
  readonly rightInputs: readonly { readonly name: string; readonly register: number }[];
}

export interface ChainInstruction {
  readonly op: 'chain';
  readonly to: number;
  readonly from: number;
  readonly factors: readonly number[];
  readonly span: Span;
}

/** The value of one register or another, whichever a comparison of two more asks for. */
export interface ChooseInstruction {
  readonly op: 'choose';
  readonly to: number;
  readonly operator: ComparisonOperator;
  readonly left: number;
  readonly right: number;
  readonly yes: number;
  readonly no: number;
}

export interface MathInstruction {
  readonly op: 'mathematics';
  readonly to: number;
  readonly function: MathFunction;
  readonly arguments: readonly number[];
  readonly span: Span;
  readonly argumentSpans: readonly Span[];
}

export interface InterpolateInstruction {
  readonly op: 'interpolate';
  readonly to: number;
  readonly from: number;
  readonly table: LookupTable;
  readonly span: Span;
}

export interface LibraryInstruction {
  readonly op: 'library';
  readonly to: number;
  readonly function: LibraryFunction;
  readonly arguments: readonly LibraryArgument[];
  readonly span: Span;
  readonly argumentSpans: readonly Span[];
}

export type LibraryArgument = { readonly register: number } | { readonly fixed: string | GasModel } | GasesArgument;

/** A gas for each point of its axes. */
export interface GasesArgument {
  readonly gases: readonly GasModel[];
  readonly axes: Shape;
}
