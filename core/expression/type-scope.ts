import type { Axis, AxisName } from '../axes/axis.ts';
import type { Shape } from '../axes/shape.ts';
import type { LibraryFunction } from '../library/function.ts';
import type { QuantityType } from '../units/dimension.ts';
import type { Site } from '../units/site.ts';
import type { Unit } from '../units/unit.ts';
import type { Reduction } from './axis-functions.ts';
import type { LookupTable } from './lookup-table.ts';
import type { Comparison, Expression, Formula } from './tree.ts';

/** What the names in a formula stand for, before anything has a value. */
export interface TypeScope {
  readonly types: ReadonlyMap<string, QuantityType>;
  /** Axes along which quantities and gases vary; a name without an entry stands for one value. */
  readonly shapes: ReadonlyMap<string, Shape>;
  /** The axes of the sheet. A formula that counts orders adds one. */
  readonly axes: Map<AxisName, Axis>;
  /** Names that are defined, but whose own formula is at fault: nothing more is said about formulas that use them. */
  readonly faulty?: ReadonlySet<string>;
  readonly gases: ReadonlySet<string>;
  readonly tables: ReadonlyMap<string, LookupTable>;
  /** Columns of words, which have a name but no value. */
  readonly words?: ReadonlySet<string>;
  readonly functions: ReadonlyMap<string, LibraryFunction>;
  /** What the sheet states of its site: gauge pressures and reference volumes rest on it. */
  readonly site: Site;
}

/** What a call along axes comes down to, once its names are looked up. */
export type AxisCall =
  | { readonly call: 'reduce'; readonly how: Reduction; readonly over: readonly AxisName[] }
  | { readonly call: 'pick'; readonly axis: AxisName; readonly index: number }
  | { readonly call: 'interpolate'; readonly table: LookupTable }
  | { readonly call: 'count'; readonly axis: AxisName };

/** An expression whose dimensions agree throughout: what can be compiled. */
export interface TypedExpression {
  readonly expression: Expression;
  readonly type: QuantityType;
  /** Axes of each part that varies; a part without an entry is one value. */
  readonly shapes: ReadonlyMap<Expression, Shape>;
  /** For arguments that are taken in radians and given in cycles, or the other way round: what they are multiplied by. */
  readonly factors: ReadonlyMap<Expression, number>;
  readonly calls: ReadonlyMap<Expression, AxisCall>;
}

/** A formula whose result is of `type`, once its expression's SI value is multiplied by `factor` (1, 2π or 1/2π). */
export interface TypedFormula {
  readonly formula: Formula;
  readonly typed: TypedExpression;
  readonly type: QuantityType;
  readonly factor: number;
  /** The unit that the formula itself asks for. */
  readonly unit?: Unit;
}

export interface TypedComparison {
  readonly comparison: Comparison;
  readonly left: TypedExpression;
  readonly right: TypedExpression;
  /** Type that both sides share. */
  readonly type: QuantityType;
}

/** The axes of a typed expression's result. */
export function shapeOf({ expression, shapes }: TypedExpression): Shape {
  return shapes.get(expression) ?? [];
}
