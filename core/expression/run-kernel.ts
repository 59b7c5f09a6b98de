import type { AxisTable } from '../axes/axis.ts';
import type { Column } from '../axes/column.ts';
import { cellCount, gatherIndex, sameShape } from '../axes/shape.ts';
import type { GasModel } from '../gas/gas-model.ts';
import type { Argument } from '../library/function.ts';
import { BLOCK, type Arena, type Moving } from './arena.ts';
import * as loops from './block-loops.ts';
import * as functions from './function-loops.ts';
import type { Findings } from './findings.ts';
import { interpolateIn, type LookupTable } from './lookup-table.ts';
import type { GasesArgument, Instruction, Kernel, LibraryInstruction, MathInstruction } from './program.ts';
import { runCell } from './run-cell.ts';
import { inRange } from './run-library.ts';

/**
 * Runs a kernel over all its cells, in blocks. Where a block meets a value that cannot be held, or a function has
 * something to say, those cases are run again one by one, which finds the words for it.
 *
 * @param inputs one column for each input of the kernel, over some of its axes
 */
export function runKernel(
  kernel: Kernel,
  inputs: readonly Column[],
  axes: AxisTable,
  findings: Findings,
  arena: Arena,
): Column {
  const cells = cellCount(kernel.axes, axes);
  const run = new KernelRun(kernel, inputs, axes, cells, findings, arena);
  return cells === 1 ? run.single() : run.blocks();
}

class KernelRun {
  private readonly kernel: Kernel;
  private readonly inputs: readonly Column[];
  private readonly axes: AxisTable;
  private readonly cells: number;
  private readonly findings: Findings;
  private readonly arena: Arena;
  /** Where in its column each input has the value for a cell; by a rule where one will do. */
  private readonly places: readonly (Int32Array | 'same' | 'only')[];
  private readonly gasPlaces = new Map<readonly GasModel[], Int32Array>();
  private readonly flagged = new Uint8Array(BLOCK);
  private anyFlagged = false;

  constructor(
    kernel: Kernel,
    inputs: readonly Column[],
    axes: AxisTable,
    cells: number,
    findings: Findings,
    arena: Arena,
  ) {
    this.kernel = kernel;
    this.inputs = inputs;
    this.axes = axes;
    this.cells = cells;
    this.findings = findings;
    this.arena = arena;
    this.places = inputs.map((input) => {
      if (sameShape(input.axes, kernel.axes)) return 'same';
      return input.axes.length === 0 ? 'only' : gatherIndex(input.axes, kernel.axes, axes);
    });
  }

  single(): Column {
    return { axes: this.kernel.axes, data: Float64Array.of(this.cell(0)) };
  }

  blocks(): Column {
    const out = this.arena.column(this.cells);
    const registers = this.makeRegisters(out);
    for (let start = 0; start < this.cells; start += BLOCK) {
      const n = Math.min(BLOCK, this.cells - start);
      this.load(registers, start, n);
      let odd = false;
      for (const instruction of this.kernel.instructions) odd = this.execute(instruction, registers, start, n) || odd;
      const result = registers[this.kernel.result];
      if (result === undefined) throw new Error('a kernel has no result');
      if (result.data !== out) out.set(result.data.subarray(result.from, result.from + n), start);
      odd = loops.hasOdd({ data: out, from: start, fixed: false }, n) || odd;
      this.explain(odd, out, start, n);
    }
    return { axes: this.kernel.axes, data: out };
  }

  /** Inputs that vary along all axes are read where they are; the result is written where it belongs. */
  private makeRegisters(out: Float64Array): Moving[] {
    const { inputs, constants, registers, result } = this.kernel;
    const fixed = inputs.length + constants.length;
    return Array.from({ length: registers }, (_, i) => {
      const input = this.inputs[i];
      if (input !== undefined && this.places[i] === 'same') return { data: input.data, from: 0, fixed: false };
      if (i === result && i >= fixed) return { data: out, from: 0, fixed: false };
      const data = this.arena.register(i);
      const value = i < inputs.length ? input?.data[0] : constants[i - inputs.length];
      const isFixed = i < fixed && (input === undefined || input.axes.length === 0);
      if (isFixed) data.fill(value ?? Number.NaN);
      return { data, from: 0, fixed: isFixed };
    });
  }

