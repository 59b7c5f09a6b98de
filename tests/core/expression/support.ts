import { onlyValue, single } from '../../../core/axes/column.ts';
import type { Diagnosed, Diagnostic, Span } from '../../../core/diagnostics/diagnostic.ts';
import { compile } from '../../../core/expression/compile.ts';
import { inferComparison, inferFormula } from '../../../core/expression/infer-type.ts';
import { parseComparison, parseFormula } from '../../../core/expression/parse-formula.ts';
import { run } from '../../../core/expression/run.ts';
import type { Expression } from '../../../core/expression/tree.ts';
import type { TypeScope } from '../../../core/expression/type-scope.ts';
import type { GasModel } from '../../../core/gas/gas-model.ts';
import type { LibraryFunction } from '../../../core/library/function.ts';
import type { QuantityType } from '../../../core/units/dimension.ts';
import { toSi } from '../../../core/units/convert.ts';
import { parseQuantity } from '../../../core/units/parse-quantity.ts';

/** The formula stands somewhere inside its file, so that spans that forget their start are found out. */
export const START = 100;

export function spanOf(text: string): Span {
  return { file: 'sheet.yaml', start: START, end: START + text.length };
}

export function underlined(text: string, { start, end }: Span): string {
  return text.slice(start - START, end - START);
}

export function parsed(text: string): Expression {
  const { value, diagnostics } = parseFormula(text, spanOf(text));
  if (value === undefined) throw new Error(diagnostics.map(({ message }) => message).join('; '));
  return value.expression;
}

export const SITE = { atmosphere: 101_325 };

/** The quantities that formulas of these tests may use, as a sheet would give them. */
export const QUANTITIES: Readonly<Record<string, string>> = {
  D_i: '5.761 in',
  L: '5 m',
  p_d: '905 psig',
  p_s: '300 psig',
  T: '240 degF',
  T_K: '350 K',
  dT: '10 delta_degC',
  N: '1200 rpm',
  f: '10 Hz',
  w: '100 rad/s',
  c: '400 m/s',
  k_s: '4000 N/m',
  m: '10 kg',
  k: '1.25',
  n: '3',
  zero: '0',
  share: '2.4 %',
};

const values = new Map(
  Object.entries(QUANTITIES).map(([name, text]) => {
    const quantity = parseQuantity(text, spanOf(text)).value;
    if (quantity === undefined) throw new Error(text);
    const type: QuantityType = { dimension: quantity.unit.dimension, kind: quantity.unit.kind };
    return [name, { type, si: toSi(quantity.number, quantity.unit, SITE) }] as const;
  }),
);

export const RESIDUE: GasModel = { name: 'residue', method: 'ideal', moleFractions: new Map([['methane', 1]]) };

export function scopeWith(functions: readonly LibraryFunction[] = [], more: Partial<TypeScope> = {}): TypeScope {
  return {
    types: new Map([...values].map(([name, { type }]) => [name, type])),
    faulty: new Set(['broken']),
    shapes: new Map(),
    axes: new Map(),
    gases: new Set(['residue']),
    tables: new Map(),
    functions: new Map(functions.map((fn) => [fn.name, fn])),
    site: SITE,
    ...more,
  };
}

export interface Outcome {
  readonly value: number;
  readonly type: QuantityType | undefined;
  readonly diagnostics: readonly Diagnostic[];
}

/** From text to the SI value, stopping at the first phase that has errors. */
export function evaluate(text: string, functions: readonly LibraryFunction[] = []): Outcome {
  const formula = parseFormula(text, spanOf(text));
  if (formula.value === undefined) return failed(formula);
  const typed = inferFormula(formula.value, scopeWith(functions));
  if (typed.value === undefined) return failed(typed);
  const names = [...values.keys()];
  const program = compile(typed.value.typed, {
    slots: new Map(names.map((name, slot) => [name, slot])),
    gases: new Map([['residue', { axes: [], models: [RESIDUE] }]]),
    functions: new Map(functions.map((fn) => [fn.name, fn])),
    site: SITE,
  });
  const columns = [...values.values()].map(({ si }) => single(si));
  const { column, diagnostics } = run(program, columns, new Map());
  return {
    value: onlyValue(column) * typed.value.factor,
    type: typed.value.type,
    diagnostics: [...typed.diagnostics, ...diagnostics],
  };
}

/** Faults of a formula, wherever they are found: parsing, typing or running. */
export function faultsOf(text: string, functions: readonly LibraryFunction[] = []): readonly Diagnostic[] {
  return evaluate(text, functions).diagnostics;
}

export function comparisonFaults(text: string): readonly Diagnostic[] {
  const { value, diagnostics } = parseComparison(text, spanOf(text));
  return value === undefined ? diagnostics : inferComparison(value, scopeWith()).diagnostics;
}

function failed({ diagnostics }: Diagnosed<unknown>): Outcome {
  return { value: Number.NaN, type: undefined, diagnostics };
}
