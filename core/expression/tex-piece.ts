import type { Printed } from '../units/printed.ts';

/**
 * How tightly a piece of TeX holds together: a piece needs brackets where something tighter is wanted. A `quotient` is
 * written with a slash; a `whole` has its own fence (a fraction, a root, a call) but takes no exponent.
 */
export const LEVELS = { sum: 0, negative: 1, quotient: 2, product: 3, whole: 4, power: 5, atom: 6 } as const;

export type Level = keyof typeof LEVELS;

export interface Piece {
  readonly tex: string;
  readonly level: Level;
  /** Begins with digits: a thin space before it would make one number of two. */
  readonly startsNumeric: boolean;
  readonly endsNumeric: boolean;
  /** Carries a unit, which must not run into what follows. */
  readonly hasUnit: boolean;
}

export function piece(tex: string, level: Level, marks: Partial<Omit<Piece, 'tex' | 'level'>> = {}): Piece {
  return { tex, level, startsNumeric: false, endsNumeric: false, hasUnit: false, ...marks };
}

/** A value put in: a number with its unit. */
export function printedPiece({ number, unit, tex }: Printed): Piece {
  const hasUnit = unit !== '';
  const level = number.startsWith('-') ? 'negative' : hasUnit || /[^\d.]/.test(number) ? 'product' : 'atom';
  return piece(tex, level, { startsNumeric: true, endsNumeric: !hasUnit, hasUnit });
}

export function isLooser({ level }: Piece, than: Level): boolean {
  return LEVELS[level] < LEVELS[than];
}

export function bracketed({ tex }: Piece): Piece {
  return piece(`\\left(${tex}\\right)`, 'atom');
}

/** a + b, a − b. */
export function sum(left: Piece, operator: '+' | '-', right: Piece): Piece {
  const loose = right.level === 'negative' || (operator === '-' && right.level === 'sum');
  const second = loose ? bracketed(right) : right;
  return piece(`${left.tex} ${operator} ${second.tex}`, 'sum', {
    startsNumeric: left.startsNumeric,
    hasUnit: right.hasUnit,
  });
}

export function negative(operand: Piece): Piece {
  const inner = isLooser(operand, 'quotient') ? bracketed(operand) : operand;
  return { ...inner, tex: `-${inner.tex}`, level: 'negative' };
}

/** Symbols stand side by side with a thin space; numbers are kept apart by a cross. */
export function product(left: Piece, right: Piece): Piece {
  const first = left.level === 'sum' || left.level === 'quotient' ? bracketed(left) : left;
  const second = isLooser(right, 'product') ? bracketed(right) : right;
  const twoNumbers =
    first.endsNumeric && (right.startsNumeric || right.tex.startsWith('\\frac')) && right.level !== 'sum';
  const cross = second.startsNumeric || first.hasUnit || twoNumbers;
  return piece(
    first.tex + (cross ? ' \\times ' : '\\,') + second.tex,
    first.level === 'negative' ? 'negative' : 'product',
    {
      startsNumeric: first.startsNumeric,
      endsNumeric: second.endsNumeric,
      hasUnit: first.hasUnit || second.hasUnit,
    },
  );
}

/** a/b on one line, for places that are too small for a fraction. */
export function quotient(left: Piece, right: Piece): Piece {
  const first = left.hasUnit || left.level === 'sum' || left.level === 'quotient' ? bracketed(left) : left;
  const second = right.hasUnit || isLooser(right, 'whole') ? bracketed(right) : right;
  return piece(`${first.tex}/${second.tex}`, first.level === 'negative' ? 'negative' : 'quotient', {
    startsNumeric: first.startsNumeric,
    endsNumeric: second.endsNumeric,
  });
}

export function fraction(above: Piece, below: Piece): Piece {
  return piece(`\\frac{${above.tex}}{${below.tex}}`, 'whole');
}

export function power(base: Piece, exponent: Piece): Piece {
  const held = isLooser(base, 'atom') ? bracketed(base) : base;
  // A symbol with a script of its own, such as p^* or p', takes no second one without braces.
  const tex = held === base && /['^]/.test(held.tex) ? `{${held.tex}}` : held.tex;
  return piece(`${tex}^{${exponent.tex}}`, 'power', { startsNumeric: held.startsNumeric });
}
