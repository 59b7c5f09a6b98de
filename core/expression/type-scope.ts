import type { LibraryFunction } from '../library/function.ts';
import type { QuantityType } from '../units/dimension.ts';
import type { Unit } from '../units/unit.ts';
import type { Comparison, Expression, Formula } from './tree.ts';

/** What the names in a formula stand for, before anything has a value. */
export interface TypeScope {
  readonly types: ReadonlyMap<string, QuantityType>;
  /** Names that are defined, but whose own formula is at fault: nothing more is said about formulas that use them. */
  readonly faulty?: ReadonlySet<string>;
  readonly gases: ReadonlySet<string>;
  readonly functions: ReadonlyMap<string, LibraryFunction>;
  /** The sheet states the pressure of the atmosphere, so gauge pressures have a meaning. */
  readonly hasAtmosphere: boolean;
}

/** An expression whose dimensions agree throughout: what can be compiled. */
export interface TypedExpression {
  readonly expression: Expression;
  readonly type: QuantityType;
  /** For arguments that are taken in radians and given in cycles, or the other way round: what they are multiplied by. */
  readonly factors: ReadonlyMap<Expression, number>;
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
