import { error, type Diagnosed, type Diagnostic, type Span } from '../diagnostics/diagnostic.ts';
import { leadingNumber, type NumberFault } from './parse-number.ts';
import { parseUnit } from './parse-unit.ts';
import type { Unit } from './unit.ts';
import { unknownUnit } from './unknown-unit.ts';

export interface ParsedQuantity {
  readonly number: number;
  /** The number as typed, for display: `905`, `3/4`, `15 ft 4`. */
  readonly numberText: string;
  readonly unit: Unit;
  readonly span: Span;
}

const NO_UNIT = '1';
const FEET_AND_INCHES = /^([-+−]?\d+)\s*ft\s+(\S+)\s*in$/;

/**
 * Reads a value as an engineer writes it: a number and a unit (`905 psig`, `2.4 %`, `3/4 in`), feet and inches
 * (`5 ft 3-1/2 in`), or a bare number.
 *
 * @param text exactly what `span` covers
 */
export function parseQuantity(text: string, span: Span): Diagnosed<ParsedQuantity> {
  const start = text.length - text.trimStart().length;
  const written = text.trim();
  const within = (from: number, to: number): Span => ({
    ...span,
    start: span.start + start + from,
    end: span.start + start + to,
  });
  if (written === '') return fail(error('QUANTITY_SYNTAX', span, 'the value is empty', { hints: [EXAMPLES] }));
  return readFeetAndInches(written, within) ?? readNumberAndUnit(written, within);
}

type Within = (from: number, to: number) => Span;

const EXAMPLES = 'write a number and a unit, such as `905 psig`, `2.4 %` or `3/4 in`';

function readFeetAndInches(text: string, within: Within): Diagnosed<ParsedQuantity> | null {
  const match = FEET_AND_INCHES.exec(text);
  const [feet, inches] = [match?.[1], match?.[2]];
  if (feet === undefined || inches === undefined) return null;
  const [whole, part] = [leadingNumber(feet), leadingNumber(inches)];
  if (whole === null || part === null || 'fault' in whole || 'fault' in part || part.length !== inches.length)
    return null;
  if (part.number < 0 || part.number >= 12) {
    return fail(
      error(
        'QUANTITY_SYNTAX',
        within(text.indexOf(inches, feet.length), text.length),
        'the inches of a foot run from 0 to 12',
      ),
    );
  }
  const sign = /^[-−]/.test(feet) ? -1 : 1;
  // In inches, since `15 ft 4 in` is a whole number of them; shown as typed, the unit being the last word.
  const number = whole.number * 12 + sign * part.number;
  return {
    value: { number, numberText: text.replace(/\s*in$/, ''), unit: knownUnit('in'), span: within(0, text.length) },
    diagnostics: [],
  };
}

function readNumberAndUnit(text: string, within: Within): Diagnosed<ParsedQuantity> {
  const number = leadingNumber(text);
  if (number === null) return fail(notANumber(text, within));
  if ('fault' in number) return fail(numberFault(number.fault, within(0, number.length)));
  const rest = text.slice(number.length);
  const odd = oddContinuation(rest, number.length, text, within);
  if (odd !== null) return fail(odd);
  const unitText = rest.trim();
  const unit = parseUnit(unitText === '' ? NO_UNIT : unitText);
  if (unit === null) return fail(unknownUnit(unitText, within(text.length - unitText.length, text.length)));
  const numberText = text.slice(0, number.length);
  return { value: { number: number.number, numberText, unit, span: within(0, text.length) }, diagnostics: [] };
}

/** Continuations that look like a unit to nobody, each with its own remedy. */
function oddContinuation(rest: string, at: number, text: string, within: Within): Diagnostic | null {
  const span = within(0, text.length);
  if (rest.startsWith('..')) {
    return error('QUANTITY_SYNTAX', span, 'a range stands where one value is wanted', {
      hints: ['ranges along an axis are not offered in this version; give one value'],
    });
  }
  if (/^,\d/.test(rest)) {
    return error('QUANTITY_SYNTAX', within(0, at + rest.search(/[^,\d.]|$/)), 'a comma stands inside a number', {
      hints: ['write thousands without a separator (`1650`) and decimals with a point (`1.5`)'],
    });
  }
  if (/^_\d/.test(rest)) {
    return error('QUANTITY_SYNTAX', span, 'an underscore stands inside a number', {
      hints: ['write `1000`, without a separator'],
    });
  }
  return null;
}

function notANumber(text: string, within: Within): Diagnostic {
  return error('QUANTITY_SYNTAX', within(0, text.length), `\`${clip(text)}\` is not a number with a unit`, {
    hints: [EXAMPLES, 'a formula belongs under `steps`'],
  });
}

/** Why a number cannot be held, at its place. */
export function numberFault(fault: NumberFault, span: Span): Diagnostic {
  switch (fault) {
    case 'infinite':
      return error('NUMBER_NOT_FINITE', span, 'the number is too large or too small to be held');
    case 'digits':
      return error(
        'NUMBER_NOT_FINITE',
        span,
        'the number has more digits than can be held, and would lose some of them',
        {
          hints: ['give at most 17 significant digits'],
        },
      );
    case 'zero denominator':
      return error('DIVISION_BY_ZERO', span, 'the fraction has a denominator of zero');
  }
}

function knownUnit(text: string): Unit {
  const unit = parseUnit(text);
  if (unit === null) throw new Error(`no unit ${text}`);
  return unit;
}

function clip(text: string): string {
  return text.length > 40 ? `${text.slice(0, 40)}…` : text;
}

function fail(diagnostic: Diagnostic): Diagnosed<ParsedQuantity> {
  return { diagnostics: [diagnostic] };
}
