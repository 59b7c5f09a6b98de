import { AXIS_FUNCTIONS } from '../../../core/expression/axis-functions.ts';
import { MATHEMATICS } from '../../../core/expression/mathematics.ts';
import { LIBRARY } from '../../../core/library/catalogue.ts';
import { SHEET_SCHEMA } from '../../../core/sheet/generated/sheet-schema.js';
import { UNIT_NAMES } from '../../../core/units/table.ts';

/** Every function that a formula may call, with how many arguments it takes. */
export const FUNCTIONS: readonly { readonly name: string; readonly arity: number }[] = [
  ...LIBRARY.values(),
  ...MATHEMATICS.values(),
  ...AXIS_FUNCTIONS.values(),
].map(({ name, parameters }) => ({ name, arity: parameters.length }));

/** Calls that stand as examples beside the functions: sound by themselves, or nearly so. */
export const EXAMPLE_CALLS: readonly string[] = [
  ...LIBRARY.values(),
  ...MATHEMATICS.values(),
  ...AXIS_FUNCTIONS.values(),
].map(({ example }) => example.call);

export const UNITS: readonly string[] = [
  ...UNIT_NAMES,
  'lbm/ft^3', 'kg/(m*s)', 'BTU/(lbm*degF)', 'ft/s^2', 'm^2', 'in^4', 'N*m', '1/s', 's^-1', 'psig^2', 'furlong', 'PSIG',
]; // prettier-ignore

/** The keys that the sheet's schema knows, at any depth. */
export const SHEET_KEYS: readonly string[] = [...new Set(keysOf(SHEET_SCHEMA))].sort();

export const EXTREMES: readonly string[] = [
  '1e308', '-1e308', '1.7976931348623157e308', '1e309', '1e400', '-0', '0', '0.0', '00', '007', '-1', 'NaN', '.nan',
  '.inf', '-.inf', 'Infinity', '1e-320', '5e-324', '1e-400', '9007199254740993', '0x1F', '0o17', '1_000', '1,5', '1e',
  '1e+', '.5', '5.', '--1', '+1', '1/3', '1/0', '3-1/2', '1..5', '5..1', 'null', '~', 'true', '1e99999',
  '9'.repeat(400), `0.${'0'.repeat(400)}1`, `1e${'9'.repeat(30)}`, '-'.repeat(30) + '1',
]; // prettier-ignore

/** Characters and scraps that text files hold by accident, and some that they hold on purpose. */
export const SCRAPS: readonly string[] = [
  '\t', '\r', '\r\n', '\n', '\n\n', '\n  ', ' ', '\0', '\u0007', '\u001b[31m', '\u007f', '\u0085', '\u00a0', '\u00ad',
  '\u200b', '\u202e', '\u2028', '\u2029', '\ufeff', '\ufffd', '\uffff', '\ud800', '\udc00', '🜁', '👩‍🔧', 'e\u0301', 'ﬁ',
  'İ', 'µ', 'μ', '°', '−', '–', '×', '·', '²', '≤', '¾', '٣', '"', "'", '""', '`', '\\', '\\u0000', '\\"', '$', '$$',
  '{{', '}}', '{', '}', '[', ']', '(', ')', ')))', '(((', ',', ';', ':', ': ', '- ', '? ', '|', '|\n', '>-\n', '&a ',
  '*a', '!!binary ', '!!map ', '!x ', '!<tag:a> ', '---\n', '\n...\n', '%YAML 1.2\n---\n', '%TAG ! a\n', '<<: *a',
  '#', ' # ', '%', '^', '^^', '<', '<=', '>=', '==', '!=', '=', '&&', '||', '..', '...', ' to ', ' step ', '@', '@0#x',
  '__proto__', 'constructor', 'toString', 'hasOwnProperty', 'valueOf', 'e', 'pi', 'i', 'K', 'psia', 'Infinity', 'end',
]; // prettier-ignore

function keysOf(schema: unknown): string[] {
  if (typeof schema !== 'object' || schema === null) return [];
  const properties = 'properties' in schema ? (schema.properties as object) : {};
  return [...Object.keys(properties), ...Object.values(schema).flatMap(keysOf)];
}
