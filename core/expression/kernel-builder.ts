import { sameShape, type Shape } from '../axes/shape.ts';
import type { Parameter } from '../library/function.ts';
import { toSi } from '../units/convert.ts';
import type { Compiler } from './compile.ts';
import { constantValue } from './constant-value.ts';
import { CONSTANTS } from './constants.ts';
import { MATHEMATICS } from './mathematics.ts';
import { visit } from './names.ts';
import type { Instruction, Kernel, LibraryArgument, Source } from './program.ts';
import { numberRegisters, type Register } from './registers.ts';
import type { Call, Expression } from './tree.ts';

/** An instruction whose registers are not numbered yet: the sizes of the banks are known only at the end. */
export interface Draft {
  readonly operands: readonly Register[];
  readonly emit: (number: (register: Register) => number, to: number) => Instruction;
}

type Argument = { readonly register: Register } | Exclude<LibraryArgument, { readonly register: number }>;

/** Makes the instructions of one kernel. Equal terms are computed once. */
export class KernelBuilder {
  private readonly compiler: Compiler;
  private readonly axes: Shape;
  private readonly inputs: Source[] = [];
  private readonly constants: number[] = [];
  private readonly drafts: Draft[] = [];
  private readonly known = new Map<string, Register>();

  constructor(compiler: Compiler, axes: Shape) {
    this.compiler = compiler;
    this.axes = axes;
  }

  build(expression: Expression): Kernel {
    const result = this.operation(expression);
    const { axes, inputs, constants } = this;
    return { axes, inputs, constants, ...numberRegisters(this.drafts, result, inputs.length, constants.length) };
  }

  /** A part that varies along fewer axes than the kernel, and takes computing, is computed apart. */
  private value(expression: Expression): Register {
    const constant = constantValue(expression);
    if (constant !== undefined && Number.isFinite(constant)) return this.constant(constant);
    const isOperation = expression.node === 'binary' || expression.node === 'call' || expression.node === 'negate';
    const apart = isOperation && !sameShape(this.compiler.axesOf(expression), this.axes);
    return apart ? this.input(this.compiler.source(expression)) : this.operation(expression);
  }

  private operation(expression: Expression): Register {
    switch (expression.node) {
      case 'number':
        return this.constant(expression.value);
      case 'quantity':
        return this.constant(toSi(expression.number, expression.unit, this.compiler.context.site));
      case 'name':
        return this.name(expression);
      case 'negate':
        return this.negate(expression);
      case 'binary':
        return this.binary(expression);
      case 'call':
        return this.call(expression);
      case 'text':
      case 'comparison':
        throw new Error(`a ${expression.node} stands for a value`);
    }
  }

  private constant(value: number): Register {
    const known = this.constants.findIndex((constant) => Object.is(constant, value));
    return { bank: 'constant', index: known === -1 ? this.constants.push(value) - 1 : known };
  }

  private name(expression: Expression & { node: 'name' }): Register {
    const constant = CONSTANTS.get(expression.name);
    const isQuantity = this.compiler.context.slots.has(expression.name);
    if (constant !== undefined && !isQuantity) return this.constant(constant.value);
    if (!isQuantity) throw new Error(`no value for ${expression.name}`);
    return this.input(this.compiler.source(expression));
  }

  private input(source: Source): Register {
    const known = this.inputs.findIndex((input) => sameSource(input, source));
    return { bank: 'input', index: known === -1 ? this.inputs.push(source) - 1 : known };
  }

  private negate({ operand }: Expression & { node: 'negate' }): Register {
    const from = this.value(operand);
    return this.push(`-${key(from)}`, [from], (number, to) => ({ op: 'negate', to, from: number(from) }));
  }

