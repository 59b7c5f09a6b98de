import { error, type Diagnostic } from '../diagnostics/diagnostic.ts';
import type { GasModel } from '../gas/gas-model.ts';
import { fromSi } from '../units/convert.ts';
import { printNumber } from '../units/print.ts';
import { arithmetic } from './arithmetic.ts';
import { compareNumbers } from './compare-numbers.ts';
import { interpolateIn } from './lookup-table.ts';
import { noticeDiagnostics, notFinite } from './notices.ts';
import type {
  ArithmeticInstruction,
  ChainInstruction,
  GasesArgument,
  Instruction,
  InterpolateInstruction,
  MathInstruction,
} from './program.ts';
import { callLibrary } from './run-library.ts';

/** One case of a kernel: a number in each register, and the gas that holds for it. */
export interface Cell {
  readonly registers: Float64Array;
  readonly gasOf: (argument: GasesArgument) => GasModel;
  readonly diagnostics: Diagnostic[];
}

/**
 * Runs instructions on one case, and says what is wrong where something is.
 *
 * A value of NaN stands for "not known": it is handed on without a word, so that one fault is reported once, where it
 * arises, and independent faults of one expression are all reported.
 */
export function runCell(instructions: readonly Instruction[], cell: Cell): void {
  for (const instruction of instructions) cell.registers[instruction.to] = execute(instruction, cell);
}

function execute(instruction: Instruction, cell: Cell): number {
  const { registers } = cell;
  switch (instruction.op) {
    case 'negate':
      return -at(registers, instruction.from);
    case 'scale':
      return at(registers, instruction.from) * instruction.factor;
    case 'chain':
      return multiplyChain(instruction, cell);
    case 'choose': {
      const { operator, left, right, yes, no } = instruction;
      const holds = compareNumbers(operator, at(registers, left), at(registers, right));
      const known = ![left, right, yes, no].some((register) => Number.isNaN(at(registers, register)));
      return known ? at(registers, holds ? yes : no) : Number.NaN;
    }
    case 'mathematics':
      return callMathematics(instruction, cell);
    case 'interpolate':
      return interpolate(instruction, cell);
    case 'library':
      return callLibrary(instruction, cell);
    case '+':
    case '-':
    case '*':
    case '/':
    case '^':
      return calculate(instruction, cell);
  }
}

function multiplyChain({ from, factors, span }: ChainInstruction, { registers, diagnostics }: Cell): number {
  const product = factors.reduce((value, factor) => value * at(registers, factor), at(registers, from));
  const isKnown = [from, ...factors].every((register) => !Number.isNaN(at(registers, register)));
  if (Number.isFinite(product) || !isKnown) return product;
  diagnostics.push(notFinite(span));
  return Number.NaN;
}

function calculate(instruction: ArithmeticInstruction, cell: Cell): number {
  const [a, b] = [at(cell.registers, instruction.left), at(cell.registers, instruction.right)];
  if (Number.isNaN(a) || Number.isNaN(b)) return Number.NaN;
  const fault = operandFault(instruction, a, b, cell);
  if (fault !== null) {
    cell.diagnostics.push(fault);
    return Number.NaN;
  }
  const result = arithmetic(instruction.op, a, b);
  if (Number.isFinite(result)) return result;
  cell.diagnostics.push(notFinite(instruction.span));
  return Number.NaN;
}

function operandFault(instruction: ArithmeticInstruction, a: number, b: number, cell: Cell): Diagnostic | null {
  const { op, leftSpan, rightSpan } = instruction;
  if (op === '/' && b === 0) {
    return error('DIVISION_BY_ZERO', rightSpan, 'this divisor is zero', { hints: zeroHints(instruction, cell) });
  }
  if (op !== '^') return null;
  if (a === 0 && b < 0) {
    return error('DIVISION_BY_ZERO', leftSpan, 'zero has a negative exponent', {
      hints: ['x^(-n) is 1/x^n, which has no value at zero'],
    });
  }
  if (a < 0 && !Number.isInteger(b)) {
    return error('DOMAIN', leftSpan, 'a negative number has an exponent that is not whole', {
      hints: ['only whole powers of negative numbers are real'],
    });
  }
  return null;
}

/** Which quantities make the divisor zero: those that are zero, or all where it is a difference that vanishes. */
function zeroHints({ rightInputs }: ArithmeticInstruction, { registers }: Cell): string[] {
  const zero = rightInputs.filter(({ register }) => registers[register] === 0);
  if (zero.length > 0) return [`${list(zero)} ${zero.length > 1 ? 'are' : 'is'} zero`];
  return rightInputs.length > 0 ? [`it is made of ${list(rightInputs)}`] : [];
}

function list(named: ArithmeticInstruction['rightInputs']): string {
  const quoted = named.map(({ name }) => `\`${name}\``);
  return quoted.length < 2 ? quoted.join('') : `${quoted.slice(0, -1).join(', ')} and ${quoted.at(-1)}`;
}

function callMathematics(instruction: MathInstruction, { registers, diagnostics }: Cell): number {
  const args = instruction.arguments.map((register) => at(registers, register));
  if (args.some(Number.isNaN)) return Number.NaN;
  const { value, notices } = instruction.function.evaluate(args);
  const found = noticeDiagnostics(notices, instruction);
  diagnostics.push(...found);
  if (Number.isFinite(value)) return value;
  if (found.length === 0) diagnostics.push(notFinite(instruction.span));
  return Number.NaN;
}

function interpolate({ from, table, span }: InterpolateInstruction, { registers, diagnostics }: Cell): number {
  const x = at(registers, from);
  const y = interpolateIn(table, x);
  if (!Number.isNaN(y) || Number.isNaN(x)) return y;
  const { unit, values } = table.x;
  const shown = (si: number): string =>
    `${printNumber(fromSi(si, unit, table.site))}${unit.text === '1' ? '' : ` ${unit.text}`}`;
  diagnostics.push(
    error('LOOKUP_MISSING', span, `the table \`${table.name}\` does not reach ${shown(x)}`, {
      hints: [`it runs from ${shown(values[0] ?? 0)} to ${shown(values.at(-1) ?? 0)}, and is not extended beyond`],
    }),
  );
  return Number.NaN;
}

function at(registers: Float64Array, register: number): number {
  return registers[register] ?? Number.NaN;
}
