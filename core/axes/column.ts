import type { AxisTable } from './axis.ts';
import { lengths, type Shape } from './shape.ts';

/** The values of one quantity over its axes, the last axis running fastest; a single value has no axes. */
export interface Column {
  readonly axes: Shape;
  /** SI values; NaN where a fault has been reported. */
  readonly data: Float64Array;
}

export function single(value: number): Column {
  return { axes: [], data: Float64Array.of(value) };
}

/** The value of a column without axes. */
export function onlyValue({ data }: Column): number {
  return data[0] ?? Number.NaN;
}

export type Nested = number | readonly Nested[];

/** The values as JSON carries them: a number, or arrays nested by axis; each value passed through `convert`. */
export function nested({ axes, data }: Column, table: AxisTable, convert: (si: number) => number): Nested {
  const sizes = lengths(axes, table);
  const build = (depth: number, start: number, span: number): Nested => {
    const size = sizes[depth];
    if (size === undefined) return convert(data[start] ?? Number.NaN);
    const step = span / size;
    return Array.from({ length: size }, (_, i) => build(depth + 1, start + i * step, step));
  };
  return build(0, 0, data.length);
}

/** The cells with the least and the greatest value. */
export function extremes({ data }: Column): { readonly least: number; readonly greatest: number } {
  let [least, greatest] = [0, 0];
  for (let cell = 1; cell < data.length; cell += 1) {
    if (exceeds(data[least] ?? 0, data[cell] ?? 0)) least = cell;
    if (exceeds(data[cell] ?? 0, data[greatest] ?? 0)) greatest = cell;
  }
  return { least, greatest };
}

/** Engines differ in the last bits, and must not differ in which of two equal values they name: the first one counts. */
const ROUNDING = 1e-11;

export function exceeds(a: number, b: number): boolean {
  return a > b && a - b > ROUNDING * Math.max(Math.abs(a), Math.abs(b));
}
