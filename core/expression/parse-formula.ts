import { error, hasErrors, type Diagnosed, type Diagnostic, type Span } from '../diagnostics/diagnostic.ts';
import { parseUnit } from '../units/parse-unit.ts';
import { buildTree } from './build-tree.ts';
import { scanTokens, type Scan } from './scan-tokens.ts';
import { spanIn, type SourceText } from './source-text.ts';
import type { Token } from './token.ts';
import type { Comparison, Formula } from './tree.ts';
import { unknownUnit } from '../units/unknown-unit.ts';

/**
 * Reads a formula: an expression, and at its end `to UNIT` where the result is to be shown in a certain unit.
 *
 * @param text the formula
 * @param span where it stands in the sheet; places inside it are found by counting characters
 */
export function parseFormula(text: string, span: Span): Diagnosed<Formula> {
  const source = { text, span };
  const scan = scanTokens(source);
  const to = conversion(source, scan);
  const found = [...scan.diagnostics, ...to.diagnostics];
  if (hasErrors(scan.diagnostics)) return { diagnostics: found };
  const { value: expression, diagnostics } = buildTree(source, scan.tokens);
  const all = [...diagnostics, ...found];
  if (expression === undefined || hasErrors(all)) return { diagnostics: all };
  return { value: { expression, ...(to.value === undefined ? {} : { to: to.value }) }, diagnostics: all };
}

/** Reads the one comparison of a check: `F <= F_lim`. */
export function parseComparison(text: string, span: Span): Diagnosed<Comparison> {
  const source = { text, span };
  const scan = scanTokens(source);
  const found = [...scan.diagnostics, ...refusedConversion(source, scan)];
  if (hasErrors(found)) return { diagnostics: found };
  const split = splitAtComparison(scan.tokens);
  if (split === null) return { diagnostics: [noComparison(source)] };
  const [left, right] = [buildTree(source, split.left), buildTree(source, split.right)];
  const diagnostics = [...sideFaults(source, split, left), ...sideFaults(source, split, right)];
  if (left.value === undefined || right.value === undefined) return { diagnostics };
  const start = split.left[0]?.start ?? 0;
  const end = split.right.at(-1)?.end ?? text.length;
  const comparison: Comparison = {
    operator: split.operator.text,
    left: left.value,
    right: right.value,
    span: spanIn(source, start, end),
  };
  return { value: comparison, diagnostics };
}

interface Split {
  readonly left: readonly Token[];
  readonly operator: Token & { readonly kind: 'comparison' };
  readonly right: readonly Token[];
}

/** At the first comparison outside brackets; further ones are refused when their side is read. */
function splitAtComparison(tokens: readonly Token[]): Split | null {
  let depth = 0;
  for (const [i, token] of tokens.entries()) {
    if (token.kind === 'open') depth += 1;
    else if (token.kind === 'close') depth -= 1;
    else if (token.kind === 'comparison' && depth === 0) {
      return { left: tokens.slice(0, i), operator: token, right: tokens.slice(i + 1) };
    }
  }
  return null;
}

/** An empty side is said of the operator that lacks it. */
function sideFaults(
  source: SourceText,
  { left, operator, right }: Split,
  side: Diagnosed<unknown>,
): readonly Diagnostic[] {
  if (side.value !== undefined || (left.length > 0 && right.length > 0)) return side.diagnostics;
  const span = spanIn(source, operator.start, operator.end);
  return side.diagnostics.map((fault) =>
    fault.span === source.span
      ? error('EXPRESSION_SYNTAX', span, `a value is missing beside \`${operator.text}\``)
      : fault,
  );
}

function noComparison(source: SourceText): Diagnostic {
  return error('EXPRESSION_SYNTAX', source.span, 'a check compares two values, and this compares nothing', {
    hints: ['write one of `<`, `<=`, `>`, `>=`, as in `F <= F_lim`'],
  });
}

function refusedConversion(source: SourceText, { to }: Scan): Diagnostic[] {
  if (to === undefined) return [];
  return [
    error('EXPRESSION_NOT_ALLOWED', spanIn(source, to.start, to.unitEnd), '`to` stands in a check', {
      hints: ['a check compares in any units; leave `to` and its unit out'],
    }),
  ];
}

function conversion(source: SourceText, { to }: Scan): Diagnosed<NonNullable<Formula['to']>> {
  if (to === undefined) return { diagnostics: [] };
  const text = source.text.slice(to.unitStart, to.unitEnd);
  const unit = parseUnit(text);
  const span = spanIn(source, to.unitStart, to.unitEnd);
  if (unit !== null) return { value: { unit, span }, diagnostics: [] };
  if (text === '') {
    return {
      diagnostics: [
        error('EXPRESSION_SYNTAX', spanIn(source, to.start, to.start + 2), 'a unit is missing behind `to`'),
      ],
    };
  }
  return { diagnostics: [afterUnit(source, to.unitStart, text) ?? unknownUnit(text, span)] };
}

/** `x to in + y`: a unit, and then more. */
function afterUnit(source: SourceText, at: number, text: string): Diagnostic | null {
  const space = /\s+/.exec(text);
  if (space === null || parseUnit(text.slice(0, space.index)) === null) return null;
  return error(
    'EXPRESSION_NOT_ALLOWED',
    spanIn(source, at + space.index + space[0].length, at + text.length),
    'more stands behind `to` and its unit',
    {
      hints: ['`to` says how the result is shown, and stands at the very end'],
    },
  );
}