  private binary(expression: Expression & { node: 'binary' }): Register {
    const { operator, left, right, span } = expression;
    const chained = this.chain(expression);
    if (chained !== null) return chained;
    const [a, b] = [this.value(left), this.value(right)];
    const reciprocal = operator === '/' && b.bank === 'constant' ? exactReciprocal(this.constants[b.index]) : null;
    if (reciprocal !== null) return this.times(a, reciprocal);
    const exponent = operator === '^' && b.bank === 'constant' ? this.constants[b.index] : undefined;
    const named = this.namedInputs(right);
    return this.push(`${key(a)}${operator}${key(b)}`, [a, b], (number, to) => ({
      op: operator,
      to,
      left: number(a),
      right: number(b),
      ...(exponent === undefined ? {} : { exponent }),
      span,
      leftSpan: left.span,
      rightSpan: right.span,
      rightInputs: named.map(({ name, register }) => ({ name, register: number(register) })),
    }));
  }

  /** A varying value times two or more that do not vary: one pass over the cases in the place of many. */
  private chain(expression: Expression & { node: 'binary' }): Register | null {
    if (this.axes.length === 0) return null;
    const factors: Register[] = [];
    let base: Expression = expression;
    for (let next = this.factorOf(base); next !== null; next = this.factorOf(base)) {
      factors.unshift(next.factor);
      ({ base } = next);
    }
    if (factors.length < 2) return null;
    const from = this.value(base);
    const { span } = expression;
    return this.push(`${key(from)}*${factors.map(key).join('*')}`, [from, ...factors], (number, to) => ({
      op: 'chain',
      to,
      from: number(from),
      factors: factors.map(number),
      span,
    }));
  }

  /** The last factor of a product that does not vary, and what it is multiplied with. */
  private factorOf(product: Expression): { readonly factor: Register; readonly base: Expression } | null {
    if (product.node !== 'binary') return null;
    const { operator, left, right } = product;
    const varies = (part: Expression): boolean => this.compiler.axesOf(part).length > 0;
    if (operator === '*' && varies(left) && !varies(right)) return { factor: this.value(right), base: left };
    if (operator === '*' && varies(right) && !varies(left)) return { factor: this.value(left), base: right };
    const divisor = operator === '/' && varies(left) ? exactReciprocal(constantValue(right)) : null;
    return divisor === null ? null : { factor: this.constant(divisor), base: left };
  }

  /** A value times a number that is fixed when the program is compiled. */
  private times(a: Register, factor: number): Register {
    return this.push(`${factor}x${key(a)}`, [a], (number, to) => ({ op: 'scale', to, from: number(a), factor }));
  }

  private call(call: Call): Register {
    const axisCall = this.compiler.typed.calls.get(call);
    if (axisCall?.call === 'interpolate') return this.interpolate(call, axisCall.table);
    if (axisCall !== undefined) return this.input(this.compiler.source(call));
    if (call.arguments[0]?.node === 'comparison') return this.choose(call, call.arguments[0]);
    return MATHEMATICS.has(call.function) ? this.mathematics(call) : this.library(call);
  }

  private choose({ arguments: [, yes, no] }: Call, comparison: Expression & { node: 'comparison' }): Register {
    if (yes === undefined || no === undefined) throw new Error('`where` has no values');
    const { operator } = comparison;
    const operands = [comparison.left, comparison.right, yes, no].map((operand) => this.value(operand));
    return this.push(`where${operator}${operands.map(key).join()}`, operands, (number, to) => {
      const [left = 0, right = 0, first = 0, second = 0] = operands.map(number);
      return { op: 'choose', to, operator, left, right, yes: first, no: second };
    });
  }

  private interpolate(
    { arguments: [, x], span }: Call,
    table: Extract<Instruction, { op: 'interpolate' }>['table'],
  ): Register {
    if (x === undefined) throw new Error('`interpolate` has no point');
    const from = this.scaled(x);
    return this.push(`${table.name}@${key(from)}`, [from], (number, to) => ({
      op: 'interpolate',
      to,
      from: number(from),
      table,
      span: x.span.file === span.file ? x.span : span,
    }));
  }

