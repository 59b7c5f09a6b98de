import type { Dimension, Kind, QuantityType } from './dimension.ts';
import { alike, divided, multiplied } from './amplitude.ts';
import {
  describeType,
  divideDimensions,
  FREQUENCY,
  isNumber,
  multiplyDimensions,
  NUMBER,
  powerDimension,
  PRESSURE,
  sameDimension,
  TEMPERATURE,
} from './dimensions.ts';

import { cyclesMeetRadians, levelMeetsDifference, levelSum, mismatch, type TypeResult } from './type-faults.ts';

/** One side of an operation. */
export interface Operand {
  readonly type: QuantityType;
  /** Written out with its unit in the formula (`10 K`), not behind a name. */
  readonly literal?: boolean;
  /** A number made with `pi`, such as `2*pi`: it turns cycles into radians. */
  readonly carriesPi?: boolean;
}

/** True where a dimension has a scale with points and distances: pressure and temperature. */
export function hasLevels(dimension: Dimension): boolean {
  return sameDimension(dimension, PRESSURE) || sameDimension(dimension, TEMPERATURE);
}

/** A computed quantity: on a scale with levels it is a difference, else plain. */
export function computedType(dimension: Dimension): QuantityType {
  return { dimension, kind: hasLevels(dimension) ? 'difference' : 'plain' };
}

/**
 * Type of a + b: level + difference is a level, difference + difference a difference; level + level is a fault.
 * An `open` operand (K, degR) next to a level is a difference, since two levels are never added.
 */
export function addTypes(a: Operand, b: Operand): TypeResult {
  return alike(a.type, b.type, 'added', sumType(a, b));
}

function sumType(a: Operand, b: Operand): TypeResult {
  const [left, right] = [a.type, b.type];
  if (!sameDimension(left.dimension, right.dimension)) return mismatch('added', left, right);
  if (isTurning(left.kind) || isTurning(right.kind)) return turningSum('added', left, right);
  if (left.kind === 'level' && right.kind === 'level') return { fault: levelSum(left) };
  if (left.kind === 'level' || right.kind === 'level') return ok(left.dimension, 'level');
  if (left.kind === 'percent' && right.kind === 'percent') return ok(left.dimension, 'percent');
  if (left.kind === 'open' || right.kind === 'open') return ok(left.dimension, 'open');
  return { type: computedType(left.dimension) };
}

/**
 * Type of a − b: level − level is a difference, level − difference a level; difference − level is a fault.
 * From a level, an `open` operand is taken away as a difference only when it is written out (`T - 10 K`): behind a name it
 * could be a level as well, and the two readings differ by 273 K.
 */
export function subtractTypes(a: Operand, b: Operand): TypeResult {
  return alike(a.type, b.type, 'subtracted', differenceType(a, b));
}

function differenceType(a: Operand, b: Operand): TypeResult {
  const [left, right] = [a.type, b.type];
  if (!sameDimension(left.dimension, right.dimension)) return mismatch('subtracted', left, right);
  if (isTurning(left.kind) || isTurning(right.kind)) return turningSum('subtracted', left, right);
  if (left.kind === 'level') return fromLevel(left, right, b.literal === true);
  if (right.kind === 'level') return awayFromLevel(left);
  if (left.kind === 'percent' && right.kind === 'percent') return ok(left.dimension, 'percent');
  if (left.kind === 'open' || right.kind === 'open') return ok(left.dimension, 'open');
  return { type: computedType(left.dimension) };
}

function fromLevel(left: QuantityType, right: QuantityType, literal: boolean): TypeResult {
  if (right.kind === 'level') return ok(left.dimension, 'difference');
  if (right.kind !== 'open' || literal) return ok(left.dimension, 'level');
  return {
    fault: {
      code: 'LEVEL_AMBIGUOUS',
      message: 'a value in K or degR is subtracted from a temperature level, and could be a level or a difference',
      hints: ['give it in degC or degF if it is a temperature, in delta_K or delta_degR if it is a difference'],
    },
  };
}

