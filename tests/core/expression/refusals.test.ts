import { describe, expect, it } from 'vitest';
import type { DiagnosticCode } from '../../../core/diagnostics/codes.ts';
import { comparisonFaults, faultsOf, underlined } from './support.ts';

type Case = readonly [text: string, code: DiagnosticCode, underlined: string, hint: string];

/** One fault each; the hint is a part of what is advised, '' where the message says it all. */
const CASES: readonly Case[] = [
  // products without a sign
  ['2 pi', 'EXPRESSION_NOT_ALLOWED', '2 pi', '`2*pi`'],
  ['2pi', 'EXPRESSION_NOT_ALLOWED', '2pi', '`2*pi`'],
  ['2 D_i', 'EXPRESSION_NOT_ALLOWED', '2 D_i', '`2*D_i`'],
  ['2(k)', 'EXPRESSION_NOT_ALLOWED', '2(', 'write `*` between'],
  ['(k)(n)', 'EXPRESSION_NOT_ALLOWED', ')(', 'write `*` between'],
  ['(k) n', 'EXPRESSION_NOT_ALLOWED', ') n', 'write `*` between'],
  ['k n n', 'EXPRESSION_NOT_ALLOWED', 'k n', '`k*n`'],
  ['2 sqrt(k)', 'EXPRESSION_NOT_ALLOWED', '2 sqrt', '`2*sqrt(…)`'],
  ['D_i psi', 'EXPRESSION_NOT_ALLOWED', 'D_i psi', 'to psi'],
  ['5 D_i in mm', 'EXPRESSION_NOT_ALLOWED', '5 D_i', '`5*D_i`'],
  ['D_i in', 'EXPRESSION_NOT_ALLOWED', 'D_i in', 'write `to`'],
  ['k mod n', 'EXPRESSION_NOT_ALLOWED', 'k mod', 'no remainder'],
  ['5 % 3', 'EXPRESSION_NOT_ALLOWED', '5 % 3', 'no remainder'],
  ['1 650', 'EXPRESSION_NOT_ALLOWED', '1 650', 'no spaces'],
  ['6 1/2 in', 'EXPRESSION_NOT_ALLOWED', '6 1/2 in', '6-1/2'],
  ['5 psi (k)', 'EXPRESSION_NOT_ALLOWED', '5 psi (', 'write `*` between'],
  // signs that formulas do not have
  ['k**2', 'EXPRESSION_NOT_ALLOWED', '**', '`^`'],
  ['A := k', 'EXPRESSION_NOT_ALLOWED', ':=', 'key'],
  ['A = k', 'EXPRESSION_NOT_ALLOWED', '=', 'a check compares'],
  ['f(x)=x', 'EXPRESSION_NOT_ALLOWED', '=', 'a check compares'],
  ['k == n', 'EXPRESSION_NOT_ALLOWED', '==', 'a check compares'],
  ['k != n', 'EXPRESSION_NOT_ALLOWED', '!=', 'a check compares'],
  ['n!', 'EXPRESSION_NOT_ALLOWED', '!', 'factorials'],
  ['k ? n : 2', 'EXPRESSION_NOT_ALLOWED', '?', 'conditions'],
  ['k; n', 'EXPRESSION_NOT_ALLOWED', ';', 'step of its own'],
  ['1..5', 'EXPRESSION_NOT_ALLOWED', '..', 'single values'],
  ['k:n', 'EXPRESSION_NOT_ALLOWED', ':', 'ranges'],
  ['k.constructor', 'EXPRESSION_NOT_ALLOWED', '.', 'names have letters'],
  ['k[1]', 'EXPRESSION_NOT_ALLOWED', '[', 'lists'],
  ['{}', 'EXPRESSION_NOT_ALLOWED', '{', 'group with'],
  ['k & n', 'EXPRESSION_NOT_ALLOWED', '&', 'check of its own'],
  ['% + 2', 'EXPRESSION_NOT_ALLOWED', '%', 'follows a number'],
  ['\\frac{1}', 'EXPRESSION_NOT_ALLOWED', '\\', 'sqrt'],
  ['k × n', 'EXPRESSION_NOT_ALLOWED', '×', '`*`'],
  ['k − n', 'EXPRESSION_NOT_ALLOWED', '−', '`-`'],
  ['2*π', 'EXPRESSION_NOT_ALLOWED', 'π', '`pi`'],
  ['ρ_1*2', 'EXPRESSION_NOT_ALLOWED', 'ρ', '`rho`'],
  ['k\u00A0+ n', 'EXPRESSION_NOT_ALLOWED', '\u00A0', 'plain space'],
  ['k + 😀', 'EXPRESSION_NOT_ALLOWED', '😀', 'operators are'],
  ['k + ’a’', 'EXPRESSION_NOT_ALLOWED', '’', 'straight'],
  ['k <= n', 'EXPRESSION_NOT_ALLOWED', '<=', '`checks`'],
  ["f('a✓b')", 'EXPRESSION_NOT_ALLOWED', "'a✓b'", 'Latin'],
  ['k <> n', 'EXPRESSION_NOT_ALLOWED', '<>', 'a check compares'],
  ['k << n', 'EXPRESSION_NOT_ALLOWED', '<<', 'a check compares'],
  ['k // n', 'EXPRESSION_NOT_ALLOWED', '//', 'one `/`'],
  ['k\u000B+ n', 'EXPRESSION_NOT_ALLOWED', '\u000B', 'plain space'],
  // syntax
  ['', 'EXPRESSION_SYNTAX', '', ''],
  ['  ', 'EXPRESSION_SYNTAX', '  ', ''],
  ['k +', 'EXPRESSION_SYNTAX', '+', ''],
  ['* k', 'EXPRESSION_SYNTAX', '*', ''],
  ['k * / n', 'EXPRESSION_SYNTAX', '/', ''],
  ['k + ()', 'EXPRESSION_SYNTAX', '()', ''],
  ['max(k,)', 'EXPRESSION_SYNTAX', ')', ''],
  ['max(,k)', 'EXPRESSION_SYNTAX', ',', ''],
  ['(k + n', 'EXPRESSION_SYNTAX', '(', 'add `)`'],
  ['k + n)', 'EXPRESSION_SYNTAX', ')', ''],
  ['1,5 + k', 'EXPRESSION_SYNTAX', ',', '`1.5`'],
  ['(k, n)', 'EXPRESSION_SYNTAX', ',', 'arguments'],
  ["pipe_bore(6, 'Sch 80)", 'EXPRESSION_SYNTAX', "'", 'quotation marks'],
  ['3 / 4 in', 'EXPRESSION_SYNTAX', '3 / 4 in', '3 / (4 in)'],
  ['2.5/4 in', 'EXPRESSION_SYNTAX', '2.5/4 in', '2.5 / (4 in)'],
  ['L/3/4 in', 'EXPRESSION_SYNTAX', '3/4 in', '(3/4 in)'],
  ['n*3-1/2 in', 'EXPRESSION_SYNTAX', '3-1/2 in', '(3-1/2 in)'],
  ['L to', 'EXPRESSION_SYNTAX', 'to', ''],
  // units
  ['5 psj', 'UNIT_UNKNOWN', 'psj', '`psi`'],
  ['5 lbs', 'UNIT_UNKNOWN', 'lbs', '`lbm`, `lbf`'],
  ['5 m2', 'UNIT_UNKNOWN', 'm2', '`m^2`'],
  ['5 foobarbaz', 'UNIT_UNKNOWN', 'foobarbaz', '`5*foobarbaz`'],
  ['L to inn', 'UNIT_UNKNOWN', 'inn', '`in`'],
  ['L to in + 3', 'EXPRESSION_NOT_ALLOWED', '+ 3', 'very end'],
  ['max(L to in, 3 in)', 'EXPRESSION_NOT_ALLOWED', 'to', 'very end'],
  // numbers
  ['1e999 + 2', 'NUMBER_NOT_FINITE', '1e999', ''],
  ['12345678901234567890', 'NUMBER_NOT_FINITE', '12345678901234567890', '17'],
  ['1/0 in', 'DIVISION_BY_ZERO', '1/0', ''],
  // names
  ['D_j^2', 'NAME_UNKNOWN', 'D_j', '`D_i`'],
  ['5*in', 'NAME_UNKNOWN', 'in', '`5 in`'],
  ['sqrt + 1', 'NAME_UNKNOWN', 'sqrt', 'sqrt(…)'],
  ['sqr(k)', 'FUNCTION_UNKNOWN', 'sqr', '`sqrt`'],
  ['k(n)', 'FUNCTION_UNKNOWN', 'k', '`k*(…)`'],
  ['pi(2)', 'FUNCTION_UNKNOWN', 'pi', '`pi*(…)`'],
  ['residue*2', 'EXPRESSION_NOT_ALLOWED', 'residue', 'argument'],
  ["'Sch 80' + 2", 'EXPRESSION_NOT_ALLOWED', "'Sch 80'", 'argument'],
  // what would be dangerous in an evaluator of strings
  ['createUnit("mm", "1 m")', 'FUNCTION_UNKNOWN', 'createUnit', ''],
  ['constructor', 'NAME_UNKNOWN', 'constructor', ''],
  ['__proto__ + 1', 'NAME_UNKNOWN', '__proto__', ''],
  ['toString(1)', 'FUNCTION_UNKNOWN', 'toString', ''],
  ['range(1, 1e9)', 'FUNCTION_UNKNOWN', 'range', ''],
  ['evaluate("1+1")', 'FUNCTION_UNKNOWN', 'evaluate', ''],
];

