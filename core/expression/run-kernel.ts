import type { AxisTable } from '../axes/axis.ts';
import type { Column } from '../axes/column.ts';
import { cellCount, gatherIndex, sameShape } from '../axes/shape.ts';
import type { GasModel } from '../gas/gas-model.ts';
import type { Argument } from '../library/function.ts';
import { power } from '../numeric/math.ts';
import * as loops from './block-loops.ts';
import type { Findings } from './findings.ts';
import { interpolateIn } from './lookup-table.ts';
import type { GasesArgument, Instruction, Kernel, LibraryInstruction, MathInstruction } from './program.ts';
import { runCell } from './run-cell.ts';
import { inRange } from './run-library.ts';

/** Cases that are computed side by side: few enough that their columns stay near the processor. */
export const BLOCK = 256;

/**
 * Runs a kernel over all its cells, in blocks. Where a block meets a value that cannot be held, or a function has
 * something to say, those cases are run again one by one, which finds the words for it.
 *
 * @param inputs one column for each input of the kernel, over some of its axes
 */
export function runKernel(kernel: Kernel, inputs: readonly Column[], axes: AxisTable, findings: Findings): Column {
  const cells = cellCount(kernel.axes, axes);
  const run = new KernelRun(kernel, inputs, axes, cells, findings);
  return cells === 1 ? run.single() : run.blocks();
}

type Mutable = { data: Float64Array; from: number };

class KernelRun {
  private readonly kernel: Kernel;
  private readonly inputs: readonly Column[];
  private readonly axes: AxisTable;
  private readonly cells: number;
  private readonly findings: Findings;
  /** Where in its column each input has the value for a cell; null where cell and value have the same place. */
  private readonly places: readonly (Int32Array | null)[];
  private readonly gasPlaces = new Map<readonly GasModel[], Int32Array>();
  private readonly flagged = new Uint8Array(BLOCK);

  constructor(kernel: Kernel, inputs: readonly Column[], axes: AxisTable, cells: number, findings: Findings) {
    this.kernel = kernel;
    this.inputs = inputs;
    this.axes = axes;
    this.cells = cells;
    this.findings = findings;
    this.places = inputs.map((input) =>
      sameShape(input.axes, kernel.axes) ? null : gatherIndex(input.axes, kernel.axes, axes),
    );
  }

  single(): Column {
    return { axes: this.kernel.axes, data: Float64Array.of(this.cell(0)) };
  }

  blocks(): Column {
    const out = new Float64Array(this.cells);
    const registers = this.makeRegisters(out);
    for (let start = 0; start < this.cells; start += BLOCK) {
      const n = Math.min(BLOCK, this.cells - start);
      this.load(registers, start, n);
      let odd = false;
      for (const instruction of this.kernel.instructions) odd = this.execute(instruction, registers, start, n) || odd;
      const result = registers[this.kernel.result];
      if (result === undefined) throw new Error('a kernel has no result');
      if (result.data !== out) out.set(result.data.subarray(result.from, result.from + n), start);
      odd = loops.hasOdd({ data: out, from: start }, n) || odd;
      this.explain(odd, out, start, n);
    }
    return { axes: this.kernel.axes, data: out };
  }

  /** Inputs that vary along all axes are read where they are; the result is written where it belongs. */
  private makeRegisters(out: Float64Array): Mutable[] {
    const { inputs, constants, registers, result } = this.kernel;
    const fixed = inputs.length + constants.length;
    return Array.from({ length: registers }, (_, i) => {
      const input = this.inputs[i];
      if (input !== undefined && this.places[i] === null) return { data: input.data, from: 0 };
      if (i === result && i >= fixed) return { data: out, from: 0 };
      const data = new Float64Array(BLOCK);
      const value = i < inputs.length ? input?.data[0] : constants[i - inputs.length];
      if (i < fixed && (input === undefined || input.axes.length === 0)) data.fill(value ?? Number.NaN);
      return { data, from: 0 };
    });
  }

  private load(registers: Mutable[], start: number, n: number): void {
    const { inputs, constants, result } = this.kernel;
    this.inputs.forEach((input, i) => {
      const register = registers[i];
      const places = this.places[i];
      if (register === undefined) return;
      if (places === null) register.from = start;
      else if (places !== undefined && input.axes.length > 0) {
        for (let k = 0; k < n; k += 1) register.data[k] = input.data[places[start + k]!]!;
      }
    });
    const target = registers[result];
    if (target !== undefined && result >= inputs.length + constants.length) target.from = start;
  }

