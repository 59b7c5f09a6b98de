import { axisPoint, pointText, type AxisTable } from './axis.ts';
import { cellPosition, type Shape } from './shape.ts';

/** Where a cell stands, by axis: `{ condition: 'C07', speed: 1130 }`; numbers are in the axis's unit. */
export function cellPoint(cell: number, shape: Shape, axes: AxisTable): Readonly<Record<string, string | number>> {
  const position = cellPosition(cell, shape, axes);
  return Object.fromEntries(
    shape.flatMap((name, i) => {
      const axis = axes.get(name);
      return axis === undefined ? [] : [[name, axisPoint(axis, position[i] ?? 0)]];
    }),
  );
}

/** Where a cell stands, as people say it: `C07, 1130 rpm, order 6`; empty for a single value. */
export function cellText(cell: number, shape: Shape, axes: AxisTable): string {
  const position = cellPosition(cell, shape, axes);
  return shape
    .flatMap((name, i) => {
      const axis = axes.get(name);
      return axis === undefined ? [] : [pointText(axis, position[i] ?? 0)];
    })
    .join(', ');
}
