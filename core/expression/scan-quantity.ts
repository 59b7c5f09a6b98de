import { error, type Diagnostic } from '../diagnostics/diagnostic.ts';
import { leadingNumber } from '../units/parse-number.ts';
import { numberFault, parseQuantity } from '../units/parse-quantity.ts';
import { parseUnit, suggestUnits } from '../units/parse-unit.ts';
import { CONSTANTS } from './constants.ts';
import { MATHEMATICS } from './mathematics.ts';
import { spanIn, type SourceText } from './source-text.ts';
import type { Token } from './token.ts';
import { unknownUnit } from '../units/unknown-unit.ts';

/** A number or a quantity literal, or what is wrong with it; either way scanning goes on at `end`. */
export type NumberScan = { readonly end: number } & ({ readonly token: Token } | { readonly fault: Diagnostic });

const DECIMAL = /(?:\d+(?:\.(?!\.)\d*)?|\.\d+)(?:[eE][-+]?\d+(?![A-Za-z0-9_]))?/y;
const FEET_AND_INCHES = /\d+\s*ft\s+\d[\d./-]*\s*in(?![A-Za-z0-9_^])/y;
const FRACTION = /\d+\/\d+(?![\d.])/y;
const MIXED = /\d+-\d+\/\d+(?![\d.])/y;
const SPACE = /\s*/y;
const WORD = /[A-Za-z_][A-Za-z0-9_]*/y;
/** Anything that could belong to a unit written without spaces. */
const UNIT_STRETCH = /[A-Za-zµμ°%][A-Za-z0-9_µμ°%²³⁴·*/^()-]*/y;
/** Behind a unit, which amplitude it measures. */
const AMPLITUDE = /[ \t]+(?:pk|pp|rms)(?![A-Za-z0-9_(])/y;
/** Where a unit may end: behind a word, a power or a bracket. */
const UNIT_PART = /[A-Za-z_µμ°%][A-Za-z0-9_µμ°%]*|\^-?\d+|\^\(-?\d+\)|[²³⁴)]/g;

/**
 * Reads what begins with a digit at `at`. A number directly followed by a unit is one quantity; the unit takes along
 * `/unit`, `*unit` and powers only when they are written without spaces, so `10 N/m` is newton per metre, and
 * `10 N / m` divides by the quantity `m`.
 *
 * @param before the tokens read so far
 */
export function scanNumber(source: SourceText, at: number, before: readonly Token[]): NumberScan | null {
  const feet = matchAt(FEET_AND_INCHES, source.text, at);
  if (feet !== null) return quantity(source, at, feet);
  return scanFraction(source, at, before) ?? scanDecimal(source, at, before);
}

/** `3/4 in`, `3-1/2 in`: whole numbers without spaces, then a unit. */
function scanFraction(source: SourceText, at: number, before: readonly Token[]): NumberScan | null {
  const { text } = source;
  const mixed = matchAt(MIXED, text, at);
  const numberEnd = mixed ?? matchAt(FRACTION, text, at);
  const end = numberEnd === null ? null : unitEnd(text, skipSpace(text, numberEnd));
  if (end === null) return null;
  const previous = before.at(-1);
  const takesNext = previous?.kind === 'operator' && (mixed === null ? '/^' : '*/^').includes(previous.text);
  if (!takesNext) return quantity(source, at, end);
  const written = text.slice(at, end);
  const fault = error(
    'EXPRESSION_SYNTAX',
    spanIn(source, at, end),
    `\`${written}\` can be read in two ways behind \`${previous.text}\``,
    {
      hints: [`put brackets around it: \`(${written})\`, or spaces around its signs`],
    },
  );
  return { end, fault };
}

