import { roundTo } from '../numeric/round.ts';
import { fromSi } from '../units/convert.ts';
import type { QuantityType } from '../units/dimension.ts';
import { NO_SITE } from '../units/site.ts';
import type { Unit } from '../units/unit.ts';

/** Along what a quantity may vary, in the order in which arrays nest: conditions outermost. */
export const AXIS_NAMES = ['condition', 'speed', 'harmonic', 'angle', 'place'] as const;

export type AxisName = (typeof AXIS_NAMES)[number];

export function isAxisName(name: string): name is AxisName {
  return (AXIS_NAMES as readonly string[]).includes(name);
}

/** An axis whose points have names: the operating conditions. */
export interface NamedAxis {
  readonly name: AxisName;
  readonly ids: readonly string[];
}

/** An axis whose points are values: speeds, orders, angles, places. */
export interface NumericAxis {
  readonly name: AxisName;
  /** SI values, rising. */
  readonly coordinates: Float64Array;
  readonly type: QuantityType;
  /** Unit in which its points are named. */
  readonly unit: Unit;
}

export type Axis = NamedAxis | NumericAxis;

/** All axes of a sheet; a sheet has at most one of each name. */
export type AxisTable = ReadonlyMap<AxisName, Axis>;

export function axisLength(axis: Axis): number {
  return 'ids' in axis ? axis.ids.length : axis.coordinates.length;
}

/** Name or value of a point, as JSON carries it: a value in the axis's unit, freed of the noise of the conversion. */
export function axisPoint(axis: Axis, index: number): string | number {
  if ('ids' in axis) return axis.ids[index] ?? '';
  return roundTo(fromSi(axis.coordinates[index] ?? Number.NaN, axis.unit, NO_SITE), 12);
}

export function axisPoints(axis: Axis): readonly (string | number)[] {
  return Array.from({ length: axisLength(axis) }, (_, index) => axisPoint(axis, index));
}

/** A point as messages and reports name it: `C07`, `1130 rpm`, `order 6`. */
export function pointText(axis: Axis, index: number): string {
  const point = axisPoint(axis, index);
  if ('ids' in axis) return String(point);
  if (axis.name === 'harmonic') return `order ${point}`;
  return axis.unit.text === '1' ? `${axis.name} ${point}` : `${point} ${axis.unit.text}`;
}

/** Whether two axes have the same points. */
export function sameAxis(a: Axis, b: Axis): boolean {
  if ('ids' in a || 'ids' in b) {
    return 'ids' in a && 'ids' in b && a.ids.length === b.ids.length && a.ids.every((id, i) => id === b.ids[i]);
  }
  if (a.coordinates.length !== b.coordinates.length) return false;
  return a.coordinates.every((value, i) => sameCoordinate(value, b.coordinates[i] ?? Number.NaN));
}

/** Coordinates come out of sums of steps and of conversions, so they are compared within their rounding. */
const ROUNDING = 1e-9;

export function sameCoordinate(a: number, b: number): boolean {
  return Math.abs(a - b) <= ROUNDING * Math.max(Math.abs(a), Math.abs(b));
}
