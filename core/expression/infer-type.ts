import { SCALAR, unionShape, type Shape } from '../axes/shape.ts';
import { error, type Diagnosed, type Diagnostic, type Span } from '../diagnostics/diagnostic.ts';
import type { QuantityType } from '../units/dimension.ts';
import { article, describeType, isNumber, NUMBER } from '../units/dimensions.ts';
import {
  addTypes,
  compareTypes,
  divideTypes,
  multiplyTypes,
  negateType,
  powerType,
  subtractTypes,
  type Operand,
} from '../units/type-algebra.ts';
import type { TypeFault, TypeResult } from '../units/type-faults.ts';
import { convertType } from '../units/type-conversion.ts';
import { missingFromSite } from '../units/site.ts';
import { missingState } from '../units/missing-state.ts';
import { typeOfUnit, type Unit } from '../units/unit.ts';
import { constantValue } from './constant-value.ts';
import { CONSTANTS } from './constants.ts';
import { inferCall } from './infer-call.ts';
import type { Comparison, Expression, Formula } from './tree.ts';
import type { AxisCall, TypedComparison, TypedExpression, TypedFormula, TypeScope } from './type-scope.ts';
import { misplacedName, unitOrName } from './unknown-name.ts';

/** Checks the dimensions of an expression against the names it may use. All its faults are reported. */
export function inferType(expression: Expression, scope: TypeScope): Diagnosed<TypedExpression> {
  const inference = new Inference(scope);
  const type = inference.infer(expression)?.type;
  const { diagnostics } = inference;
  return type === undefined ? { diagnostics } : { value: inference.typed(expression, type), diagnostics };
}

/** As {@link inferType}, and checks that the result can be shown in the unit behind `to`. */
export function inferFormula(formula: Formula, scope: TypeScope): Diagnosed<TypedFormula> {
  const { value: typed, diagnostics } = inferType(formula.expression, scope);
  if (typed === undefined) return { diagnostics };
  const { to } = formula;
  if (to === undefined) return { value: { formula, typed, type: typed.type, factor: 1 }, diagnostics };
  const atmosphere = missingStates(to, scope);
  const converted = convertType(typed.type, to.unit);
  if ('fault' in converted) return { diagnostics: [...diagnostics, ...atmosphere, faultAt(converted.fault, to.span)] };
  if (atmosphere.length > 0) return { diagnostics: [...diagnostics, ...atmosphere] };
  return { value: { formula, typed, ...converted, unit: to.unit }, diagnostics };
}

/** Checks both sides of a comparison, and that they can be compared. */
export function inferComparison(comparison: Comparison, scope: TypeScope): Diagnosed<TypedComparison> {
  const [leftSide, rightSide] = [new Inference(scope), new Inference(scope)];
  const [left, right] = [leftSide.infer(comparison.left), rightSide.infer(comparison.right)];
  const diagnostics = [...leftSide.diagnostics, ...rightSide.diagnostics];
  if (left === undefined || right === undefined) return { diagnostics };
  const common = compareTypes(left, right);
  if ('fault' in common) return { diagnostics: [...diagnostics, faultAt(common.fault, comparison.span)] };
  const value: TypedComparison = {
    comparison,
    left: leftSide.typed(comparison.left, left.type),
    right: rightSide.typed(comparison.right, right.type),
    type: common.type,
  };
  return { value, diagnostics };
}

/** An operand as the algebra of types sees it, with the power of pi among its dimensionless factors, and its axes. */
export interface Inferred extends Operand {
  readonly piPower: number;
  readonly axes: Shape;
}

/** The inference of one expression: its faults, and the factors that its arguments take on the way. */
export class Inference {
  readonly scope: TypeScope;
  readonly diagnostics: Diagnostic[] = [];
  readonly factors = new Map<Expression, number>();
  readonly shapes = new Map<Expression, Shape>();
  readonly calls = new Map<Expression, AxisCall>();

  constructor(scope: TypeScope) {
    this.scope = scope;
  }

  /** Undefined where a fault has been reported, here or in a formula that this one rests on. */
  infer(expression: Expression): Inferred | undefined {
    const found = this.inferNode(expression);
    if (found !== undefined && found.axes.length > 0) this.shapes.set(expression, found.axes);
    return found;
  }

  /** An expression without faults, with all that has been found out about its parts. */
  typed(expression: Expression, type: QuantityType): TypedExpression {
    const { shapes, factors, calls } = this;
    return { expression, type, shapes, factors, calls };
  }

  private inferNode(expression: Expression): Inferred | undefined {
    switch (expression.node) {
      case 'number':
        return inferred({ dimension: NUMBER, kind: 'plain' }, { literal: true });
      case 'quantity':
        return this.quantity(expression);
      case 'name':
        return this.name(expression);
      case 'text':
        this.report('EXPRESSION_NOT_ALLOWED', expression.span, 'a quoted text is no value', [
          "texts stand only as arguments: `pipe_bore(6, 'Sch 80')`",
        ]);
        return undefined;
      case 'negate':
        return this.negate(expression);
      case 'binary':
        return this.binary(expression);
      case 'comparison':
        throw new Error('a comparison stands for a value');
      case 'call': {
        const found = inferCall(expression, this);
        return found === undefined ? undefined : inferred(found.type, { axes: found.axes });
      }
    }
  }

  report(code: TypeFault['code'], span: Span, message: string, hints: readonly string[] = []): void {
    this.diagnostics.push(error(code, span, message, { hints }));
  }

