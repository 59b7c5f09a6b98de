/**
 * The one door to the platform's transcendental functions. JavaScript engines differ in their last bits, so every
 * call goes through here, where it can be replaced in one place; a lint rule keeps the rest of core away from them.
 */
export const exp = (x: number): number => Math.exp(x);
export const log = (x: number): number => Math.log(x);
export const log10 = (x: number): number => Math.log10(x);
export const sin = (x: number): number => Math.sin(x);
export const cos = (x: number): number => Math.cos(x);
export const tan = (x: number): number => Math.tan(x);
export const asin = (x: number): number => Math.asin(x);
export const acos = (x: number): number => Math.acos(x);
export const atan = (x: number): number => Math.atan(x);
export const atan2 = (y: number, x: number): number => Math.atan2(y, x);
export const sinh = (x: number): number => Math.sinh(x);
export const cosh = (x: number): number => Math.cosh(x);
export const tanh = (x: number): number => Math.tanh(x);

/** x^y, with the small powers that formulas use most computed by products and square roots, which all engines agree on. */
export function power(x: number, y: number): number {
  switch (y) {
    case 0:
      return 1;
    case 1:
      return x;
    case 2:
      return x * x;
    case 3:
      return x * x * x;
    case 4:
      return x * x * (x * x);
    case -1:
      return 1 / x;
    case -2:
      return 1 / (x * x);
    case 0.5:
      return Math.sqrt(x);
    case 0.25:
      return Math.sqrt(Math.sqrt(x));
    default:
      return Math.pow(x, y);
  }
}
