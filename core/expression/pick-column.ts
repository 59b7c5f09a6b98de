import type { AxisName, AxisTable } from '../axes/axis.ts';
import type { Column } from '../axes/column.ts';
import { lengths, withoutAxes } from '../axes/shape.ts';

/** The values at one point of an axis, over the remaining axes. */
export function pickColumn(column: Column, axis: AxisName, index: number, axes: AxisTable): Column {
  const sizes = lengths(column.axes, axes);
  const position = column.axes.indexOf(axis);
  const length = sizes[position] ?? 1;
  const inner = sizes.slice(position + 1).reduce((product, size) => product * size, 1);
  const data = new Float64Array(column.data.length / length);
  for (let start = 0; start < data.length; start += inner) {
    const from = start * length + index * inner;
    data.set(column.data.subarray(from, from + inner), start);
  }
  return { axes: withoutAxes(column.axes, [axis]), data };
}

/** The coordinates of an axis, as values along it. */
export function axisValues(name: AxisName, axes: AxisTable): Column {
  const axis = axes.get(name);
  if (axis === undefined || 'ids' in axis) throw new Error(`the axis ${name} has no values`);
  return { axes: [name], data: axis.coordinates };
}
