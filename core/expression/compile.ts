import type { GasModel } from '../gas/gas-model.ts';
import type { LibraryFunction, Parameter } from '../library/function.ts';
import { toSi } from '../units/convert.ts';
import type { Site } from '../units/site.ts';
import { CONSTANTS } from './constants.ts';
import { MATHEMATICS } from './mathematics.ts';
import { visit } from './names.ts';
import type { Instruction, LibraryArgument, Program } from './program.ts';
import type { Expression } from './tree.ts';
import type { TypedExpression } from './type-scope.ts';

/** Where a program finds what its names stand for. */
export interface CompileContext {
  /** Place of each quantity among the values that the program is run with. */
  readonly slots: ReadonlyMap<string, number>;
  readonly gases: ReadonlyMap<string, GasModel>;
  readonly functions: ReadonlyMap<string, LibraryFunction>;
  readonly site: Site;
}

/** Turns a checked expression into a flat program. What the check has let through cannot fail here. */
export function compile({ expression, factors }: TypedExpression, context: CompileContext): Program {
  return new Compiler(factors, context).compile(expression);
}

type Register = { readonly bank: 'input' | 'constant' | 'work'; readonly index: number };

/** An instruction whose registers are not numbered yet: the banks' sizes are known only at the end. */
type Emit = (number: (register: Register) => number) => Instruction;

class Compiler {
  private readonly factors: TypedExpression['factors'];
  private readonly context: CompileContext;
  private readonly inputs: { name: string; slot: number }[] = [];
  private readonly constants: number[] = [];
  private readonly emitted: Emit[] = [];
  private readonly free: number[] = [];
  private workRegisters = 0;

  constructor(factors: TypedExpression['factors'], context: CompileContext) {
    this.factors = factors;
    this.context = context;
  }

  compile(expression: Expression): Program {
    const result = this.value(expression);
    const starts = { input: 0, constant: this.inputs.length, work: this.inputs.length + this.constants.length };
    const number = ({ bank, index }: Register): number => starts[bank] + index;
    return {
      inputs: this.inputs,
      constants: this.constants,
      instructions: this.emitted.map((emit) => emit(number)),
      registers: starts.work + this.workRegisters,
      result: number(result),
    };
  }

  private value(expression: Expression): Register {
    switch (expression.node) {
      case 'number':
        return this.constant(expression.value);
      case 'quantity':
        return this.constant(toSi(expression.number, expression.unit, this.context.site));
      case 'name':
        return this.name(expression.name);
      case 'negate':
        return this.negate(expression);
      case 'binary':
        return this.binary(expression);
      case 'call':
        return this.call(expression);
      case 'text':
        throw new Error('a text stands for a value');
    }
  }

  private constant(value: number): Register {
    const known = this.constants.findIndex((constant) => Object.is(constant, value));
    return { bank: 'constant', index: known === -1 ? this.constants.push(value) - 1 : known };
  }

  private name(name: string): Register {
    const slot = this.context.slots.get(name);
    if (slot === undefined) {
      const constant = CONSTANTS.get(name);
      if (constant === undefined) throw new Error(`no value for ${name}`);
      return this.constant(constant.value);
    }
    const known = this.inputs.findIndex((input) => input.slot === slot);
    return { bank: 'input', index: known === -1 ? this.inputs.push({ name, slot }) - 1 : known };
  }

  private negate({ operand }: Expression & { node: 'negate' }): Register {
    const from = this.value(operand);
    const to = this.target([from]);
    this.emitted.push((number) => ({ op: 'negate', to: number(to), from: number(from) }));
    return to;
  }

  private binary({ operator, left, right, span }: Expression & { node: 'binary' }): Register {
    const [a, b] = [this.value(left), this.value(right)];
    const to = this.target([a, b]);
    const rightInputs = this.inputsOf(right);
    this.emitted.push((number) => ({
      op: operator,
      to: number(to),
      left: number(a),
      right: number(b),
      span,
      leftSpan: left.span,
      rightSpan: right.span,
      rightInputs,
    }));
    return to;
  }

  private call(call: Expression & { node: 'call' }): Register {
    const { span } = call;
    const argumentSpans = call.arguments.map((argument) => argument.span);
    const mathFunction = MATHEMATICS.get(call.function);
    if (mathFunction !== undefined) {
      const args = call.arguments.map((argument) => this.value(argument));
      const to = this.target(args);
      this.emitted.push((number) => ({
        op: 'mathematics',
        to: number(to),
        function: mathFunction,
        arguments: args.map(number),
        span,
        argumentSpans,
      }));
      return to;
    }
    const fn = this.context.functions.get(call.function);
    if (fn === undefined) throw new Error(`no function ${call.function}`);
    const args = call.arguments.map((argument, i) => this.argument(argument, fn.parameters[i]));
    const to = this.target(args.flatMap((argument) => ('fixed' in argument ? [] : [argument])));
    this.emitted.push((number) => ({
      op: 'library',
      to: number(to),
      function: fn,
      arguments: args.map((argument): LibraryArgument =>
        'fixed' in argument ? argument : { register: number(argument) },
      ),
      span,
      argumentSpans,
    }));
    return to;
  }

  private argument(
    argument: Expression,
    parameter: Parameter | undefined,
  ): Register | { readonly fixed: string | GasModel } {
    if (argument.node === 'text') return { fixed: argument.value };
    if (parameter?.kind.takes === 'gas' && argument.node === 'name') {
      const gas = this.context.gases.get(argument.name);
      if (gas === undefined) throw new Error(`no gas ${argument.name}`);
      return { fixed: gas };
    }
    const given = this.value(argument);
    const factor = this.factors.get(argument);
    if (factor === undefined) return given;
    const to = this.target([given]);
    this.emitted.push((number) => ({ op: 'scale', to: number(to), from: number(given), factor }));
    return to;
  }

  /** A register for a result; those of its operands are free from here on. */
  private target(operands: readonly Register[]): Register {
    for (const { bank, index } of operands) if (bank === 'work') this.free.push(index);
    return { bank: 'work', index: this.free.pop() ?? this.workRegisters++ };
  }

  /** Registers of the inputs that an expression reads; all of them have been numbered when it was compiled. */
  private inputsOf(expression: Expression): number[] {
    const slots = new Set<number | undefined>();
    visit(expression, (node) => {
      if (node.node === 'name') slots.add(this.context.slots.get(node.name));
    });
    return this.inputs.flatMap(({ slot }, i) => (slots.has(slot) ? [i] : []));
  }
}
