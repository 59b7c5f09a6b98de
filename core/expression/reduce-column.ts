import type { AxisName, AxisTable } from '../axes/axis.ts';
import type { Column } from '../axes/column.ts';
import { cellCount, gatherIndex, withoutAxes } from '../axes/shape.ts';
import type { Reduction } from './axis-functions.ts';

/**
 * Brings the values along some axes down to one each. A value that is not known makes the result unknown: the largest of
 * values of which one is missing is no value to rely on.
 */
export function reduceColumn(column: Column, over: readonly AxisName[], how: Reduction, axes: AxisTable): Column {
  const shape = withoutAxes(column.axes, over);
  const places = gatherIndex(shape, column.axes, axes);
  const data = new Float64Array(cellCount(shape, axes)).fill(START[how]);
  const step = STEP[how];
  for (let cell = 0; cell < places.length; cell += 1) {
    const place = places[cell] ?? 0;
    data[place] = step(data[place] ?? Number.NaN, column.data[cell] ?? Number.NaN);
  }
  if (how === 'mean') {
    const each = column.data.length / data.length;
    for (let place = 0; place < data.length; place += 1) data[place] = (data[place] ?? Number.NaN) / each;
  }
  return { axes: shape, data };
}

const START: Readonly<Record<Reduction, number>> = {
  max: Number.NEGATIVE_INFINITY,
  min: Number.POSITIVE_INFINITY,
  mean: 0,
  sum: 0,
  envelope: 0,
};

const sum = (total: number, value: number): number => total + value;

/** `Math.max` and `Math.min` hand NaN on. */
const STEP: Readonly<Record<Reduction, (soFar: number, value: number) => number>> = {
  max: (soFar, value) => Math.max(soFar, value),
  min: (soFar, value) => Math.min(soFar, value),
  mean: sum,
  sum,
  envelope: (soFar, value) => Math.max(soFar, Math.abs(value)),
};