describe('formulas that are refused', () => {
  it.each(CASES)('%s', (text, code, marked, hint) => {
    const [fault] = faultsOf(text);
    expect(fault).toMatchObject({ code, severity: 'error' });
    expect(fault && underlined(text, fault.span)).toBe(marked);
    expect(fault?.hints.join('\n')).toContain(hint);
    expect(fault?.message).not.toMatch(/char \d|undefined|\.$/);
  });
});

describe('comparisons that are refused', () => {
  it.each<Case>([
    ['L', 'EXPRESSION_SYNTAX', 'L', '`<=`'],
    ['L < 3 m < 5 m', 'EXPRESSION_NOT_ALLOWED', '<', 'one in each'],
    ['max(L < 3 m, 2)', 'EXPRESSION_SYNTAX', 'max(L < 3 m, 2)', '`<=`'],
    ['L <=', 'EXPRESSION_SYNTAX', '<=', ''],
    ['<= L', 'EXPRESSION_SYNTAX', '<=', ''],
    ['L = 5 m', 'EXPRESSION_NOT_ALLOWED', '=', 'a check compares'],
    ['L => 5 m', 'EXPRESSION_NOT_ALLOWED', '=>', 'a check compares'],
    ['L < 5 m to in', 'EXPRESSION_NOT_ALLOWED', 'to in', 'leave `to`'],
    ['L <= p_d', 'UNIT_MISMATCH', 'L <= p_d', ''],
    ['p_d <= 5 psi', 'UNIT_MISMATCH', 'p_d <= 5 psi', 'psia'],
    ['N <= w', 'CYCLES_AND_RADIANS', 'N <= w', '2*pi'],
  ])('%s', (text, code, marked, hint) => {
    const [fault] = comparisonFaults(text);
    expect(fault).toMatchObject({ code });
    expect(fault && underlined(text, fault.span)).toBe(marked);
    expect(fault?.hints.join('\n')).toContain(hint);
  });
});