  private mathematics(call: Call): Register {
    const fn = MATHEMATICS.get(call.function);
    if (fn === undefined) throw new Error(`no function ${call.function}`);
    const args = call.arguments.map((argument) => this.scaled(argument));
    return this.push(`${fn.name}(${args.map(key).join()})`, args, (number, to) => ({
      op: 'mathematics',
      to,
      function: fn,
      arguments: args.map(number),
      span: call.span,
      argumentSpans: call.arguments.map((argument) => argument.span),
    }));
  }

  private library(call: Call): Register {
    const fn = this.compiler.context.functions.get(call.function);
    if (fn === undefined) throw new Error(`no function ${call.function}`);
    const args = call.arguments.map((argument, i) => this.argument(argument, fn.parameters[i]));
    const registers = args.flatMap((argument) => ('register' in argument ? [argument.register] : []));
    const words = call.arguments.map((argument) =>
      argument.node === 'text' || argument.node === 'name' ? textOf(argument) : '',
    );
    const name = `${fn.name}(${args.map((argument, i) => ('register' in argument ? key(argument.register) : words[i])).join()})`;
    return this.push(name, registers, (number, to) => ({
      op: 'library',
      to,
      function: fn,
      arguments: args.map((argument) => ('register' in argument ? { register: number(argument.register) } : argument)),
      span: call.span,
      argumentSpans: call.arguments.map((argument) => argument.span),
    }));
  }

  private argument(argument: Expression, parameter: Parameter | undefined): Argument {
    if (argument.node === 'text') return { fixed: argument.value };
    if (parameter?.kind.takes !== 'gas' || argument.node !== 'name') return { register: this.scaled(argument) };
    const gas = this.compiler.context.gases.get(argument.name);
    const [model] = gas?.models ?? [];
    if (gas === undefined || model === undefined) throw new Error(`no gas ${argument.name}`);
    return gas.axes.length === 0 ? { fixed: model } : { gases: gas.models, axes: gas.axes };
  }

  /** An argument in the measure of its parameter: radians where cycles are given, or the other way round. */
  private scaled(argument: Expression): Register {
    const given = this.value(argument);
    const factor = this.compiler.typed.factors.get(argument);
    if (factor === undefined) return given;
    return this.times(given, factor);
  }

  private push(name: string, operands: readonly Register[], emit: Draft['emit']): Register {
    const known = this.known.get(name);
    if (known !== undefined) return known;
    const register: Register = { bank: 'work', index: this.drafts.push({ operands, emit }) - 1 };
    this.known.set(name, register);
    return register;
  }

  /** The quantities that an expression reads, with their registers; all have one by the time it is compiled. */
  private namedInputs(expression: Expression): { name: string; register: Register }[] {
    const names = new Set<string>();
    visit(expression, (node) => {
      if (node.node === 'name') names.add(node.name);
    });
    return this.inputs.flatMap((input, index) =>
      'name' in input && names.has(input.name)
        ? [{ name: input.name, register: { bank: 'input' as const, index } }]
        : [],
    );
  }
}

/** 1/x where it has the very digits of the division: for powers of two. A product takes a fraction of the time. */
function exactReciprocal(x: number | undefined): number | null {
  if (x === undefined || x === 0) return null;
  const reciprocal = 1 / x;
  // The mantissa of a power of two is 1: its only digits in base two are 1 and zeros.
  const isPowerOfTwo = /^-?10*(?:\.0*)?$|^-?0\.0*1$/.test(x.toString(2));
  return isPowerOfTwo && Number.isFinite(reciprocal) ? reciprocal : null;
}

function key({ bank, index }: Register): string {
  return `${bank.charAt(0)}${index}`;
}

/** A text and a gas of the same name are two things. */
function textOf(argument: Expression & { node: 'text' | 'name' }): string {
  return argument.node === 'text' ? `'${argument.value}'` : argument.name;
}

function sameSource(a: Source, b: Source): boolean {
  return 'slot' in a ? 'slot' in b && a.slot === b.slot : 'temp' in b && a.temp === b.temp;
}
