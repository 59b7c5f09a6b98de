import { error, type Diagnostic } from '../diagnostics/diagnostic.ts';
import { parseUnit } from '../units/parse-unit.ts';
import { spanIn, type SourceText } from './source-text.ts';
import { endsValue, startsValue, type Token } from './token.ts';

export const MAX_DEPTH = 60;

/** Brackets that do not close, commas outside calls, values side by side, and nesting that is too deep: all of them. */
export function checkSequence(source: SourceText, tokens: readonly Token[]): Diagnostic[] {
  return [
    ...checkBrackets(source, tokens),
    ...checkNeighbours(source, tokens),
    ...checkDepth(source, tokens),
    ...checkComparisons(source, tokens),
  ];
}

function checkBrackets(source: SourceText, tokens: readonly Token[]): Diagnostic[] {
  const found: Diagnostic[] = [];
  const open: { readonly token: Token; readonly call: boolean }[] = [];
  for (const [i, token] of tokens.entries()) {
    const span = spanIn(source, token.start, token.end);
    if (token.kind === 'open') {
      open.push({ token, call: tokens[i - 1]?.kind === 'function' });
    } else if (token.kind === 'close') {
      if (open.pop() === undefined) found.push(error('EXPRESSION_SYNTAX', span, 'this bracket closes nothing'));
    } else if (token.kind === 'comma' && open.at(-1)?.call !== true) {
      found.push(strayComma(source, tokens, i));
    }
  }
  const unclosed = open.map(({ token }) =>
    error('EXPRESSION_SYNTAX', spanIn(source, token.start, token.end), 'this bracket is not closed', {
      hints: ['add `)`'],
    }),
  );
  return [...found, ...unclosed];
}

function strayComma(source: SourceText, tokens: readonly Token[], at: number): Diagnostic {
  const [before, comma, after] = [tokens[at - 1], tokens[at], tokens[at + 1]];
  const betweenDigits = before?.kind === 'number' && (after?.kind === 'number' || after?.kind === 'quantity');
  const hint = betweenDigits
    ? 'write decimals with a point (`1.5`) and thousands without a separator (`1650`)'
    : 'commas separate the arguments of a function';
  return error(
    'EXPRESSION_SYNTAX',
    spanIn(source, comma?.start ?? 0, comma?.end ?? 0),
    'a comma stands outside a function call',
    {
      hints: [hint],
    },
  );
}

/** Values side by side, as in `2 a` or `(a)(b)`: a run of them is one fault. */
function checkNeighbours(source: SourceText, tokens: readonly Token[]): Diagnostic[] {
  const found: Diagnostic[] = [];
  let reported = -1;
  for (let i = 1; i < tokens.length; i++) {
    const [left, right] = [tokens[i - 1], tokens[i]];
    if (left === undefined || right === undefined || !endsValue(left) || !startsValue(right)) continue;
    if (reported !== i - 1) {
      const span = spanIn(source, left.start, right.end);
      found.push(
        error('EXPRESSION_NOT_ALLOWED', span, neighbourFault(left, right), {
          hints: [neighbourHint(source, left, right)],
        }),
      );
    }
    reported = i;
  }
  return found;
}

function neighbourFault(left: Token, right: Token): string {
  if (isNumeric(left) && isNumeric(right)) return 'two numbers stand side by side';
  if (left.kind === 'text' || right.kind === 'text') return 'two values stand side by side';
  return 'a product is written without `*`';
}

function isNumeric({ kind }: Token): boolean {
  return kind === 'number' || kind === 'quantity';
}

const WORD_OPERATORS = new Set(['mod', 'and', 'or', 'xor', 'not']);

function neighbourHint({ text }: SourceText, left: Token, right: Token): string {
  const [a, b] = [text.slice(left.start, left.end), text.slice(right.start, right.end)];
  if (left.kind === 'number' && (right.kind === 'number' || right.kind === 'quantity')) {
    const mixed = /^\d+$/.test(a) ? `; a mixed number is written \`${a}-1/2\`` : '';
    return `a number has no spaces inside${mixed}`;
  }
  if (left.kind === 'quantity' && left.unit.text === '%')
    return 'percent is a unit here; there is no remainder operator';
  if (WORD_OPERATORS.has(a) || WORD_OPERATORS.has(b))
    return 'the operators are + - * / ^; there is no remainder and no logic';
  if (b === 'in' || (left.kind === 'name' && left.text === 'in'))
    return 'to show the result in a unit, write `to` and the unit at the end';
  if (left.kind !== 'quantity' && right.kind === 'name' && parseUnit(b) !== null) {
    return `a unit follows a number; to show the result in \`${b}\`, write \`to ${b}\` at the end`;
  }
  if (right.kind === 'function') return `write \`${a}*${b}(…)\``;
  if (left.kind === 'close' || right.kind === 'open') return `write \`*\` between \`${a}\` and \`${b}\``;
  return `write \`${a}*${b}\``;
}

/** Brackets, runs of signs and towers of powers nest; everything else stays flat. */
function checkDepth(source: SourceText, tokens: readonly Token[]): Diagnostic[] {
  let pending = [0];
  let depth = 0;
  for (const [i, token] of tokens.entries()) {
    const previous = tokens[i - 1];
    const isSign = token.kind === 'operator' && (previous === undefined || !endsValue(previous));
    const top = pending.length - 1;
    if (token.kind === 'open') {
      pending.push(0);
      depth += 1;
    } else if (token.kind === 'close' && top > 0) {
      depth -= 1 + (pending[top] ?? 0);
      pending = pending.slice(0, top);
    } else if (isSign || (token.kind === 'operator' && token.text === '^')) {
      pending[top] = (pending[top] ?? 0) + 1;
      depth += 1;
    } else if (token.kind === 'operator' || token.kind === 'comma') {
      depth -= pending[top] ?? 0;
      pending[top] = 0;
    }
    if (depth > MAX_DEPTH) return [tooDeep(source, token)];
  }
  return [];
}

function tooDeep(source: SourceText, token: Token): Diagnostic {
  const span = spanIn(source, token.start, token.end);
  return error('EXPRESSION_TOO_LARGE', span, `the formula is nested deeper than ${MAX_DEPTH} levels`, {
    hints: ['split it into several steps'],
  });
}

/** Comparisons stand in checks, and one stands in the first argument of `where`. */
function checkComparisons(source: SourceText, tokens: readonly Token[]): Diagnostic[] {
  const allowed = comparisonsOfWhere(tokens);
  return tokens
    .filter((token) => token.kind === 'comparison' && !allowed.has(token))
    .map((token) =>
      error(
        'EXPRESSION_NOT_ALLOWED',
        spanIn(source, token.start, token.end),
        `\`${token.text}\` stands where a formula is wanted`,
        {
          hints: [
            'comparisons stand under `checks`, one in each and outside brackets, and in the first argument of `where(…)`',
          ],
        },
      ),
    );
}

/** The first comparison directly in the first argument of each call of `where`. */
function comparisonsOfWhere(tokens: readonly Token[]): ReadonlySet<Token> {
  const allowed = new Set<Token>();
  const open: { waits: boolean }[] = [];
  for (const [i, token] of tokens.entries()) {
    const inside = open.at(-1);
    if (token.kind === 'open') {
      const before = tokens[i - 1];
      open.push({ waits: before?.kind === 'function' && before.text === 'where' });
    } else if (token.kind === 'close') {
      open.pop();
    } else if (inside !== undefined && inside.waits && (token.kind === 'comma' || token.kind === 'comparison')) {
      inside.waits = false;
      if (token.kind === 'comparison') allowed.add(token);
    }
  }
  return allowed;
}