describe('formulas that are too large', () => {
  it.each([
    ['ten thousand brackets', '('.repeat(10_000) + '1' + ')'.repeat(10_000)],
    ['ten thousand signs', '-'.repeat(10_000) + '1'],
    ['nine hundred brackets', '('.repeat(450) + '1' + ')'.repeat(450)],
    ['a hundred signs', '-'.repeat(100) + '1'],
    ['a tower of powers', Array.from({ length: 70 }, () => '1').join('^')],
    ['a hundred nested calls', 'abs('.repeat(100) + '1' + ')'.repeat(100)],
    ['a long sum', Array.from({ length: 600 }, () => '1').join('+')],
    ['many words', 'a '.repeat(1001).slice(0, 2000) + 'a'],
  ])('%s', (_name, text) => {
    expect(faultsOf(text).map(({ code }) => code)).toContain('EXPRESSION_TOO_LARGE');
  });

  it.each([
    ['sixty brackets', '('.repeat(60) + '1' + ')'.repeat(60), 1],
    ['sixty signs', '-'.repeat(60) + '1', 1],
    ['a sum of five hundred', Array.from({ length: 500 }, () => '1').join('+'), 500],
    ['many powers side by side', Array.from({ length: 200 }, () => '1^1').join('+'), 200],
    ['many signs side by side', Array.from({ length: 200 }, () => '-1').join('*'), 1],
  ])('%s pass', (_name, text, value) => {
    expect(faultsOf(text)).toEqual([]);
    expect(value).toBeGreaterThan(0);
  });
});

it('reports all faults of a formula at once', () => {
  expect(faultsOf('D_j + sqr(k) + p_j*2').map(({ code }) => code)).toEqual([
    'NAME_UNKNOWN',
    'FUNCTION_UNKNOWN',
    'NAME_UNKNOWN',
  ]);
  expect(faultsOf('(2 pi) + 3 psj + a.b + 1e999').map(({ code }) => code)).toEqual([
    'EXPRESSION_NOT_ALLOWED',
    'UNIT_UNKNOWN',
    'EXPRESSION_NOT_ALLOWED',
    'NUMBER_NOT_FINITE',
  ]);
  expect(faultsOf('2*(k n) + (3').map(({ message }) => message)).toEqual([
    'this bracket is not closed',
    'a product is written without `*`',
  ]);
});
