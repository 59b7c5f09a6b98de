import { compareNumbers } from './compare-numbers.ts';
import type { ComparisonOperator } from './tree.ts';

/** A stretch of values: `data` from `from` on. Where it is `fixed`, its first value stands for all. */
export interface Stretch {
  readonly data: Float64Array;
  readonly from: number;
  readonly fixed: boolean;
}

/*
 * The inner loops of the block interpreter: operands a and b into the result r, for `n` cases. They are written out four
 * cases at a time, with a form of their own for an operand that is the same for all cases: that makes them twice as fast
 * as the plain form. All indices are in bounds, which the loops assert rather than test.
 *
 * A loop whose result could hide an infinite operand, or that makes values which cannot be held, tells whether it met
 * one; plain sums and products only hand an infinity on to the result of the kernel, where it is looked for.
 */

const value = ({ data, from }: Stretch): number => data[from]!;

export function add(r: Stretch, a: Stretch, b: Stretch, n: number): void {
  if (b.fixed) addRight(r, a, value(b), n);
  else if (a.fixed) addRight(r, b, value(a), n);
  else addBoth(r, a, b, n);
}

function addBoth(r: Stretch, a: Stretch, b: Stretch, n: number): void {
  const [rd, ro, ad, ao, bd, bo] = [r.data, r.from, a.data, a.from, b.data, b.from];
  let i = 0;
  for (; i + 3 < n; i += 4) {
    rd[ro + i] = ad[ao + i]! + bd[bo + i]!;
    rd[ro + i + 1] = ad[ao + i + 1]! + bd[bo + i + 1]!;
    rd[ro + i + 2] = ad[ao + i + 2]! + bd[bo + i + 2]!;
    rd[ro + i + 3] = ad[ao + i + 3]! + bd[bo + i + 3]!;
  }
  for (; i < n; i += 1) rd[ro + i] = ad[ao + i]! + bd[bo + i]!;
}

function addRight(r: Stretch, a: Stretch, b: number, n: number): void {
  const [rd, ro, ad, ao] = [r.data, r.from, a.data, a.from];
  let i = 0;
  for (; i + 3 < n; i += 4) {
    rd[ro + i] = ad[ao + i]! + b;
    rd[ro + i + 1] = ad[ao + i + 1]! + b;
    rd[ro + i + 2] = ad[ao + i + 2]! + b;
    rd[ro + i + 3] = ad[ao + i + 3]! + b;
  }
  for (; i < n; i += 1) rd[ro + i] = ad[ao + i]! + b;
}

export function subtract(r: Stretch, a: Stretch, b: Stretch, n: number): void {
  if (b.fixed) subtractRight(r, a, value(b), n);
  else if (a.fixed) subtractLeft(r, value(a), b, n);
  else subtractBoth(r, a, b, n);
}

function subtractBoth(r: Stretch, a: Stretch, b: Stretch, n: number): void {
  const [rd, ro, ad, ao, bd, bo] = [r.data, r.from, a.data, a.from, b.data, b.from];
  let i = 0;
  for (; i + 3 < n; i += 4) {
    rd[ro + i] = ad[ao + i]! - bd[bo + i]!;
    rd[ro + i + 1] = ad[ao + i + 1]! - bd[bo + i + 1]!;
    rd[ro + i + 2] = ad[ao + i + 2]! - bd[bo + i + 2]!;
    rd[ro + i + 3] = ad[ao + i + 3]! - bd[bo + i + 3]!;
  }
  for (; i < n; i += 1) rd[ro + i] = ad[ao + i]! - bd[bo + i]!;
}

function subtractRight(r: Stretch, a: Stretch, b: number, n: number): void {
  const [rd, ro, ad, ao] = [r.data, r.from, a.data, a.from];
  let i = 0;
  for (; i + 3 < n; i += 4) {
    rd[ro + i] = ad[ao + i]! - b;
    rd[ro + i + 1] = ad[ao + i + 1]! - b;
    rd[ro + i + 2] = ad[ao + i + 2]! - b;
    rd[ro + i + 3] = ad[ao + i + 3]! - b;
  }
  for (; i < n; i += 1) rd[ro + i] = ad[ao + i]! - b;
}

