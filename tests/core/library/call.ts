import { onlyValue } from '../../../core/axes/column.ts';
import { hasErrors, type Diagnostic } from '../../../core/diagnostics/diagnostic.ts';
import { compile } from '../../../core/expression/compile.ts';
import { inferFormula } from '../../../core/expression/infer-type.ts';
import { parseFormula } from '../../../core/expression/parse-formula.ts';
import { run } from '../../../core/expression/run.ts';
import type { GasModel } from '../../../core/gas/gas-model.ts';
import { LIBRARY } from '../../../core/library/catalogue.ts';
import type { QuantityType } from '../../../core/units/dimension.ts';

/** Gases that calls of these tests may name. */
export const GASES: ReadonlyMap<string, GasModel> = new Map(
  [
    { name: 'methane', method: 'ideal', moleFractions: new Map([['methane', 1]]) } as const,
    { name: 'real', method: 'gerg2008', moleFractions: new Map([['methane', 1]]) } as const,
  ].map((gas) => [gas.name, gas]),
);

const SITE = { atmosphere: 101_325 };

export interface CallOutcome {
  readonly value: number;
  readonly type: QuantityType | undefined;
  readonly diagnostics: readonly Diagnostic[];
}

/** Evaluates a formula just as a sheet would, with the whole library and an atmosphere of 101 325 Pa. */
export function callFromSheet(text: string): CallOutcome {
  const formula = parseFormula(text, { file: 'sheet.yaml', start: 0, end: text.length });
  if (formula.value === undefined) return failed(formula.diagnostics);
  const scope = {
    types: new Map(),
    shapes: new Map(),
    axes: new Map(),
    gases: new Set(GASES.keys()),
    tables: new Map(),
    functions: LIBRARY,
    site: SITE,
  };
  const typed = inferFormula(formula.value, scope);
  if (typed.value === undefined || hasErrors(typed.diagnostics)) return failed(typed.diagnostics);
  const { typed: expression, type, factor } = typed.value;
  const gases = new Map([...GASES].map(([name, model]) => [name, { axes: [], models: [model] }]));
  const program = compile(expression, { slots: new Map(), gases, functions: LIBRARY, site: SITE });
  const { column, diagnostics } = run(program, [], new Map());
  return { value: onlyValue(column) * factor, type, diagnostics: [...typed.diagnostics, ...diagnostics] };
}

function failed(diagnostics: readonly Diagnostic[]): CallOutcome {
  return { value: Number.NaN, type: undefined, diagnostics };
}
