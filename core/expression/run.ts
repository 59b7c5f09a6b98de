import { error, type Diagnostic } from '../diagnostics/diagnostic.ts';
import { arithmetic } from './arithmetic.ts';
import type { ArithmeticInstruction, Instruction, MathInstruction, Program } from './program.ts';
import { callLibrary } from './run-library.ts';
import { noticeDiagnostics, notFinite } from './notices.ts';

export interface RunResult {
  /** SI value; NaN where a fault is reported, or where a value that is read is itself NaN. */
  readonly value: number;
  readonly diagnostics: readonly Diagnostic[];
}

/**
 * Runs a program on one set of values.
 *
 * A value of NaN stands for "not known": it is handed on without a word, so that one fault is reported once, where it
 * arises, and independent faults of one expression are all reported.
 *
 * @param values SI values by slot
 */
export function run(program: Program, values: Float64Array): RunResult {
  const registers = new Float64Array(program.registers);
  program.inputs.forEach(({ slot }, i) => {
    registers[i] = values[slot] ?? Number.NaN;
  });
  registers.set(program.constants, program.inputs.length);
  const diagnostics: Diagnostic[] = [];
  for (const instruction of program.instructions) {
    registers[instruction.to] = execute(instruction, { program, registers, diagnostics });
  }
  return { value: at(registers, program.result), diagnostics };
}

interface State {
  readonly program: Program;
  readonly registers: Float64Array;
  readonly diagnostics: Diagnostic[];
}

function execute(instruction: Instruction, state: State): number {
  const { registers } = state;
  switch (instruction.op) {
    case 'negate':
      return -at(registers, instruction.from);
    case 'scale':
      return at(registers, instruction.from) * instruction.factor;
    case 'mathematics':
      return callMathematics(instruction, state);
    case 'library':
      return callLibrary(instruction, registers, state.diagnostics);
    case '+':
    case '-':
    case '*':
    case '/':
    case '^':
      return calculate(instruction, state);
  }
}

function calculate(instruction: ArithmeticInstruction, state: State): number {
  const [a, b] = [at(state.registers, instruction.left), at(state.registers, instruction.right)];
  if (Number.isNaN(a) || Number.isNaN(b)) return Number.NaN;
  const fault = operandFault(instruction, a, b, state);
  if (fault !== null) {
    state.diagnostics.push(fault);
    return Number.NaN;
  }
  const result = arithmetic(instruction.op, a, b);
  if (Number.isFinite(result)) return result;
  state.diagnostics.push(notFinite(instruction.span));
  return Number.NaN;
}

function operandFault(instruction: ArithmeticInstruction, a: number, b: number, state: State): Diagnostic | null {
  const { op, leftSpan, rightSpan } = instruction;
  if (op === '/' && b === 0) {
    return error('DIVISION_BY_ZERO', rightSpan, 'this divisor is zero', { hints: zeroHints(instruction, state) });
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
function zeroHints({ rightInputs }: ArithmeticInstruction, { program, registers }: State): string[] {
  const named = (inputs: readonly number[]): string[] => inputs.flatMap((input) => program.inputs[input]?.name ?? []);
  const zero = named(rightInputs.filter((input) => registers[input] === 0));
  if (zero.length > 0) return [`${list(zero)} ${zero.length > 1 ? 'are' : 'is'} zero`];
  return rightInputs.length > 0 ? [`it is made of ${list(named(rightInputs))}`] : [];
}

function list(names: readonly string[]): string {
  const quoted = names.map((name) => `\`${name}\``);
  return quoted.length < 2 ? quoted.join('') : `${quoted.slice(0, -1).join(', ')} and ${quoted.at(-1)}`;
}

function callMathematics(instruction: MathInstruction, { registers, diagnostics }: State): number {
  const args = instruction.arguments.map((register) => at(registers, register));
  if (args.some(Number.isNaN)) return Number.NaN;
  const { value, notices } = instruction.function.evaluate(args);
  const found = noticeDiagnostics(notices, instruction);
  diagnostics.push(...found);
  if (Number.isFinite(value)) return value;
  if (found.length === 0) diagnostics.push(notFinite(instruction.span));
  return Number.NaN;
}

function at(registers: Float64Array, register: number): number {
  return registers[register] ?? Number.NaN;
}
