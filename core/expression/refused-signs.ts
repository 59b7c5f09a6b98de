import type { DiagnosticCode } from '../diagnostics/codes.ts';

/** A sign that formulas do not have, what is wrong with it, and what was probably meant. */
export interface RefusedSign {
  readonly sign: RegExp;
  readonly code: DiagnosticCode;
  readonly message: string;
  readonly hint?: string;
}

const COMPARE = 'a check compares with `<`, `<=`, `>` or `>=`';
const NAMES = 'names have letters A to Z, digits and `_`';

/** In the order in which they are tried: longer signs before their beginnings, and at the end all that is left. */
export const REFUSED_SIGNS: readonly RefusedSign[] = [
  refuse(/\*\*/y, '`**` is no operator', 'a power is written with `^`'),
  refuse(/\/\//y, '`//` is no operator', 'a quotient is written with one `/`'),
  refuse(/:=/y, '`:=` stands in a formula', 'the key names the quantity: `A: pi/4*D^2`'),
  refuse(/[=!]==?|[≠≈]/y, 'equality is tested', COMPARE),
  refuse(/=[<>]|<>/y, 'this is no comparison', COMPARE),
  refuse(/=/y, '`=` stands in a formula', `${COMPARE}; a quantity gets its name from its key: \`A: pi/4*D^2\``),
  refuse(/!/y, '`!` is no operator', 'factorials are not offered'),
  refuse(
    /%/y,
    '`%` stands without a number before it',
    'percent follows a number, as in `2.4 %`; there is no remainder',
  ),
  refuse(/\.\.+/y, 'a range stands in a formula', 'a formula takes single values'),
  refuse(/[[\]]/y, 'square brackets stand in a formula', 'group with `(` and `)`; lists are not offered'),
  refuse(/[{}]/y, 'braces stand in a formula', 'group with `(` and `)`'),
  refuse(/\?\??/y, '`?` stands in a formula', 'there are no conditions; use min(…) or max(…)'),
  refuse(/;/y, '`;` stands in a formula', 'give each formula a step of its own, and separate arguments with commas'),
  refuse(/:/y, '`:` stands in a formula', 'ranges and conditions are not offered'),
  refuse(/[&|]+|[~¬]/y, 'a logical operator stands in a formula', 'give each condition a check of its own'),
  refuse(
    /\\+/y,
    'a backslash stands in a formula',
    'TeX belongs in prose and symbols; here write `sqrt(x)`, `pi`, `a/b`',
  ),
  refuse(/[×·∙⋅]/y, 'this multiplication sign is no operator', 'a product is written with `*`'),
  refuse(/[÷∕⁄]/y, 'this division sign is no operator', 'a quotient is written with `/`'),
  refuse(/[−–—‐‑]/y, 'this dash is no minus sign', 'write the minus sign as `-`, the key on the keyboard'),
  refuse(/√/y, '`√` is no operator', 'write `sqrt(x)`'),
  refuse(/π/y, '`π` is no name', 'write `pi`'),
  refuse(
    /[‘’‚‛“”„‟«»]/y,
    'a curly quotation mark stands in a formula',
    "write texts between straight quotation marks: 'Sch 80'",
  ),
  refuse(/\p{L}[\p{L}\p{M}]*/uy, 'this letter is not allowed in a name', `${NAMES}: write \`rho\`, \`omega\``),
  refuse(
    /[\u00A0\u2000-\u200B\u202F\u205F\u3000\uFEFF]+/y,
    'a space that is no plain space stands in the formula',
    'replace it by a plain space',
  ),
  refuse(/\./y, '`.` stands outside a number', `${NAMES}; a decimal number begins with a digit: \`0.5\``),
  refuse(
    /'[^'\n]*'|"[^"\n]*"/y,
    'this text has a character that a report cannot show',
    'texts have Latin letters, digits and the signs of the keyboard',
  ),
  refuse(/["']/y, 'a quoted text is not closed', "write texts between quotation marks: 'Sch 80'", 'EXPRESSION_SYNTAX'),
  refuse(/[<>≤≥]+=*/y, 'this is no comparison', COMPARE),
  refuse(
    /[^\sA-Za-z0-9_+\-*/^(),<>≤≥²³'"]+/uy,
    'this character is not allowed in a formula',
    `${NAMES}; operators are + - * / ^`,
  ),
  refuse(/\s/y, 'this kind of space is not allowed in a formula', 'replace it by a plain space'),
];

function refuse(
  sign: RegExp,
  message: string,
  hint: string,
  code: DiagnosticCode = 'EXPRESSION_NOT_ALLOWED',
): RefusedSign {
  return { sign, code, message, hint };
}
