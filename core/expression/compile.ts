import type { Shape } from '../axes/shape.ts';
import type { LibraryFunction } from '../library/function.ts';
import type { Site } from '../units/site.ts';
import type { GasColumn } from './gas-column.ts';
import { KernelBuilder } from './kernel-builder.ts';
import type { Program, Source, Stage } from './program.ts';
import type { Call, Expression } from './tree.ts';
import type { AxisCall, TypedExpression } from './type-scope.ts';

/** Where a program finds what its names stand for. */
export interface CompileContext {
  /** Place of each quantity among the columns that the program is run with. */
  readonly slots: ReadonlyMap<string, number>;
  readonly gases: ReadonlyMap<string, GasColumn>;
  readonly functions: ReadonlyMap<string, LibraryFunction>;
  readonly site: Site;
}

/** Turns a checked expression into a program. What the check has let through cannot fail here. */
export function compile(typed: TypedExpression, context: CompileContext): Program {
  const compiler = new Compiler(typed, context);
  const result = compiler.source(typed.expression);
  return { stages: compiler.stages, temps: compiler.stages.length, result };
}

/** An equation of state costs some thousand sums. */
const LIBRARY_COST = 1000;

/** Work of a program, in operations on single values. */
export function workOf({ stages }: Program, cells: (axes: Shape) => number): number {
  return stages.reduce((sum, stage) => {
    if (stage.stage !== 'kernel') return sum;
    const { axes, instructions } = stage.kernel;
    const each = instructions.reduce((cost, { op }) => cost + (op === 'library' ? LIBRARY_COST : 1), 1);
    return sum + each * cells(axes);
  }, 0);
}

/** Lays out the stages of one program. */
export class Compiler {
  readonly stages: Stage[] = [];
  readonly typed: TypedExpression;
  readonly context: CompileContext;

  constructor(typed: TypedExpression, context: CompileContext) {
    this.typed = typed;
    this.context = context;
  }

  axesOf(expression: Expression): Shape {
    return this.typed.shapes.get(expression) ?? [];
  }

  /** A column that holds all values of an expression; what it takes to make it becomes stages. */
  source(expression: Expression): Source {
    const slot = expression.node === 'name' ? this.context.slots.get(expression.name) : undefined;
    if (expression.node === 'name' && slot !== undefined) return { slot, name: expression.name };
    const call = this.typed.calls.get(expression);
    if (call !== undefined && call.call !== 'interpolate' && expression.node === 'call')
      return this.alongAxes(expression, call);
    const kernel = new KernelBuilder(this, this.axesOf(expression)).build(expression);
    return this.push({ stage: 'kernel', kernel, to: this.stages.length });
  }

  private alongAxes({ arguments: [first] }: Call, call: Exclude<AxisCall, { call: 'interpolate' }>): Source {
    if (call.call === 'count') return this.push({ stage: 'count', axis: call.axis, to: this.stages.length });
    if (first === undefined) throw new Error('a call along an axis has no argument');
    const from = this.source(first);
    const to = this.stages.length;
    return call.call === 'reduce'
      ? this.push({ stage: 'reduce', how: call.how, over: call.over, from, to })
      : this.push({ stage: 'pick', axis: call.axis, index: call.index, from, to });
  }

  private push(stage: Stage): Source {
    this.stages.push(stage);
    return { temp: stage.to };
  }
}
