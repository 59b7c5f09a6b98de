/** A number at the start of a text, and how far it reaches. */
export interface LeadingNumber {
  readonly number: number;
  readonly length: number;
}

export type NumberFault = 'infinite' | 'digits' | 'zero denominator';

const MIXED = /^([-+−]?)(\d+)-(\d+)\/(\d+)(?![\d.])/;
const FRACTION = /^([-+−]?)(\d+)\/(\d+)(?![\d.])/;
const DECIMAL = /^[-+−]?(?:\d+(?:\.(?!\.)\d*)?|\.\d+)(?:[eE][-+−]?\d+)?/;

/** Doubles carry 15 digits for certain, 17 to be read back; more would be dropped without a word. */
const MAX_DIGITS = 17;

/**
 * Reads a number at the start of a text: `905`, `-1.5e-3`, a fraction `3/4`, or a mixed number `1-1/2` as the trade writes
 * pipe sizes. Null when the text does not begin with a number.
 */
export function leadingNumber(
  text: string,
): LeadingNumber | { readonly fault: NumberFault; readonly length: number } | null {
  const mixed = MIXED.exec(text);
  if (mixed !== null) return fraction(mixed[0], mixed[1], Number(mixed[2]), Number(mixed[3]), Number(mixed[4]));
  const simple = FRACTION.exec(text);
  if (simple !== null) return fraction(simple[0], simple[1], 0, Number(simple[2]), Number(simple[3]));
  const decimal = DECIMAL.exec(text)?.[0];
  return decimal === undefined ? null : decimalNumber(decimal);
}

function fraction(
  text: string,
  sign: string | undefined,
  whole: number,
  above: number,
  below: number,
): ReturnType<typeof leadingNumber> {
  if (below === 0) return { fault: 'zero denominator', length: text.length };
  const magnitude = whole + above / below;
  return { number: sign === '-' || sign === '−' ? -magnitude : magnitude, length: text.length };
}

function decimalNumber(text: string): ReturnType<typeof leadingNumber> {
  const number = Number(text.replaceAll('−', '-'));
  if (!Number.isFinite(number)) return { fault: 'infinite', length: text.length };
  if (significantDigits(text) > MAX_DIGITS) return { fault: 'digits', length: text.length };
  if (number === 0 && /[1-9]/.test(text.split(/[eE]/)[0] ?? '')) return { fault: 'infinite', length: text.length };
  return { number, length: text.length };
}

function significantDigits(text: string): number {
  const mantissa = text.split(/[eE]/)[0] ?? '';
  return mantissa.replace(/[^\d]/g, '').replace(/^0+/, '').length;
}