function subtractLeft(r: Stretch, a: number, b: Stretch, n: number): void {
  const [rd, ro, bd, bo] = [r.data, r.from, b.data, b.from];
  let i = 0;
  for (; i + 3 < n; i += 4) {
    rd[ro + i] = a - bd[bo + i]!;
    rd[ro + i + 1] = a - bd[bo + i + 1]!;
    rd[ro + i + 2] = a - bd[bo + i + 2]!;
    rd[ro + i + 3] = a - bd[bo + i + 3]!;
  }
  for (; i < n; i += 1) rd[ro + i] = a - bd[bo + i]!;
}

export function multiply(r: Stretch, a: Stretch, b: Stretch, n: number): void {
  if (b.fixed) multiplyRight(r, a, value(b), n);
  else if (a.fixed) multiplyRight(r, b, value(a), n);
  else multiplyBoth(r, a, b, n);
}

function multiplyBoth(r: Stretch, a: Stretch, b: Stretch, n: number): void {
  const [rd, ro, ad, ao, bd, bo] = [r.data, r.from, a.data, a.from, b.data, b.from];
  let i = 0;
  for (; i + 3 < n; i += 4) {
    rd[ro + i] = ad[ao + i]! * bd[bo + i]!;
    rd[ro + i + 1] = ad[ao + i + 1]! * bd[bo + i + 1]!;
    rd[ro + i + 2] = ad[ao + i + 2]! * bd[bo + i + 2]!;
    rd[ro + i + 3] = ad[ao + i + 3]! * bd[bo + i + 3]!;
  }
  for (; i < n; i += 1) rd[ro + i] = ad[ao + i]! * bd[bo + i]!;
}

function multiplyRight(r: Stretch, a: Stretch, b: number, n: number): void {
  const [rd, ro, ad, ao] = [r.data, r.from, a.data, a.from];
  let i = 0;
  for (; i + 3 < n; i += 4) {
    rd[ro + i] = ad[ao + i]! * b;
    rd[ro + i + 1] = ad[ao + i + 1]! * b;
    rd[ro + i + 2] = ad[ao + i + 2]! * b;
    rd[ro + i + 3] = ad[ao + i + 3]! * b;
  }
  for (; i < n; i += 1) rd[ro + i] = ad[ao + i]! * b;
}

/** a times one factor after another, rounded after each. */
export function chain(r: Stretch, a: Stretch, factors: readonly number[], n: number): void {
  const [first = 1, second = 1, third = 1, ...more] = factors;
  const [rd, ro, ad, ao] = [r.data, r.from, a.data, a.from];
  let i = 0;
  for (; i + 3 < n; i += 4) {
    rd[ro + i] = ad[ao + i]! * first * second * third;
    rd[ro + i + 1] = ad[ao + i + 1]! * first * second * third;
    rd[ro + i + 2] = ad[ao + i + 2]! * first * second * third;
    rd[ro + i + 3] = ad[ao + i + 3]! * first * second * third;
  }
  for (; i < n; i += 1) rd[ro + i] = ad[ao + i]! * first * second * third;
  if (more.length > 0) chain(r, r, more, n);
}

/** x - x is zero for every number that can be held, and NaN for the others. */
export function isOdd(x: number): boolean {
  return x - x !== 0;
}

export function divide(r: Stretch, a: Stretch, b: Stretch, n: number): boolean {
  if (b.fixed) return divideRight(r, a, value(b), n);
  return a.fixed ? divideLeft(r, value(a), b, n) : divideBoth(r, a, b, n);
}