  reportFault(fault: TypeFault, span: Span): void {
    this.diagnostics.push(faultAt(fault, span));
  }

  private quantity(expression: Expression & { node: 'quantity' }): Inferred | undefined {
    const missing = missingStates(expression, this.scope);
    this.diagnostics.push(...missing);
    if (missing.length > 0) return undefined;
    this.diagnostics.push(...unitOrName(expression, this.scope));
    return inferred(typeOfUnit(expression.unit), { literal: true });
  }

  private name({ name, span }: Expression & { node: 'name' }): Inferred | undefined {
    const type = this.scope.types.get(name);
    if (type !== undefined) return inferred(type, { axes: this.scope.shapes.get(name) ?? [] });
    if (CONSTANTS.has(name))
      return inferred({ dimension: NUMBER, kind: 'plain' }, { literal: true, piPower: name === 'pi' ? 1 : 0 });
    if (this.scope.faulty?.has(name) === true) return undefined;
    this.diagnostics.push(misplacedName(name, span, this.scope));
    return undefined;
  }

  private negate({ operand, span }: Expression & { node: 'negate' }): Inferred | undefined {
    const inner = this.infer(operand);
    return inner && this.settle(negateType(inner), span, inner);
  }

  private binary(expression: Expression & { node: 'binary' }): Inferred | undefined {
    if (expression.operator === '^') return this.power(expression);
    const [left, right] = [this.infer(expression.left), this.infer(expression.right)];
    if (left === undefined || right === undefined) return undefined;
    const literal = left.literal === true && right.literal === true;
    const axes = unionShape(left.axes, right.axes);
    const { span } = expression;
    switch (expression.operator) {
      case '+':
        return this.settle(addTypes(left, right), span, { literal, axes, piPower: sumPower(left, right) });
      case '-':
        return this.settle(subtractTypes(left, right), span, { literal, axes, piPower: sumPower(left, right) });
      case '*':
        return this.settle(product(left, right), span, { literal, axes, piPower: productPower(left, right, 1) });
      case '/':
        return this.settle(quotient(left, right), span, { literal, axes, piPower: productPower(left, right, -1) });
    }
  }

  private power({ left, right, span }: Expression & { node: 'binary' }): Inferred | undefined {
    const [base, exponent] = [this.infer(left), this.infer(right)];
    if (base === undefined || exponent === undefined) return undefined;
    if (!isNumber(exponent.type.dimension) || exponent.type.kind === 'cycles') {
      this.report(
        'UNIT_MISMATCH',
        right.span,
        `an exponent is a number, and ${article(describeType(exponent.type))} is given`,
      );
      return undefined;
    }
    const constant = constantValue(right);
    if (constant !== undefined && Number.isFinite(constant)) {
      const literal = base.literal === true;
      return this.settle(powerType(base, constant), span, {
        literal,
        axes: base.axes,
        piPower: base.piPower * constant,
      });
    }
    const axes = unionShape(base.axes, exponent.axes);
    if (isNumber(base.type.dimension)) return inferred({ dimension: NUMBER, kind: 'plain' }, { axes });
    this.report('UNIT_MISMATCH', left.span, `${article(describeType(base.type))} has an exponent that is computed`, [
      'divide the base by a reference of the same dimension first, or write the exponent as a number',
    ]);
    return undefined;
  }

  private settle(result: TypeResult, span: Span, marks: Marks): Inferred | undefined {
    if ('type' in result) return inferred(result.type, marks);
    this.reportFault(result.fault, span);
    return undefined;
  }
}

interface Marks {
  readonly axes?: Shape;
  readonly literal?: boolean;
  readonly piPower?: number;
}

function inferred(type: QuantityType, { axes = SCALAR, literal = false, piPower = 0 }: Marks = {}): Inferred {
  const power = isNumber(type.dimension) ? piPower : 0;
  return { type, axes, literal, piPower: power, carriesPi: power === 1 };
}

/** A number made with 1/pi divides by pi: (1/(2*pi))*w is w/(2*pi). */
function product(left: Inferred, right: Inferred): TypeResult {
  if (right.piPower === -1) return divideTypes(left, { ...right, carriesPi: true });
  if (left.piPower === -1) return divideTypes(right, { ...left, carriesPi: true });
  return multiplyTypes(left, right);
}

function quotient(left: Inferred, right: Inferred): TypeResult {
  return right.piPower === -1 ? multiplyTypes(left, { ...right, carriesPi: true }) : divideTypes(left, right);
}

/** Pi counts only among numbers: in pi/4*D^2/A it belongs to an area, and turns nothing into radians. */
function productPower(left: Inferred, right: Inferred, sign: 1 | -1): number {
  const numbers = isNumber(left.type.dimension) && isNumber(right.type.dimension);
  return numbers ? left.piPower + sign * right.piPower : 0;
}

function sumPower(left: Inferred, right: Inferred): number {
  return left.piPower === right.piPower ? left.piPower : 0;
}

function missingStates({ unit, span }: { readonly unit: Unit; readonly span: Span }, scope: TypeScope): Diagnostic[] {
  const missing = missingFromSite(unit, scope.site);
  return missing === null ? [] : [missingState(missing, unit, span)];
}

function faultAt({ code, message, hints }: TypeFault, span: Span): Diagnostic {
  return error(code, span, message, { hints });
}