function scanDecimal(source: SourceText, at: number, before: readonly Token[]): NumberScan | null {
  const { text } = source;
  const end = matchAt(DECIMAL, text, at);
  if (end === null) return null;
  const digits = text.slice(at, end);
  const number = leadingNumber(digits);
  if (number === null) return null;
  if ('fault' in number) return { end, fault: numberFault(number.fault, spanIn(source, at, end)) };
  const token: Token = { kind: 'number', start: at, end, value: number.number, text: digits };
  const wordAt = skipSpace(text, end);
  const word = text.slice(wordAt, matchAt(WORD, text, wordAt) ?? wordAt);
  if (word === 'to' || isCall(text, wordAt + word.length, word)) return { end, token };
  const unit = unitEnd(text, wordAt);
  if (unit !== null) return splitQuotient(source, at, unit, before) ?? quantity(source, at, unit);
  if (word === '') return { end, token };
  return { end: wordAt + word.length, fault: notAUnit(source, token, wordAt, word) };
}

/** `3 / 4 in` and `2.5/4 in`: three quarters of an inch, or three over four inches? */
function splitQuotient(source: SourceText, at: number, end: number, before: readonly Token[]): NumberScan | null {
  const [dividend, slash] = before.slice(-2);
  if (dividend?.kind !== 'number' || slash?.kind !== 'operator' || slash.text !== '/') return null;
  const quantityText = source.text.slice(at, end);
  const fault = error(
    'EXPRESSION_SYNTAX',
    spanIn(source, dividend.start, end),
    'this quotient can be read in two ways',
    {
      hints: [
        `write \`${dividend.text} / (${quantityText})\`, or \`${dividend.text}/${quantityText}\` with whole numbers and no spaces for a fraction`,
      ],
    },
  );
  return { end, fault };
}

function quantity(source: SourceText, start: number, end: number): NumberScan {
  const text = source.text.slice(start, end);
  const { value, diagnostics } = parseQuantity(text, { file: source.span.file, start, end });
  if (value === undefined) {
    const [fault] = diagnostics;
    if (fault === undefined) throw new Error(`a quantity without a value and without a fault: ${text}`);
    return { end, fault: { ...fault, span: spanIn(source, fault.span.start, fault.span.end) } };
  }
  return {
    end,
    token: { kind: 'quantity', start, end, number: value.number, text: value.numberText, unit: value.unit },
  };
}

function notAUnit(source: SourceText, number: Token & { kind: 'number' }, at: number, word: string): Diagnostic {
  const product = `write \`${number.text}*${word}\``;
  const near = suggestUnits(word);
  if (CONSTANTS.has(word) || (near.length === 0 && /^.$|[_\d]/.test(word))) {
    return error(
      'EXPRESSION_NOT_ALLOWED',
      spanIn(source, number.start, at + word.length),
      'a product is written without `*`',
      {
        hints: [product],
      },
    );
  }
  return unknownUnit(word, spanIn(source, at, at + word.length), [`if \`${word}\` is a quantity, ${product}`]);
}

/** End of the longest unit that is written without spaces from `at` on; null when there is none. */
function unitEnd(text: string, at: number): number | null {
  const stretch = text.slice(at, matchAt(UNIT_STRETCH, text, at) ?? at);
  const ends = [...stretch.matchAll(UNIT_PART)].map((part) => part.index + part[0].length);
  const length = ends
    .reverse()
    .find((end) => !/[A-Za-z0-9_]/.test(stretch.charAt(end)) && parseUnit(stretch.slice(0, end)) !== null);
  if (length === undefined) return null;
  const end = at + length;
  return matchAt(AMPLITUDE, text, end) ?? end;
}

/** `2 sqrt(x)` lacks an operator before a call; `5 psi (x)` lacks one behind a quantity. `min` is both, and is meant as a call. */
function isCall(text: string, at: number, word: string): boolean {
  if (word === '' || text.charAt(skipSpace(text, at)) !== '(') return false;
  return MATHEMATICS.has(word) || parseUnit(word) === null;
}

function skipSpace(text: string, at: number): number {
  return matchAt(SPACE, text, at) ?? at;
}

/** End of a sticky pattern's match at an offset; null where it does not match. */
export function matchAt(pattern: RegExp, text: string, at: number): number | null {
  pattern.lastIndex = at;
  return pattern.test(text) ? pattern.lastIndex : null;
}
