import { AXIS_NAMES, axisLength, type AxisName, type AxisTable } from './axis.ts';

/** The axes along which a quantity varies, in the order of AXIS_NAMES; none for a single value. */
export type Shape = readonly AxisName[];

export const SCALAR: Shape = [];

/** The axes of either: what an operation on both varies along. */
export function unionShape(a: Shape, b: Shape): Shape {
  if (a.length === 0 || sameShape(a, b)) return b;
  if (b.length === 0) return a;
  return AXIS_NAMES.filter((name) => a.includes(name) || b.includes(name));
}

export function unionShapes(shapes: readonly Shape[]): Shape {
  return shapes.reduce<Shape>(unionShape, SCALAR);
}

export function withoutAxes(shape: Shape, axes: readonly AxisName[]): Shape {
  return shape.filter((name) => !axes.includes(name));
}

export function sameShape(a: Shape, b: Shape): boolean {
  return a.length === b.length && a.every((name, i) => name === b[i]);
}

/** Length of each axis of a shape. */
export function lengths(shape: Shape, axes: AxisTable): number[] {
  return shape.map((name) => {
    const axis = axes.get(name);
    if (axis === undefined) throw new Error(`no axis ${name}`);
    return axisLength(axis);
  });
}

/** Number of values in a shape. */
export function cellCount(shape: Shape, axes: AxisTable): number {
  return lengths(shape, axes).reduce((product, length) => product * length, 1);
}

/**
 * Where the values of a smaller shape stand in a larger one: for each cell of `to`, the index of the cell of `from` that
 * agrees with it along all axes of `from`.
 */
export function gatherIndex(from: Shape, to: Shape, axes: AxisTable): Int32Array {
  const known = KNOWN.get(axes) ?? new Map<string, Int32Array>();
  KNOWN.set(axes, known);
  const key = `${from.join()} ${to.join()}`;
  const index = known.get(key) ?? makeGatherIndex(from, to, axes);
  known.set(key, index);
  return index;
}

/** The same few pairs of shapes come up in every formula of a sheet. */
const KNOWN = new WeakMap<AxisTable, Map<string, Int32Array>>();

function makeGatherIndex(from: Shape, to: Shape, axes: AxisTable): Int32Array {
  const sizes = lengths(to, axes);
  const strides = stridesIn(from, to, axes);
  const index = new Int32Array(sizes.reduce((product, size) => product * size, 1));
  const at = sizes.map(() => 0);
  let source = 0;
  for (let cell = 0; cell < index.length; cell += 1) {
    index[cell] = source;
    for (let axis = sizes.length - 1; axis >= 0; axis -= 1) {
      const stride = strides[axis] ?? 0;
      const next = (at[axis] ?? 0) + 1;
      if (next < (sizes[axis] ?? 1)) {
        at[axis] = next;
        source += stride;
        break;
      }
      source -= stride * (next - 1);
      at[axis] = 0;
    }
  }
  return index;
}

/** For each axis of `to`, how far a step along it goes in the values of `from`: not at all along an axis it has not. */
function stridesIn(from: Shape, to: Shape, axes: AxisTable): number[] {
  const sizes = lengths(from, axes);
  return to.map((name) => {
    const position = from.indexOf(name);
    return position === -1 ? 0 : sizes.slice(position + 1).reduce((product, size) => product * size, 1);
  });
}

/** Position of a cell along each axis of its shape. */
export function cellPosition(cell: number, shape: Shape, axes: AxisTable): number[] {
  const position: number[] = [];
  let rest = cell;
  for (const size of lengths(shape, axes).toReversed()) {
    position.unshift(rest % size);
    rest = Math.floor(rest / size);
  }
  return position;
}

/** The cell of a smaller shape that agrees with a cell of a larger one; null where `to` varies along an axis that `from` lacks. */
export function projectCell(cell: number, from: Shape, to: Shape, axes: AxisTable): number | null {
  const position = cellPosition(cell, from, axes);
  const sizes = lengths(to, axes);
  let projected = 0;
  for (const [i, name] of to.entries()) {
    const at = from.indexOf(name);
    if (at === -1) return null;
    projected = projected * (sizes[i] ?? 1) + (position[at] ?? 0);
  }
  return projected;
}