function awayFromLevel(left: QuantityType): TypeResult {
  // open − level: 350 K − 77 degC can only be meant as two temperatures.
  if (left.kind === 'open') return ok(left.dimension, 'difference');
  return {
    fault: {
      code: 'LEVEL_SUM',
      message: `a ${describeType({ ...left, kind: 'level' })} is subtracted from a ${describeType(left)}`,
      hints: ['a level can be subtracted only from another level'],
    },
  };
}

/** Type of −a. A level has no negative: −50 degC is written as one number. */
export function negateType({ type }: Operand): TypeResult {
  if (type.kind !== 'level') return { type };
  return {
    fault: {
      code: 'LEVEL_SUM',
      message: `a minus sign stands before a ${describeType(type)}`,
      hints: ['subtract it from another level, which gives a difference'],
    },
  };
}

/**
 * Type of a · b. A number times a level is a level, a percentage of a level a difference; a level times anything with a
 * dimension counts with its absolute magnitude. Cycles times a number made with `pi` are radians.
 */
export function multiplyTypes(a: Operand, b: Operand): TypeResult {
  return multiplied(a.type, b.type, productType(a, b));
}

function productType(a: Operand, b: Operand): TypeResult {
  const dimension = multiplyDimensions(a.type.dimension, b.type.dimension);
  if (isNumber(a.type.dimension) && !isAngle(a.type.kind)) return { type: scaledType(b, a) };
  if (isNumber(b.type.dimension) && !isAngle(b.type.kind)) return { type: scaledType(a, b) };
  const turning = productOfTurning(a.type.kind, b.type.kind);
  if (turning !== null && mayTurn(dimension)) return { type: { dimension, kind: turning } };
  if (a.type.kind === 'level' && b.type.kind === 'level' && sameDimension(a.type.dimension, b.type.dimension)) {
    // So that the root of suction times discharge pressure is a level again.
    return ok(dimension, 'level');
  }
  return { type: computedType(dimension) };
}

/** A quantity times a dimensionless number. */
function scaledType(quantity: Operand, factor: Operand): QuantityType {
  const { dimension, kind } = quantity.type;
  if (isNumber(dimension) && factor.type.kind === 'percent')
    return { dimension, kind: kind === 'plain' ? 'percent' : kind };
  if (factor.type.kind === 'percent') return kind === 'level' ? { dimension, kind: 'difference' } : { dimension, kind };
  if (factor.carriesPi === true && kind === 'cycles') return { dimension, kind: 'radians' };
  if (factor.carriesPi === true && kind === 'root') return { dimension, kind: 'plain' };
  return { dimension, kind };
}

/** Type of a / b. Level / level is a plain ratio; radians or a root over a number made with `pi` are cycles. */
export function divideTypes(a: Operand, b: Operand): TypeResult {
  return divided(a.type, b.type, quotientType(a, b));
}

function quotientType(a: Operand, b: Operand): TypeResult {
  const dimension = divideDimensions(a.type.dimension, b.type.dimension);
  if (isNumber(b.type.dimension) && !isAngle(b.type.kind)) return { type: dividedType(a, b) };
  if (isTurning(a.type.kind) && isTurning(b.type.kind)) return turningRatio(a.type, b.type, dimension);
  if (isTurning(a.type.kind) && mayTurn(dimension)) return { type: { dimension, kind: a.type.kind } };
  return { type: computedType(dimension) };
}

function dividedType(quantity: Operand, divisor: Operand): QuantityType {
  const { dimension, kind } = quantity.type;
  if (kind === 'percent') return { dimension, kind: divisor.type.kind === 'percent' ? 'plain' : 'percent' };
  if (divisor.carriesPi === true && (kind === 'radians' || kind === 'root')) return { dimension, kind: 'cycles' };
  return { dimension, kind };
}

