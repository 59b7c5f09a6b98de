import { acos, asin, atan, cos, exp, log, log10, power, sin, tan } from '../numeric/math.ts';
import { isOdd, type Stretch } from './block-loops.ts';

/*
 * The loops of powers and of the functions of mathematics. As those of sums and products they work on `n` cases with
 * indices in bounds, and tell whether they met a value that cannot be held.
 */

export function squareRoot(r: Stretch, a: Stretch, n: number): boolean {
  const [rd, ro, ad, ao] = [r.data, r.from, a.data, a.from];
  let odd = false;
  for (let i = 0; i < n; i += 1) {
    const result = Math.sqrt(ad[ao + i]!);
    rd[ro + i] = result;
    if (isOdd(result)) odd = true;
  }
  return odd;
}

function magnitude(r: Stretch, a: Stretch, n: number): void {
  const [rd, ro, ad, ao] = [r.data, r.from, a.data, a.from];
  for (let i = 0; i < n; i += 1) rd[ro + i] = Math.abs(ad[ao + i]!);
}

export function raise(r: Stretch, a: Stretch, b: Stretch, n: number): boolean {
  const [rd, ro, ad, ao, bd, bo] = [r.data, r.from, a.data, a.from, b.data, b.from];
  let odd = false;
  for (let i = 0; i < n; i += 1) {
    const x = ad[ao + i]!;
    const y = bd[bo + i]!;
    const result = power(x, y);
    rd[ro + i] = result;
    if (isOdd(result) || isOdd(x) || isOdd(y)) odd = true;
  }
  return odd;
}

/** The smaller or the larger of a and b. */
function pick(r: Stretch, a: Stretch, b: Stretch, which: 'min' | 'max', n: number): boolean {
  const [rd, ro, ad, ao, bd, bo] = [r.data, r.from, a.data, a.from, b.data, b.from];
  let odd = false;
  for (let i = 0; i < n; i += 1) {
    const x = ad[ao + i]!;
    const y = bd[bo + i]!;
    rd[ro + i] = which === 'min' ? Math.min(x, y) : Math.max(x, y);
    if (isOdd(x) || isOdd(y)) odd = true;
  }
  return odd;
}

/**
 * A function of mathematics over a block, where it has a loop of its own: true where a value could not be held, null
 * where there is no such loop.
 */
export function mathematics(name: string, r: Stretch, [a, b, ...more]: readonly Stretch[], n: number): boolean | null {
  if (a === undefined || more.length > 0) return null;
  if (b !== undefined) return name === 'min' || name === 'max' ? pick(r, a, b, name, n) : null;
  if (name === 'sqrt') return squareRoot(r, a, n);
  if (name === 'abs') {
    magnitude(r, a, n);
    return false;
  }
  const which = Object.hasOwn(UNARY, name) ? UNARY[name as keyof typeof UNARY] : undefined;
  return which === undefined ? null : unary(r, a, which, n);
}

/** Functions of one number, by the number that stands for each in the loop. */
const UNARY = {
  sin: 0,
  cos: 1,
  tan: 2,
  asin: 3,
  acos: 4,
  atan: 5,
  exp: 6,
  ln: 7,
  log10: 8,
  floor: 9,
  ceil: 10,
} as const;

/**
 * A function of one number. The choice stands inside of the loop: a function handed in as a value would have to put each
 * number that it takes and gives into a piece of memory of its own.
 */
function unary(r: Stretch, a: Stretch, which: number, n: number): boolean {
  const [rd, ro, ad, ao] = [r.data, r.from, a.data, a.from];
  let odd = false;
  for (let i = 0; i < n; i += 1) {
    const x = ad[ao + i]!;
    const result = unaryValue(which, x);
    rd[ro + i] = result;
    if (isOdd(result) || isOdd(x)) odd = true;
  }
  return odd;
}

function unaryValue(which: number, x: number): number {
  switch (which) {
    case UNARY.sin:
      return sin(x);
    case UNARY.cos:
      return cos(x);
    case UNARY.tan:
      return tan(x);
    case UNARY.asin:
      return asin(x);
    case UNARY.acos:
      return acos(x);
    case UNARY.atan:
      return atan(x);
    case UNARY.exp:
      return exp(x);
    case UNARY.ln:
      return log(x);
    case UNARY.log10:
      return log10(x);
    case UNARY.floor:
      return Math.floor(x);
    default:
      return Math.ceil(x);
  }
}
