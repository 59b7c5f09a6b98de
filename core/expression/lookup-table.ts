import type { QuantityType } from '../units/dimension.ts';
import type { Site } from '../units/site.ts';
import type { Unit } from '../units/unit.ts';

/** One side of a table: its values in SI, what they are, and the unit in which messages name them. */
export interface TableColumn {
  readonly type: QuantityType;
  readonly values: Float64Array;
  readonly unit: Unit;
}

/** A table of a sheet that `interpolate` reads: y over rising x. */
export interface LookupTable {
  readonly name: string;
  readonly x: TableColumn;
  readonly y: TableColumn;
  /** What the units of its columns rest on. */
  readonly site: Site;
}

/** Straight line between the two points around `at`; NaN outside of the table, which never reaches beyond its ends. */
export function interpolateIn({ x, y }: LookupTable, at: number): number {
  const last = x.values.length - 1;
  if (!(at >= (x.values[0] ?? Number.NaN) && at <= (x.values[last] ?? Number.NaN))) return Number.NaN;
  let [low, high] = [0, last];
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if ((x.values[middle] ?? 0) <= at) low = middle;
    else high = middle;
  }
  const [x0, x1] = [x.values[low] ?? 0, x.values[high] ?? 0];
  const [y0, y1] = [y.values[low] ?? 0, y.values[high] ?? 0];
  return x1 === x0 ? y0 : y0 + ((y1 - y0) * (at - x0)) / (x1 - x0);
}