function divideBoth(r: Stretch, a: Stretch, b: Stretch, n: number): boolean {
  const [rd, ro, ad, ao, bd, bo] = [r.data, r.from, a.data, a.from, b.data, b.from];
  let odd = false;
  let i = 0;
  for (; i + 3 < n; i += 4) {
    const b0 = bd[bo + i]!;
    const b1 = bd[bo + i + 1]!;
    const b2 = bd[bo + i + 2]!;
    const b3 = bd[bo + i + 3]!;
    const r0 = ad[ao + i]! / b0;
    const r1 = ad[ao + i + 1]! / b1;
    const r2 = ad[ao + i + 2]! / b2;
    const r3 = ad[ao + i + 3]! / b3;
    rd[ro + i] = r0;
    rd[ro + i + 1] = r1;
    rd[ro + i + 2] = r2;
    rd[ro + i + 3] = r3;
    if (r0 - r0 + (r1 - r1) + (r2 - r2) + (r3 - r3) + (b0 - b0) + (b1 - b1) + (b2 - b2) + (b3 - b3) !== 0) odd = true;
  }
  for (; i < n; i += 1) {
    const result = ad[ao + i]! / bd[bo + i]!;
    rd[ro + i] = result;
    if (isOdd(result) || isOdd(bd[bo + i]!)) odd = true;
  }
  return odd;
}

/** Results that cannot be held are found where the kernel ends: nothing hides them, as the divisor is the same for all. */
function divideRight(r: Stretch, a: Stretch, b: number, n: number): boolean {
  const [rd, ro, ad, ao] = [r.data, r.from, a.data, a.from];
  let i = 0;
  for (; i + 3 < n; i += 4) {
    rd[ro + i] = ad[ao + i]! / b;
    rd[ro + i + 1] = ad[ao + i + 1]! / b;
    rd[ro + i + 2] = ad[ao + i + 2]! / b;
    rd[ro + i + 3] = ad[ao + i + 3]! / b;
  }
  for (; i < n; i += 1) rd[ro + i] = ad[ao + i]! / b;
  return b === 0 || isOdd(b);
}

function divideLeft(r: Stretch, a: number, b: Stretch, n: number): boolean {
  const [rd, ro, bd, bo] = [r.data, r.from, b.data, b.from];
  let odd = false;
  for (let i = 0; i < n; i += 1) {
    const divisor = bd[bo + i]!;
    const result = a / divisor;
    rd[ro + i] = result;
    if (isOdd(result) || isOdd(divisor)) odd = true;
  }
  return odd;
}

export function scale(r: Stretch, a: Stretch, factor: number, n: number): void {
  multiplyRight(r, a, factor, n);
}

export function negate(r: Stretch, a: Stretch, n: number): void {
  multiplyRight(r, a, -1, n);
}

export function square(r: Stretch, a: Stretch, n: number): void {
  multiplyBoth(r, a, a, n);
}

/** r is `yes` where a compares with b as asked, else `no`. All four must exist everywhere. */
export function choose(
  r: Stretch,
  operator: ComparisonOperator,
  [a, b, yes, no]: readonly [Stretch, Stretch, Stretch, Stretch],
  n: number,
): boolean {
  let odd = false;
  for (let i = 0; i < n; i += 1) {
    const left = a.data[a.from + i]!;
    const right = b.data[b.from + i]!;
    const first = yes.data[yes.from + i]!;
    const second = no.data[no.from + i]!;
    r.data[r.from + i] = compareNumbers(operator, left, right) ? first : second;
    if (isOdd(left) || isOdd(right) || isOdd(first) || isOdd(second)) odd = true;
  }
  return odd;
}

/** Whether any of the values cannot be held. */
export function hasOdd({ data, from }: Stretch, n: number): boolean {
  let i = from;
  for (; i + 3 < from + n; i += 4) {
    const a = data[i]!;
    const b = data[i + 1]!;
    const c = data[i + 2]!;
    const d = data[i + 3]!;
    if (a - a + (b - b) + (c - c) + (d - d) !== 0) return true;
  }
  for (; i < from + n; i += 1) if (isOdd(data[i]!)) return true;
  return false;
}