  /** Runs one instruction on a block; true where it met a value that cannot be held. */
  private execute(instruction: Instruction, registers: readonly Mutable[], start: number, n: number): boolean {
    const at = (register: number): Mutable => registers[register]!;
    const r = at(instruction.to);
    switch (instruction.op) {
      case '+':
        loops.add(r, at(instruction.left), at(instruction.right), n);
        return false;
      case '-':
        loops.subtract(r, at(instruction.left), at(instruction.right), n);
        return false;
      case '*':
        loops.multiply(r, at(instruction.left), at(instruction.right), n);
        return false;
      case '/':
        return loops.divide(r, at(instruction.left), at(instruction.right), n);
      case '^':
        return raise(r, at(instruction.left), at(instruction.right), instruction.exponent, n);
      case 'negate':
        loops.negate(r, at(instruction.from), n);
        return false;
      case 'scale':
        loops.scale(r, at(instruction.from), instruction.factor, n);
        return false;
      case 'choose': {
        const { left, right, yes, no } = instruction;
        return loops.choose(r, instruction.operator, [at(left), at(right), at(yes), at(no)], n);
      }
      case 'interpolate':
        return loops.unary(r, at(instruction.from), (x) => interpolateIn(instruction.table, x), n);
      case 'mathematics':
        return this.mathematics(instruction, registers, n);
      case 'library':
        this.library(instruction, registers, start, n);
        return false;
    }
  }

  private mathematics(
    { function: fn, arguments: args, to }: MathInstruction,
    registers: readonly Mutable[],
    n: number,
  ): boolean {
    const r = registers[to]!;
    const [first, ...others] = args.map((register) => registers[register]!);
    if (first === undefined) throw new Error(`${fn.name} has no argument`);
    if (others.length === 0 && fn.unary !== undefined) return loops.unary(r, first, fn.unary, n);
    const [second] = others;
    if (others.length === 1 && second !== undefined && fn.binary !== undefined)
      return loops.binary(r, first, second, fn.binary, n);
    const values = args.map(() => 0);
    let odd = false;
    for (let k = 0; k < n; k += 1) {
      args.forEach((register, i) => (values[i] = registers[register]!.data[registers[register]!.from + k]!));
      odd = odd || values.some((value) => !Number.isFinite(value));
      r.data[r.from + k] = fn.evaluate(values).value;
    }
    return odd;
  }

  private library(instruction: LibraryInstruction, registers: readonly Mutable[], start: number, n: number): void {
    const r = registers[instruction.to]!;
    const args: Argument[] = instruction.arguments.map((argument) => ('fixed' in argument ? argument.fixed : 0));
    for (let k = 0; k < n; k += 1) {
      let known = true;
      instruction.arguments.forEach((argument, i) => {
        if ('register' in argument) {
          const register = registers[argument.register]!;
          const value = register.data[register.from + k]!;
          args[i] = value;
          if (value - value !== 0) known = false;
        } else if ('gases' in argument) args[i] = this.gas(argument, start + k);
      });
      const result = known && inRange(instruction, args) ? instruction.function.evaluate(args) : undefined;
      r.data[r.from + k] = result?.value ?? Number.NaN;
      if (result === undefined || result.notices.length > 0) this.flagged[k] = 1;
    }
  }

  /** Runs the cases of a block again that have something to say: all where a value could not be held, else the flagged. */
  private explain(odd: boolean, out: Float64Array, start: number, n: number): void {
    for (let k = 0; k < n; k += 1) {
      if (odd || this.flagged[k] === 1) out[start + k] = this.cell(start + k);
      this.flagged[k] = 0;
    }
  }

  private cell(cell: number): number {
    const { constants, registers: count, instructions, result } = this.kernel;
    const registers = new Float64Array(count);
    this.inputs.forEach((input, i) => {
      registers[i] = input.data[this.places[i]?.[cell] ?? cell] ?? Number.NaN;
    });
    registers.set(constants, this.inputs.length);
    const found = this.findings.at(cell, this.kernel.axes, this.axes);
    runCell(instructions, { registers, diagnostics: found.diagnostics, gasOf: (argument) => this.gas(argument, cell) });
    found.close();
    return registers[result] ?? Number.NaN;
  }

  private gas({ gases, axes }: GasesArgument, cell: number): GasModel {
    let places = this.gasPlaces.get(gases);
    if (places === undefined) {
      places = gatherIndex(axes, this.kernel.axes, this.axes);
      this.gasPlaces.set(gases, places);
    }
    const model = gases[places[cell] ?? 0];
    if (model === undefined) throw new Error('a gas is missing for a case');
    return model;
  }
}

/** Powers by products and roots where they are known, with the very digits of {@link power}. */
function raise(r: Mutable, base: Mutable, exponents: Mutable, exponent: number | undefined, n: number): boolean {
  switch (exponent) {
    case 2:
      loops.square(r, base, n);
      return false;
    case 3:
      loops.cube(r, base, n);
      return false;
    case 0.5:
      return loops.squareRoot(r, base, n);
    case undefined:
      return loops.binary(r, base, exponents, power, n);
    default:
      return loops.unary(r, base, (x) => power(x, exponent), n);
  }
}