function turningRatio(a: QuantityType, b: QuantityType, dimension: Dimension): TypeResult {
  if (a.kind !== b.kind) return { fault: cyclesMeetRadians('divided by each other') };
  return { type: computedType(dimension) };
}

/**
 * Type of a^n for a constant exponent. Squares keep their kind so that their roots give it back; the root of a plain
 * 1/s² is a `root`: by physics radians per second, so it must not pass for hertz in silence.
 */
export function powerType({ type }: Operand, exponent: number): TypeResult {
  const dimension = powerDimension(type.dimension, exponent);
  if (exponent === 1) return { type };
  if (isNumber(type.dimension) && !isAngle(type.kind)) return ok(NUMBER, 'plain');
  if (isTurning(type.kind) && mayTurn(dimension)) return { type: { dimension, kind: type.kind } };
  if (sameDimension(dimension, FREQUENCY) && isRoot(exponent) && type.kind === 'plain') return ok(dimension, 'root');
  if (type.kind === 'level' && (exponent === 2 || (exponent === 0.5 && hasLevels(dimension))))
    return ok(dimension, 'level');
  return { type: computedType(dimension) };
}

/** Type of √a. */
export function squareRootType(a: Operand): TypeResult {
  return powerType(a, 0.5);
}

/** Checks that two sides can be compared, or be the smaller and the larger of each other; gives their common type. */
export function compareTypes(a: Operand, b: Operand): TypeResult {
  return alike(a.type, b.type, 'compared', commonType(a, b));
}

function commonType(a: Operand, b: Operand): TypeResult {
  const [left, right] = [a.type, b.type];
  if (!sameDimension(left.dimension, right.dimension)) return mismatch('compared', left, right);
  if (isTurning(left.kind) || isTurning(right.kind)) return turningSum('compared', left, right);
  if (left.kind === right.kind) return { type: left };
  if (left.kind === 'open') return { type: right };
  if (right.kind === 'open') return { type: left };
  if (left.kind === 'level' || right.kind === 'level') return { fault: levelMeetsDifference(left) };
  return { type: computedType(left.dimension) };
}

/** Sums and comparisons of rates and angles: like with like; a plain 1/s next to cycles counts as cycles. */
function turningSum(verb: string, left: QuantityType, right: QuantityType): TypeResult {
  if (left.kind === right.kind) return { type: left };
  const kinds: readonly Kind[] = [left.kind, right.kind];
  if (kinds.includes('cycles') && kinds.includes('plain')) return ok(left.dimension, 'cycles');
  if (isNumber(left.dimension) && kinds.includes('radians') && kinds.includes('plain'))
    return ok(left.dimension, 'radians');
  return { fault: cyclesMeetRadians(verb) };
}

function productOfTurning(a: Kind, b: Kind): Kind | null {
  if (a === b) return isTurning(a) ? a : null;
  // A root says nothing about cycles or radians; times a radian it says so.
  if (a === 'root' || b === 'root') return a === 'radians' || b === 'radians' ? 'radians' : 'root';
  if (isTurning(a) && isTurning(b)) return null;
  if (isTurning(a)) return a;
  return isTurning(b) ? b : null;
}

function isTurning(kind: Kind): boolean {
  return kind === 'cycles' || kind === 'radians' || kind === 'root';
}

/** Among dimensionless quantities, those that count turns or radians. */
function isAngle(kind: Kind): boolean {
  return kind === 'cycles' || kind === 'radians';
}

/** Dimensions on which "cycles" or "radians" still say something: an angle, a rate, and the square of a rate. */
function mayTurn(dimension: Dimension): boolean {
  return [NUMBER, FREQUENCY, powerDimension(FREQUENCY, 2)].some((known) => sameDimension(known, dimension));
}

function isRoot(exponent: number): boolean {
  return exponent > 0 && exponent < 1;
}

function ok(dimension: Dimension, kind: Kind): TypeResult {
  return { type: { dimension, kind } };
}
