import { error, type Diagnostic } from '../diagnostics/diagnostic.ts';
import { REFUSED_SIGNS, type RefusedSign } from './refused-signs.ts';
import { matchAt, scanNumber } from './scan-quantity.ts';
import { spanIn, type SourceText } from './source-text.ts';
import type { Token } from './token.ts';
import type { ArithmeticOperator, ComparisonOperator } from './tree.ts';

export interface Scan {
  readonly tokens: readonly Token[];
  /** Where `to UNIT` stands at the end: the word `to`, and the text behind it. */
  readonly to?: { readonly start: number; readonly unitStart: number; readonly unitEnd: number };
  readonly diagnostics: readonly Diagnostic[];
}

export const MAX_LENGTH = 2000;
export const MAX_TOKENS = 1000;

const SPACE = /[ \t\r\n]+/y;
const WORD = /[A-Za-z_][A-Za-z0-9_]*/y;
const CALL_BRACKET = /[ \t\r\n]*\(/y;
/** Printable Latin letters and signs: what reports can typeset. */
const QUOTED =
  /'[\u0020-\u0026\u0028-\u007E\u00C0-\u00D6\u00D8-\u00F6\u00F8-\u00FF]*'|"[\u0020\u0021\u0023-\u007E\u00C0-\u00D6\u00D8-\u00F6\u00F8-\u00FF]*"/y;
const COMPARISON = /<=|>=|[<>≤≥](?![<>=])/y;

/** `**` and `//` have a meaning elsewhere, and are refused by name. */
const DOUBLED = /\*\*|\/\//y;

const OPERATORS = new Set<string>(['+', '-', '*', '/', '^'] satisfies ArithmeticOperator[]);
const BRACKETS: ReadonlyMap<string, 'open' | 'close' | 'comma'> = new Map([
  ['(', 'open'],
  [')', 'close'],
  [',', 'comma'],
]);
const COMPARISONS: Readonly<Record<string, ComparisonOperator>> = {
  '<': '<',
  '<=': '<=',
  '≤': '<=',
  '>': '>',
  '>=': '>=',
  '≥': '>=',
};
const SUPERSCRIPTS: Readonly<Record<string, number>> = { '²': 2, '³': 3 };

/** Cuts a formula's text into words and signs. Every fault is reported; with one, the tokens are not to be used. */
export function scanTokens(source: SourceText): Scan {
  if (source.text.length > MAX_LENGTH) return { tokens: [], diagnostics: [tooLong(source)] };
  return new Scanner(source).scan();
}

class Scanner {
  private readonly source: SourceText;
  private readonly tokens: Token[] = [];
  private readonly diagnostics: Diagnostic[] = [];
  private at = 0;
  private depth = 0;

  constructor(source: SourceText) {
    this.source = source;
  }

  scan(): Scan {
    const { text } = this.source;
    while (this.at < text.length) {
      if (this.tokens.length >= MAX_TOKENS) return { tokens: [], diagnostics: [tooManyParts(this.source, this.at)] };
      const spaceEnd = matchAt(SPACE, text, this.at);
      if (spaceEnd !== null) this.at = spaceEnd;
      else if (this.atConversion()) return this.conversion();
      else if (!this.word() && !this.number() && !this.sign() && !this.quoted() && !this.comparison()) this.refused();
    }
    return { tokens: this.tokens, diagnostics: this.diagnostics };
  }

  private word(): boolean {
    const end = matchAt(WORD, this.source.text, this.at);
    if (end === null) return false;
    const text = this.source.text.slice(this.at, end);
    if (text === 'to') this.report(end, toInside());
    const kind = matchAt(CALL_BRACKET, this.source.text, end) === null ? 'name' : 'function';
    this.push({ kind, start: this.at, end, text });
    return true;
  }

  private number(): boolean {
    const scan = scanNumber(this.source, this.at, this.tokens);
    if (scan === null) return false;
    if ('token' in scan) this.tokens.push(scan.token);
    else this.diagnostics.push(scan.fault);
    this.at = scan.end;
    return true;
  }

  private quoted(): boolean {
    const end = matchAt(QUOTED, this.source.text, this.at);
    if (end === null) return false;
    this.push({ kind: 'text', start: this.at, end, text: this.source.text.slice(this.at + 1, end - 1) });
    return true;
  }

  private comparison(): boolean {
    const end = matchAt(COMPARISON, this.source.text, this.at);
    const operator = end === null ? undefined : COMPARISONS[this.source.text.slice(this.at, end)];
    if (end === null || operator === undefined) return false;
    this.push({ kind: 'comparison', start: this.at, end, text: operator });
    return true;
  }

  private sign(): boolean {
    const { text } = this.source;
    const character = text.charAt(this.at);
    const [start, end] = [this.at, this.at + 1];
    const power = SUPERSCRIPTS[character];
    const bracket = BRACKETS.get(character);
    if (power !== undefined) {
      this.push({ kind: 'operator', start, end, text: '^' });
      this.push({ kind: 'number', start, end, value: power, text: String(power) });
    } else if (bracket !== undefined) {
      this.depth += bracket === 'open' ? 1 : bracket === 'close' ? -1 : 0;
      this.push({ kind: bracket, start, end, text: character });
    } else if (isOperator(character) && matchAt(DOUBLED, text, start) === null) {
      this.push({ kind: 'operator', start, end, text: character });
    } else {
      return false;
    }
    return true;
  }

  private refused(): void {
    const { text } = this.source;
    for (const refused of REFUSED_SIGNS) {
      const end = matchAt(refused.sign, text, this.at);
      if (end === null) continue;
      this.report(end, refused);
      this.at = end;
      return;
    }
    throw new Error(`no rule for the character at ${this.at}`);
  }

  private atConversion(): boolean {
    const end = matchAt(WORD, this.source.text, this.at);
    return end !== null && this.depth <= 0 && this.source.text.slice(this.at, end) === 'to';
  }

  private conversion(): Scan {
    const start = this.at;
    const rest = this.source.text.slice(start + 2);
    const unitStart = start + 2 + (rest.length - rest.trimStart().length);
    const unitEnd = Math.max(unitStart, this.source.text.trimEnd().length);
    return { tokens: this.tokens, to: { start, unitStart, unitEnd }, diagnostics: this.diagnostics };
  }

  private push(token: Token): void {
    this.tokens.push(token);
    this.at = token.end;
  }

  private report(end: number, { code, message, hint }: Omit<RefusedSign, 'sign'>): void {
    const hints = hint === undefined ? [] : [hint];
    this.diagnostics.push(error(code, spanIn(this.source, this.at, end), message, { hints }));
  }
}

function isOperator(character: string): character is ArithmeticOperator {
  return OPERATORS.has(character);
}

function toInside(): Omit<RefusedSign, 'sign'> {
  return {
    code: 'EXPRESSION_NOT_ALLOWED',
    message: '`to` stands inside brackets',
    hint: '`to` says how the result is shown, and stands at the very end; inside, no conversion is needed',
  };
}

function tooLong(source: SourceText): Diagnostic {
  return error(
    'EXPRESSION_TOO_LARGE',
    source.span,
    `the formula has ${source.text.length} characters, more than ${MAX_LENGTH}`,
    {
      hints: ['split it into several steps'],
    },
  );
}

function tooManyParts(source: SourceText, at: number): Diagnostic {
  const span = spanIn(source, at, source.text.length);
  return error('EXPRESSION_TOO_LARGE', span, `the formula has more than ${MAX_TOKENS} words and signs`, {
    hints: ['split it into several steps'],
  });
}
