import type { GasModel } from '../gas/gas-model.ts';
import type { Argument } from './function.ts';

/** Arguments have been checked against the parameters before a function runs, so one of the wrong kind is a bug. */
export function numberAt(args: readonly Argument[], index: number): number {
  const argument = args[index];
  if (typeof argument !== 'number') throw new Error(`argument ${index} is no number`);
  return argument;
}

export function textAt(args: readonly Argument[], index: number): string {
  const argument = args[index];
  if (typeof argument !== 'string') throw new Error(`argument ${index} is no text`);
  return argument;
}

/** A pipe size: `6` or `'3/4'`. */
export function sizeAt(args: readonly Argument[], index: number): number | string {
  const argument = args[index];
  if (typeof argument !== 'number' && typeof argument !== 'string') throw new Error(`argument ${index} is no size`);
  return argument;
}

export function gasAt(args: readonly Argument[], index: number): GasModel {
  const argument = args[index];
  if (typeof argument !== 'object') throw new Error(`argument ${index} is no gas`);
  return argument;
}
