import type { Draft } from './kernel-builder.ts';
import type { Instruction } from './program.ts';

/** A value of a kernel before registers are numbered; those of the work bank are named by the instruction that makes them. */
export interface Register {
  readonly bank: 'input' | 'constant' | 'work';
  readonly index: number;
}

export interface Numbered {
  readonly instructions: readonly Instruction[];
  readonly registers: number;
  readonly result: number;
}

/**
 * Numbers the registers of a kernel: inputs, then constants, then intermediate results. A register serves again as soon
 * as its value has been read for the last time, so that the columns in use stay few and near.
 */
export function numberRegisters(
  drafts: readonly Draft[],
  result: Register,
  inputs: number,
  constants: number,
): Numbered {
  const lastUse = lastUses(drafts, result);
  const free: number[] = [];
  const given: number[] = [];
  let next = inputs + constants;
  const number = ({ bank, index }: Register): number => {
    if (bank === 'input') return index;
    return bank === 'constant' ? inputs + index : (given[index] ?? -1);
  };
  const instructions = drafts.map(({ operands, emit }, i) => {
    const read = [...new Set(operands.filter(({ bank }) => bank === 'work').map(({ index }) => index))];
    for (const index of read) if (lastUse[index] === i) free.push(given[index] ?? -1);
    const to = free.pop() ?? next++;
    given[i] = to;
    return emit(number, to);
  });
  return { instructions, registers: next, result: number(result) };
}

function lastUses(drafts: readonly Draft[], result: Register): number[] {
  const last = drafts.map((_, i) => i);
  drafts.forEach(({ operands }, i) => {
    for (const { bank, index } of operands) if (bank === 'work') last[index] = i;
  });
  if (result.bank === 'work') last[result.index] = drafts.length;
  return last;
}
