import type { ComparisonOperator } from './tree.ts';

/** A stretch of values: `data` from `from` on. */
export interface Stretch {
  readonly data: Float64Array;
  readonly from: number;
}

/**
 * The inner loops of the block interpreter: operands a, b, … into the result r, for `n` cases. All indices are in bounds,
 * which the loops assert rather than test. A loop whose result could hide an infinite operand, or that makes values which
 * cannot be held, tells whether it met one; plain sums and products only hand an infinity on to the result of the kernel,
 * where it is looked for.
 */
export function add(r: Stretch, a: Stretch, b: Stretch, n: number): void {
  const [rd, ro, ad, ao, bd, bo] = [r.data, r.from, a.data, a.from, b.data, b.from];
  for (let i = 0; i < n; i += 1) rd[ro + i] = ad[ao + i]! + bd[bo + i]!;
}

export function subtract(r: Stretch, a: Stretch, b: Stretch, n: number): void {
  const [rd, ro, ad, ao, bd, bo] = [r.data, r.from, a.data, a.from, b.data, b.from];
  for (let i = 0; i < n; i += 1) rd[ro + i] = ad[ao + i]! - bd[bo + i]!;
}

export function multiply(r: Stretch, a: Stretch, b: Stretch, n: number): void {
  const [rd, ro, ad, ao, bd, bo] = [r.data, r.from, a.data, a.from, b.data, b.from];
  for (let i = 0; i < n; i += 1) rd[ro + i] = ad[ao + i]! * bd[bo + i]!;
}

export function scale(r: Stretch, a: Stretch, factor: number, n: number): void {
  const [rd, ro, ad, ao] = [r.data, r.from, a.data, a.from];
  for (let i = 0; i < n; i += 1) rd[ro + i] = ad[ao + i]! * factor;
}

export function negate(r: Stretch, a: Stretch, n: number): void {
  const [rd, ro, ad, ao] = [r.data, r.from, a.data, a.from];
  for (let i = 0; i < n; i += 1) rd[ro + i] = -ad[ao + i]!;
}

/** x - x is zero for every number that can be held, and NaN for the others: the test of all loops below. */
export function divide(r: Stretch, a: Stretch, b: Stretch, n: number): boolean {
  const [rd, ro, ad, ao, bd, bo] = [r.data, r.from, a.data, a.from, b.data, b.from];
  let odd = false;
  for (let i = 0; i < n; i += 1) {
    const divisor = bd[bo + i]!;
    const result = ad[ao + i]! / divisor;
    rd[ro + i] = result;
    if (result - result !== 0 || divisor - divisor !== 0) odd = true;
  }
  return odd;
}

export function unary(r: Stretch, a: Stretch, fn: (x: number) => number, n: number): boolean {
  const [rd, ro, ad, ao] = [r.data, r.from, a.data, a.from];
  let odd = false;
  for (let i = 0; i < n; i += 1) {
    const x = ad[ao + i]!;
    const result = fn(x);
    rd[ro + i] = result;
    if (result - result !== 0 || x - x !== 0) odd = true;
  }
  return odd;
}

export function binary(r: Stretch, a: Stretch, b: Stretch, fn: (x: number, y: number) => number, n: number): boolean {
  const [rd, ro, ad, ao, bd, bo] = [r.data, r.from, a.data, a.from, b.data, b.from];
  let odd = false;
  for (let i = 0; i < n; i += 1) {
    const [x, y] = [ad[ao + i]!, bd[bo + i]!];
    const result = fn(x, y);
    rd[ro + i] = result;
    if (result - result !== 0 || x - x !== 0 || y - y !== 0) odd = true;
  }
  return odd;
}

export function square(r: Stretch, a: Stretch, n: number): void {
  const [rd, ro, ad, ao] = [r.data, r.from, a.data, a.from];
  for (let i = 0; i < n; i += 1) {
    const x = ad[ao + i]!;
    rd[ro + i] = x * x;
  }
}

export function cube(r: Stretch, a: Stretch, n: number): void {
  const [rd, ro, ad, ao] = [r.data, r.from, a.data, a.from];
  for (let i = 0; i < n; i += 1) {
    const x = ad[ao + i]!;
    rd[ro + i] = x * x * x;
  }
}

export function squareRoot(r: Stretch, a: Stretch, n: number): boolean {
  const [rd, ro, ad, ao] = [r.data, r.from, a.data, a.from];
  let odd = false;
  for (let i = 0; i < n; i += 1) {
    const result = Math.sqrt(ad[ao + i]!);
    rd[ro + i] = result;
    if (result - result !== 0) odd = true;
  }
  return odd;
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
    const [left, right] = [a.data[a.from + i]!, b.data[b.from + i]!];
    const [first, second] = [yes.data[yes.from + i]!, no.data[no.from + i]!];
    const holds =
      operator === '<'
        ? left < right
        : operator === '<='
          ? left <= right
          : operator === '>'
            ? left > right
            : left >= right;
    r.data[r.from + i] = holds ? first : second;
    if (left - left !== 0 || right - right !== 0 || first - first !== 0 || second - second !== 0) odd = true;
  }
  return odd;
}

/** Whether any of the values cannot be held. */
export function hasOdd({ data, from }: Stretch, n: number): boolean {
  for (let i = from; i < from + n; i += 1) {
    const x = data[i]!;
    if (x - x !== 0) return true;
  }
  return false;
}
