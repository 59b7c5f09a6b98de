import type { Dimension, Kind } from '../units/dimension.ts';
import type { GasModel } from '../gas/gas-model.ts';

/** What a parameter takes. `number`: a plain number without unit; `text`: 'Sch 80'; `gas`: the name of a gas of the sheet. */
export type ParameterKind =
  | { readonly takes: 'quantity'; readonly dimension: Dimension; readonly kind: Kind; readonly unit: string }
  | { readonly takes: 'number'; readonly integer?: boolean }
  | { readonly takes: 'size' }
  | { readonly takes: 'text'; readonly examples: readonly string[] }
  | { readonly takes: 'gas' };

export interface Parameter {
  /** Camel-case-free name shown in help: `bore`. */
  readonly name: string;
  /** TeX symbol: `D_i`. */
  readonly symbol: string;
  readonly summary: string;
  readonly kind: ParameterKind;
  /** Range in SI in which the function has a meaning; outside it is an error (DOMAIN). */
  readonly range?: { readonly above?: number; readonly from?: number; readonly below?: number; readonly to?: number };
  readonly optional?: boolean;
}

export type Argument = number | string | GasModel;

/** A fault or a warning found while a function runs; the evaluator adds the span. */
export interface FunctionNotice {
  readonly code: 'DOMAIN' | 'VALIDITY' | 'LOOKUP_MISSING' | 'GAS_METHOD';
  readonly severity: 'error' | 'warning';
  readonly message: string;
  readonly hints?: readonly string[];
  /** Index of the argument to underline; the whole call when absent. */
  readonly argument?: number;
}

export interface FunctionResult {
  /** SI value; NaN goes with an error notice. */
  readonly value: number;
  readonly notices: readonly FunctionNotice[];
}

/** One physics function as sheets see it: what it takes and gives, how it is typeset, where it comes from. */
export interface LibraryFunction {
  readonly name: string;
  readonly topic: 'mathematics' | 'pipe' | 'acoustics' | 'gas' | 'limits' | 'machine' | 'mechanics';
  readonly summary: string;
  /** TeX of the formula, with the parameters' symbols. */
  readonly formula: string;
  /** TeX of the head: `f_{1/4}`, or an upright word. */
  readonly symbol: string;
  readonly parameters: readonly Parameter[];
  readonly returns: {
    readonly dimension: Dimension;
    readonly kind: Kind;
    readonly unit: string;
    readonly summary: string;
  };
  /** Where the method is valid, in one sentence. */
  readonly validity: string;
  /** Published source, with equation, clause or table; or "common practice, no source" / "from memory". */
  readonly source: string;
  /** A call that runs, and its result: `quarter_wave_frequency(400 m/s, 5 m, 1)` gives `20 Hz`. */
  readonly example: { readonly call: string; readonly result: string };
  readonly evaluate: (args: readonly Argument[]) => FunctionResult;
}
