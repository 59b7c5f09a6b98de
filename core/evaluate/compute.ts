import type { AxisTable } from '../axes/axis.ts';
import { single, type Column } from '../axes/column.ts';
import { cellCount } from '../axes/shape.ts';
import { error, type Diagnostic, type Span } from '../diagnostics/diagnostic.ts';
import { Arena } from '../expression/arena.ts';
import { compile, workOf, type CompileContext } from '../expression/compile.ts';
import type { GasColumn } from '../expression/gas-column.ts';
import { run } from '../expression/run.ts';
import { shapeOf, type TypedExpression } from '../expression/type-scope.ts';
import type { LibraryFunction } from '../library/function.ts';
import type { CheckNode, FigureNode } from '../sheet/document.ts';
import { LIMITS } from '../sheet/limits.ts';
import type { Site } from '../units/site.ts';
import type { TypedSheet } from './check-types.ts';
import { judgeColumn, type ColumnJudgement } from './judge-column.ts';

/** What formulas are evaluated with. */
export interface Givens {
  /** SI values of the inputs, by name. */
  readonly inputs: ReadonlyMap<string, Column>;
  readonly gases: ReadonlyMap<string, GasColumn>;
  readonly functions: ReadonlyMap<string, LibraryFunction>;
  readonly site: Site;
  readonly axes: AxisTable;
}

export interface Computed {
  /** SI values of the steps, by name. NaN where a fault has been reported, there or behind it. */
  readonly steps: ReadonlyMap<string, Column>;
  readonly checks: ReadonlyMap<CheckNode, ColumnJudgement>;
  readonly figures: ReadonlyMap<FigureNode, FigureColumns>;
  readonly diagnostics: readonly Diagnostic[];
}

export interface FigureColumns {
  readonly of: Column;
  readonly limit?: Column;
}

/**
 * Evaluates all typed steps in their order, then holds every check against its limit.
 *
 * @param arena memory for the results; whoever computes again and again gives it again
 */
export function compute(sheet: TypedSheet, givens: Givens, arena = new Arena()): Computed {
  const machine = new Machine(sheet, givens, arena);
  const steps = new Map<string, Column>();
  for (const [name, { typed, factor }] of sheet.steps) {
    const column = scaled(machine.evaluate(typed), factor);
    machine.store(name, column);
    steps.set(name, column);
  }
  const checks = new Map<CheckNode, ColumnJudgement>();
  for (const [node, { comparison, left, right }] of sheet.checks) {
    const sides = [machine.evaluate(left), machine.evaluate(right)] as const;
    checks.set(node, judgeColumn(comparison.operator, ...sides, givens.axes));
  }
  const figures = new Map<FigureNode, FigureColumns>();
  for (const [node, { of, limit }] of sheet.figures) {
    figures.set(node, {
      of: scaled(machine.evaluate(of.typed), of.factor),
      ...(limit === undefined ? {} : { limit: scaled(machine.evaluate(limit.typed), limit.factor) }),
    });
  }
  return { steps, checks, figures, diagnostics: machine.diagnostics };
}

function scaled(column: Column, factor: number): Column {
  return factor === 1 ? column : { axes: column.axes, data: column.data.map((value) => value * factor) };
}

/** The values of a sheet, each in its slot, and the programs that read them. */
class Machine {
  readonly diagnostics: Diagnostic[] = [];
  private readonly slots: ReadonlyMap<string, number>;
  private readonly columns: (Column | undefined)[] = [];
  private readonly context: CompileContext;
  private readonly axes: AxisTable;
  private readonly arena: Arena;
  private work = 0;
  private cells = 0;

  constructor(sheet: TypedSheet, { inputs, gases, functions, site, axes }: Givens, arena: Arena) {
    this.arena = arena;
    this.slots = new Map([...inputs.keys(), ...sheet.steps.keys()].map((name, slot) => [name, slot]));
    this.axes = axes;
    this.context = { slots: this.slots, gases, functions, site };
    for (const [name, column] of inputs) this.store(name, column);
  }

  store(name: string, column: Column): void {
    const slot = this.slots.get(name);
    if (slot !== undefined) this.columns[slot] = column;
  }

  evaluate(typed: TypedExpression): Column {
    const { span } = typed.expression;
    const shape = shapeOf(typed);
    const program = compile(typed, this.context);
    this.cells += cellCount(shape, this.axes);
    this.work += workOf(program, (axes) => cellCount(axes, this.axes));
    if (this.cells > LIMITS.cells)
      return this.refuse(span, `the sheet has more than ${LIMITS.cells} values over its axes`);
    if (this.work > LIMITS.work) return this.refuse(span, 'the sheet takes more computing than a sheet may');
    const { column, diagnostics } = run(program, this.columns, this.axes, this.arena);
    this.diagnostics.push(...diagnostics);
    return column;
  }

  /** Said once, at the formula that goes beyond; what follows is not computed. */
  private refuse(span: Span, message: string): Column {
    if (!this.diagnostics.some(({ code }) => code === 'LIMIT_EXCEEDED')) {
      this.diagnostics.push(
        error('LIMIT_EXCEEDED', span, message, {
          hints: ['take fewer points along an axis, bring an axis down by `max_over(…)` earlier, or split the sheet'],
        }),
      );
    }
    return single(Number.NaN);
  }
}
