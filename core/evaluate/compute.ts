import type { Diagnostic } from '../diagnostics/diagnostic.ts';
import { compile, type CompileContext } from '../expression/compile.ts';
import { run } from '../expression/run.ts';
import type { TypedExpression } from '../expression/type-scope.ts';
import type { GasModel } from '../gas/gas-model.ts';
import type { LibraryFunction } from '../library/function.ts';
import type { CheckNode } from '../sheet/document.ts';
import type { TypedSheet } from './check-types.ts';
import type { Site } from '../units/site.ts';
import { judge, type Judgement } from './judge-check.ts';

/** What formulas are evaluated with. */
export interface Givens {
  /** SI values of the inputs, by name. */
  readonly inputs: ReadonlyMap<string, number>;
  readonly gases: ReadonlyMap<string, GasModel>;
  readonly functions: ReadonlyMap<string, LibraryFunction>;
  readonly site: Site;
}

export interface Computed {
  /** SI values of the steps, by name. NaN where a fault has been reported, there or behind it. */
  readonly steps: ReadonlyMap<string, number>;
  readonly checks: ReadonlyMap<CheckNode, Judgement>;
  readonly diagnostics: readonly Diagnostic[];
}

/** Evaluates all typed steps in their order, then holds every check against its limit. */
export function compute(sheet: TypedSheet, givens: Givens): Computed {
  const machine = new Machine(sheet, givens);
  const steps = new Map<string, number>();
  for (const [name, { typed, factor }] of sheet.steps) {
    const value = machine.evaluate(typed) * factor;
    machine.store(name, value);
    steps.set(name, value);
  }
  const checks = new Map<CheckNode, Judgement>();
  for (const [node, { comparison, left, right }] of sheet.checks) {
    checks.set(node, judge(comparison.operator, machine.evaluate(left), machine.evaluate(right)));
  }
  return { steps, checks, diagnostics: machine.diagnostics };
}

/** The values of a sheet, each in its slot, and the programs that read them. */
class Machine {
  readonly diagnostics: Diagnostic[] = [];
  private readonly slots: ReadonlyMap<string, number>;
  private readonly values: Float64Array;
  private readonly context: CompileContext;

  constructor(sheet: TypedSheet, { inputs, gases, functions, site }: Givens) {
    this.slots = new Map([...inputs.keys(), ...sheet.steps.keys()].map((name, slot) => [name, slot]));
    this.values = new Float64Array(this.slots.size);
    for (const [name, value] of inputs) this.store(name, value);
    this.context = { slots: this.slots, gases, functions, site };
  }

  store(name: string, value: number): void {
    this.values[this.slots.get(name) ?? -1] = value;
  }

  evaluate(typed: TypedExpression): number {
    const { value, diagnostics } = run(compile(typed, this.context), this.values);
    this.diagnostics.push(...diagnostics);
    return value;
  }
}
