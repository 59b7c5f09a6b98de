import { fromSi } from './convert.ts';
import type { Printed } from './printed.ts';
import { NO_SITE, type Site } from './site.ts';
import type { Unit } from './unit.ts';

/** Significant digits of a result, where the engineer asks for no other number. */
export const DEFAULT_DIGITS = 4;

/** Between these magnitudes a number is written out; beyond them with a power of ten. */
const SMALLEST = 1e-4;
const LARGEST = 1e7;

export interface PrintOptions {
  /** Significant digits, 1 to 15. */
  readonly digits?: number;
  readonly site?: Site;
}

/** Prints a SI value in a unit at its significant digits; digits before the decimal sign are never rounded away. */
export function printQuantity(si: number, unit: Unit, options: PrintOptions = {}): Printed {
  const number = fromSi(si, unit, options.site ?? NO_SITE);
  return printed(printNumber(number, options.digits ?? DEFAULT_DIGITS), unit);
}

/** Prints the least and the greatest of several values in one unit: `95.0 … 160.0 psig`; one number where both print alike. */
export function printSpread(least: number, greatest: number, unit: Unit, options: PrintOptions = {}): Printed {
  const [from, to] = [printQuantity(least, unit, options), printQuantity(greatest, unit, options)];
  if (from.number === to.number) return to;
  return {
    number: `${from.number} … ${to.number}`,
    unit: to.unit,
    tex: `${numberTex(from.number)}\\ldots ${to.tex}`,
  };
}

/** Prints a number just as it was typed. */
export function printTyped(numberText: string, unit: Unit): Printed {
  return printed(numberText.replaceAll('−', '-'), unit);
}

/** A number at significant digits: `26.07`, `574.9`, `12345`, `1.05e-6`. */
export function printNumber(number: number, digits: number = DEFAULT_DIGITS): string {
  const magnitude = Math.abs(number);
  if (magnitude === 0) return '0';
  if (magnitude < SMALLEST || magnitude >= LARGEST) return withPower(number, digits);
  const exponent = Number(magnitude.toExponential(digits - 1).split('e')[1]);
  return number.toFixed(Math.max(0, digits - 1 - exponent));
}

/** Powers of ten in threes, as engineers write them: `105.0e-6`, `12.35e6`. */
function withPower(number: number, digits: number): string {
  const [mantissa = '', exponent = '0'] = number.toExponential(digits - 1).split('e');
  const third = Math.floor(Number(exponent) / 3) * 3;
  const moved = Number(exponent) - third;
  const sign = mantissa.startsWith('-') ? '-' : '';
  const all = mantissa.replace(/[-.]/g, '').padEnd(moved + 1, '0');
  const [whole, rest] = [all.slice(0, moved + 1), all.slice(moved + 1)];
  return `${sign}${whole}${rest === '' ? '' : `.${rest}`}e${third}`;
}

function printed(number: string, unit: Unit): Printed {
  return { number, unit: unit.text === '1' ? '' : unit.text, tex: numberTex(number) + unitTex(unit) };
}

/** `1.05e-6` → `1.05\times 10^{-6}`; fractions and feet-inches are set as typed. */
function numberTex(number: string): string {
  const match = /^(-?[\d.]+)e([+-]?\d+)$/i.exec(number);
  if (match !== null) return `${match[1]}\\times 10^{${Number(match[2])}}`;
  return /[^\d.-]/.test(number) ? `\\text{${number}}` : number;
}

function unitTex(unit: Unit): string {
  if (unit.text === '1') return '';
  return unit.text === 'deg' ? unit.tex : `\\,${unit.tex}`;
}
