import { error, warning, type Diagnostic, type Span } from '../diagnostics/diagnostic.ts';
import { nearest } from '../diagnostics/nearest.ts';
import { parseUnit } from '../units/parse-unit.ts';
import { CONSTANTS } from './constants.ts';
import { BUILT_IN_NAMES, isBuiltIn } from './built-in.ts';
import type { Expression } from './tree.ts';
import type { TypeScope } from './type-scope.ts';

/** A name that stands where a value is wanted, and is none. */
export function misplacedName(name: string, span: Span, scope: TypeScope): Diagnostic {
  if (scope.gases.has(name)) return gasAsValue(name, span);
  if (scope.words?.has(name) === true) return wordsAsValue(name, span);
  return scope.tables.has(name) ? tableAsValue(name, span) : unknownName(name, span, scope);
}

/** A name that nothing defines, with the slip it probably is: a misspelling, a unit without a number, a call without brackets. */
function unknownName(name: string, span: Span, scope: TypeScope): Diagnostic {
  if (isBuiltIn(name) || scope.functions.has(name)) {
    return error('NAME_UNKNOWN', span, `\`${name}\` is a function, and stands without arguments`, {
      hints: [`write its arguments in brackets: \`${name}(…)\``],
    });
  }
  const near = nearest(name, [...scope.types.keys(), ...(scope.faulty ?? []), ...CONSTANTS.keys()], 3);
  const hints = near.length > 0 ? [`did you mean \`${near.join('`, `')}\`?`] : [];
  if (parseUnit(name) !== null)
    hints.push(`\`${name}\` is a unit, and a unit directly follows a number: \`5 ${name}\``);
  return error('NAME_UNKNOWN', span, `nothing is named \`${name}\``, { hints });
}

export function unknownFunction(name: string, span: Span, scope: TypeScope): Diagnostic {
  if (scope.types.has(name) || scope.faulty?.has(name) === true || CONSTANTS.has(name)) {
    return error('FUNCTION_UNKNOWN', span, `\`${name}\` is a quantity, and not a function`, {
      hints: [`a product is written with \`*\`: \`${name}*(…)\``],
    });
  }
  const near = nearest(name, [...BUILT_IN_NAMES, ...scope.functions.keys()], 3);
  const hint = near.length > 0 ? `did you mean \`${near.join('`, `')}\`?` : '`antinode functions` lists all functions';
  return error('FUNCTION_UNKNOWN', span, `there is no function \`${name}\``, { hints: [hint] });
}

function gasAsValue(name: string, span: Span): Diagnostic {
  return error('EXPRESSION_NOT_ALLOWED', span, `\`${name}\` is a gas, and has no value of its own`, {
    hints: [`a gas stands as an argument: \`molar_mass(${name})\``],
  });
}

function wordsAsValue(name: string, span: Span): Diagnostic {
  return error('EXPRESSION_NOT_ALLOWED', span, `\`${name}\` is a column of words, and has no value`, {
    hints: ['give the column a unit in the place of `text` if it holds quantities'],
  });
}

function tableAsValue(name: string, span: Span): Diagnostic {
  return error('EXPRESSION_NOT_ALLOWED', span, `\`${name}\` is a table, and has no value of its own`, {
    hints: [`a table is read at a point: \`interpolate(${name}, x)\``],
  });
}

export function unknownTable(name: string, span: Span, { tables }: TypeScope): Diagnostic {
  const near = nearest(name, tables.keys(), 3);
  const known = near.length > 0 ? near : [...tables.keys()].slice(0, 5);
  const hint = near.length > 0 ? `did you mean \`${near.join('`, `')}\`?` : `the sheet has \`${known.join('`, `')}\``;
  return error('NAME_UNKNOWN', span, `the sheet has no table \`${name}\``, {
    hints: [known.length > 0 ? hint : 'define it under `tables`'],
  });
}

export function unknownGas(name: string, span: Span, scope: TypeScope): Diagnostic {
  const near = nearest(name, scope.gases, 3);
  const known = near.length > 0 ? near : [...scope.gases].slice(0, 5);
  const hint =
    near.length > 0 ? `did you mean \`${near.join('`, `')}\`?` : `the sheet defines \`${known.join('`, `')}\``;
  return error('GAS_UNKNOWN', span, `the sheet defines no gas \`${name}\``, {
    hints: [known.length > 0 ? hint : 'define it under `gases`'],
  });
}

/** `100 N/m*L` has litres in it, which surprises whoever has a length L; `(100 N/m*L)` and `100 N/m * L` leave no doubt. */
export function unitOrName(quantity: Expression & { node: 'quantity' }, scope: TypeScope): Diagnostic[] {
  if (quantity.bracketed === true) return [];
  const { text, span, unit } = quantity;
  const [, ...further] = unit.text.match(/[A-Za-z_][A-Za-z0-9_]*/g) ?? [];
  const name = further.find((word) => scope.types.has(word) || scope.faulty?.has(word) === true);
  if (name === undefined) return [];
  return [
    warning('UNIT_OR_NAME', span, `\`${name}\` is read as a unit here, and is a quantity of the sheet as well`, {
      hints: [
        `if the unit is meant, put brackets around it: \`(${text} ${unit.text})\``,
        `if the quantity is meant, put spaces around the sign before \`${name}\``,
      ],
    }),
  ];
}
