import type { LibraryFunction } from '../library/function.ts';
import { printTyped } from '../units/print.ts';
import type { Printed } from '../units/printed.ts';
import { namedUnit } from '../units/table.ts';
import { AXIS_FUNCTIONS } from './axis-functions.ts';
import { CONSTANTS } from './constants.ts';
import { MATHEMATICS } from './mathematics.ts';
import { fraction, negative, piece, power, printedPiece, product, quotient, sum, type Piece } from './tex-piece.ts';
import type { Comparison, ComparisonOperator, Expression } from './tree.ts';

/** What the names of a formula look like in print. */
export interface TexOptions {
  /** TeX of a quantity's or gas's symbol. */
  readonly nameTex: (name: string) => string;
  /** Values to be put in the place of symbols; undefined for names that have none, such as gases. */
  readonly printed?: (name: string) => Printed | undefined;
  readonly functions: ReadonlyMap<string, LibraryFunction>;
}

/**
 * A formula in TeX: in symbols, `\frac{\pi}{4}\,D_{i}^{2}`, or with the values of its quantities put in,
 * `\frac{\pi}{4}\,\left(5.761\,\mathrm{in}\right)^{2}`.
 */
export function expressionTex(expression: Expression, options: TexOptions): string {
  return new Typesetter(options).set(expression, 'display').tex;
}

/** Both sides of a comparison in TeX, with its sign between them. */
export function comparisonTex({ left, operator, right }: Comparison, options: TexOptions): string {
  const typesetter = new Typesetter(options);
  return comparisonTexOf(operator, typesetter.set(left, 'display'), typesetter.set(right, 'display'));
}

function comparisonTexOf(operator: ComparisonOperator, left: Piece, right: Piece): string {
  return `${left.tex} ${COMPARISONS[operator]} ${right.tex}`;
}

const COMPARISONS: Readonly<Record<ComparisonOperator, string>> = { '<': '<', '<=': '\\le', '>': '>', '>=': '\\ge' };

/** `line`: within a fraction or an exponent, where quotients are written with a slash. */
type Place = 'display' | 'line';

class Typesetter {
  private readonly options: TexOptions;

  constructor(options: TexOptions) {
    this.options = options;
  }

  set(expression: Expression, place: Place): Piece {
    switch (expression.node) {
      case 'number':
        return printedPiece(printTyped(expression.text, plainUnit()));
      case 'quantity':
        return printedPiece(printTyped(expression.text, expression.unit));
      case 'name':
        return this.name(expression.name);
      case 'text':
        return piece(textTex(expression.value), 'atom');
      case 'negate':
        return negative(this.set(expression.operand, place));
      case 'binary':
        return this.binary(expression, place);
      case 'comparison':
        return piece(
          comparisonTexOf(expression.operator, this.set(expression.left, 'line'), this.set(expression.right, 'line')),
          'sum',
        );
      case 'call':
        return this.call(expression, place);
    }
  }

  private name(name: string): Piece {
    const constant = CONSTANTS.get(name);
    if (constant !== undefined) return piece(constant.tex, 'atom');
    const printed = this.options.printed?.(name);
    return printed === undefined ? piece(this.options.nameTex(name), 'atom') : printedPiece(printed);
  }

  private binary({ operator, left, right }: Expression & { node: 'binary' }, place: Place): Piece {
    switch (operator) {
      case '+':
      case '-':
        return sum(this.set(left, place), operator, this.set(right, place));
      case '*':
        return product(this.set(left, place), this.set(right, place));
      case '/': {
        const [a, b] = [this.set(left, 'line'), this.set(right, 'line')];
        return place === 'display' ? fraction(a, b) : quotient(a, b);
      }
      case '^':
        return power(this.set(left, place), this.set(right, 'line'));
    }
  }

  private call(call: Expression & { node: 'call' }, place: Place): Piece {
    const args = call.arguments.map((argument) => this.set(argument, place).tex);
    const builtIn = MATHEMATICS.get(call.function) ?? AXIS_FUNCTIONS.get(call.function);
    if (builtIn !== undefined) return piece(builtIn.tex(args), 'whole');
    const head = functionHead(this.options.functions.get(call.function)?.symbol ?? call.function);
    return piece(`${head}${bracketed(args)}`, 'whole');
  }
}

/** A function's symbol where it is TeX or one letter; a word is set upright, with a space where its name has one. */
function functionHead(symbol: string): string {
  if (!/^[A-Za-z][A-Za-z0-9]+(?:[ _][A-Za-z0-9]+)*$/.test(symbol)) return symbol;
  return `\\operatorname{${symbol.replace(/[ _]/g, '\\,')}}`;
}

function plainUnit(): ReturnType<typeof namedUnit> & object {
  const unit = namedUnit('1');
  if (unit === undefined) throw new Error('the unit table has no unit for plain numbers');
  return unit;
}

const ESCAPES: Readonly<Record<string, string>> = {
  '\\': '\\textbackslash ',
  '~': '\\textasciitilde ',
  '^': '\\textasciicircum ',
};

/** A quoted text, upright, with every character that TeX would read as a sign of its own made harmless. */
function textTex(value: string): string {
  return `\\text{${value.replace(/[\\~^{}$#%&_]/g, (character) => ESCAPES[character] ?? `\\${character}`)}}`;
}

/** Arguments in brackets. Flat ones may break after a comma, which TeX allows only outside of growing brackets. */
function bracketed(args: readonly string[]): string {
  const isTall = args.some((argument) => argument.includes('\\frac'));
  return isTall ? `\\left(${args.join(',\\ ')}\\right)` : `(${args.join(',\\allowbreak\\ ')})`;
}