  private load(registers: Moving[], start: number, n: number): void {
    const { inputs, constants, result } = this.kernel;
    this.inputs.forEach((input, i) => {
      const register = registers[i];
      const places = this.places[i];
      if (register === undefined) return;
      if (places === 'same') register.from = start;
      else if (places !== undefined && places !== 'only') {
        for (let k = 0; k < n; k += 1) register.data[k] = input.data[places[start + k]!]!;
      }
    });
    const target = registers[result];
    if (target !== undefined && result >= inputs.length + constants.length) target.from = start;
  }

  /** Runs one instruction on a block; true where it met a value that cannot be held. */
  private execute(instruction: Instruction, registers: readonly Moving[], start: number, n: number): boolean {
    const at = (register: number): Moving => registers[register]!;
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
      case 'chain':
        loops.chain(
          r,
          at(instruction.from),
          instruction.factors.map((factor) => at(factor).data[0]!),
          n,
        );
        return false;
      case 'choose': {
        const { left, right, yes, no } = instruction;
        return loops.choose(r, instruction.operator, [at(left), at(right), at(yes), at(no)], n);
      }
      case 'interpolate':
        return interpolateAll(r, at(instruction.from), instruction.table, n);
      case 'mathematics':
        return this.mathematics(instruction, registers, n);
      case 'library':
        this.library(instruction, registers, start, n);
        return false;
    }
  }

  private mathematics(
    { function: fn, arguments: args, to }: MathInstruction,
    registers: readonly Moving[],
    n: number,
  ): boolean {
    const r = registers[to]!;
    const operands = args.map((register) => registers[register]!);
    const fast = functions.mathematics(fn.name, r, operands, n);
    if (fast !== null) return fast;
    const values = args.map(() => 0);
    let odd = false;
    for (let k = 0; k < n; k += 1) {
      args.forEach((register, i) => (values[i] = registers[register]!.data[registers[register]!.from + k]!));
      odd = odd || values.some((value) => !Number.isFinite(value));
      r.data[r.from + k] = fn.evaluate(values).value;
    }
    return odd;
  }

  private library(instruction: LibraryInstruction, registers: readonly Moving[], start: number, n: number): void {
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
      if (result === undefined || result.notices.length > 0) {
        this.flagged[k] = 1;
        this.anyFlagged = true;
      }
    }
  }

  /** Runs the cases of a block again that have something to say: all where a value could not be held, else the flagged. */
  private explain(odd: boolean, out: Float64Array, start: number, n: number): void {
    if (!odd && !this.anyFlagged) return;
    for (let k = 0; k < n; k += 1) {
      const isSuspect = odd || this.flagged[k] === 1;
      if (isSuspect && this.findings.wantsMore()) out[start + k] = this.cell(start + k);
      else if (!Number.isFinite(out[start + k])) out[start + k] = Number.NaN;
    }
    this.flagged.fill(0);
    this.anyFlagged = false;
  }

  private cell(cell: number): number {
    const { constants, registers: count, instructions, result } = this.kernel;
    const registers = new Float64Array(count);
    this.inputs.forEach((input, i) => {
      const places = this.places[i];
      const place = places === undefined || places === 'same' ? cell : places === 'only' ? 0 : places[cell];
      registers[i] = input.data[place ?? 0] ?? Number.NaN;
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

function interpolateAll(r: Moving, x: Moving, table: LookupTable, n: number): boolean {
  let odd = false;
  for (let k = 0; k < n; k += 1) {
    const y = interpolateIn(table, x.data[x.from + k]!);
    r.data[r.from + k] = y;
    if (y - y !== 0) odd = true;
  }
  return odd;
}

/** Powers by products and roots where they are known, with the very digits of the general power. */
function raise(r: Moving, base: Moving, exponents: Moving, exponent: number | undefined, n: number): boolean {
  switch (exponent) {
    case 2:
      loops.square(r, base, n);
      return false;
    case 0.5:
      return functions.squareRoot(r, base, n);
    default:
      return functions.raise(r, base, exponents, n);
  }
}
