import { describe, expect, it } from 'vitest';
import { parseComparison, parseFormula } from '../../../core/expression/parse-formula.ts';
import { functionsIn, isReservedName, namesIn, visit } from '../../../core/expression/names.ts';
import { evaluate, faultsOf, parsed, spanOf, underlined } from './support.ts';
import { printExpression } from './print-expression.ts';

describe('precedence', () => {
  it.each([
    ['-2^2', -4],
    ['2^3^2', 512],
    ['2/3/4', 2 / 3 / 4],
    ['2 - 3 - 4', -5],
    ['2 + 3*4^2/8', 8],
    ['2^-1', 0.5],
    ['-(-3)', 3],
    ['+5 - -2', 7],
    ['(1/2)^2', 0.25],
    ['010 + 0.5', 10.5],
    ['1.5e3/1E2', 15],
    ['3² + 2³', 17],
  ])('%s is %d', (text, value) => {
    expect(evaluate(text)).toMatchObject({ value, diagnostics: [] });
  });

  it.each([
    ['a+b*c', '(a + (b * c))'],
    ['a*b/c*d', '(((a * b) / c) * d)'],
    ['-a*b', '((-a) * b)'],
    ['-a^b', '(-(a ^ b))'],
    ['a - (b - c)', '(a - (b - c))'],
    ['f(a, -b, 2)', 'f(a, (-b), 2)'],
    ['sqrt (a)', 'sqrt(a)'],
  ])('%s groups as %s', (text, grouped) => {
    expect(printExpression(parsed(text))).toBe(grouped);
  });
});

describe('quantity literals', () => {
  it.each([
    ['5 psi', 5 * 6894.757293168361],
    ['(12 kg/m^3)', 12],
    ['(3 + 5 s^-1 * 1 s)', 8],
    ['max(12 kg/s^2, 3 kg/s^2)', 12],
    ['2.4 %', 0.024],
    ['5ft', 1.524],
    ['5 ft 3-1/2 in', 63.5 * 0.0254],
    ['3/4 in', 0.75 * 0.0254],
    ['1/2 m', 0.5],
    ['3-1/2 in', 3.5 * 0.0254],
    ['5 min', 300],
    ['5 in', 0.127],
    ['5 m²', 5],
    ['10 ft-lbf', 10 * 0.3048 * 4.4482216152605],
    ['5 J/(kg*K)', 5],
    ['(10 N/m)', 10],
    ['10 N / m', 1],
    ['(100 N/m)*L', 500],
    ['(100 N/m*L)', 0.1],
    ['2*3/4 in', 1.5 * 0.0254],
    ['3 / (4 m)', 0.75],
    ['-10 degC', 263.15],
    ['5 m^2 / L', 1],
  ])('%s', (text, si) => {
    const { value, diagnostics } = evaluate(text);
    expect(diagnostics).toEqual([]);
    expect(value).toBeCloseTo(si, 9);
  });

  it('warns where a word of the unit is a quantity as well', () => {
    const [fault] = faultsOf('100 N/m*L');
    expect(fault).toMatchObject({ code: 'UNIT_OR_NAME', severity: 'warning' });
    expect(fault?.hints).toEqual([
      'if the unit is meant, put brackets around it: `(100 N/m*L)`',
      'if the quantity is meant, put spaces around the sign before `m`',
    ]);
    expect(faultsOf('12 kg/s')).toEqual([]);
  });

  it('keeps the number as typed', () => {
    expect(parsed('0.50 in')).toMatchObject({ node: 'quantity', text: '0.50', number: 0.5 });
  });
});

describe('places', () => {
  it('are exact for every node', () => {
    const text = ' a + f( 2*(b - c) , 5 ft 3 in ) ^ (d) ';
    const seen: string[] = [];
    visit(parsed(text), ({ span }) => seen.push(underlined(text, span)));
    expect(seen).toEqual([
      'a + f( 2*(b - c) , 5 ft 3 in ) ^ (d)',
      'a',
      'f( 2*(b - c) , 5 ft 3 in ) ^ (d)',
      'f( 2*(b - c) , 5 ft 3 in )',
      '2*(b - c)',
      '2',
      '(b - c)',
      'b',
      'c',
      '5 ft 3 in',
      'd',
    ]);
  });

  it('cover brackets around operations, signs and calls without arguments', () => {
    const text = '-((a)) + f()';
    const seen: string[] = [];
    visit(parsed(text), ({ span }) => seen.push(underlined(text, span)));
    expect(seen).toEqual(['-((a)) + f()', '-((a))', 'a', 'f()']);
  });

  it('are those of the whole formula where the sheet spells it with escapes', () => {
    const span = { file: 'sheet.yaml', start: 10, end: 30 };
    expect(parseFormula('a+', span).diagnostics[0]?.span).toEqual(span);
  });
});

describe('to UNIT', () => {
  it.each([
    ['a to in', 'in', 'in'],
    ['a to kg/m^3 ', 'kg/m^3', 'kg/m^3'],
    ['a  to  ft-lbf', 'ft-lbf', 'ft-lbf'],
  ])('%s', (text, unit, shown) => {
    const to = parseFormula(text, spanOf(text)).value?.to;
    expect(to?.unit.text).toBe(unit);
    expect(to && underlined(text, to.span)).toBe(shown);
  });
});

describe('comparisons', () => {
  it.each([
    ['F <= F_lim', '<='],
    ['F<F_lim', '<'],
    ['a + b >= c', '>='],
    ['a > max(b, c)', '>'],
    ['a ≤ b', '<='],
    ['a ≥ b', '>='],
  ])('%s', (text, operator) => {
    const { value, diagnostics } = parseComparison(text, spanOf(text));
    expect(diagnostics).toEqual([]);
    expect(value?.operator).toBe(operator);
    expect(value && underlined(text, value.span)).toBe(text);
  });
});

describe('names', () => {
  const expression = parsed("pi*D_i^2 + density(residue, p_d, T) + g('D_i', D_i) + e");
  it('lists quantities and gases, and functions', () => {
    expect([...namesIn(expression)]).toEqual(['D_i', 'residue', 'p_d', 'T']);
    expect([...functionsIn(expression)]).toEqual(['density', 'g']);
  });

  it.each(['pi', 'e', 'sqrt', 'min', 'to'])('%s is reserved', (name) => {
    expect(isReservedName(name)).toBe(true);
    expect(isReservedName(`${name}_1`)).toBe(false);
  });
});
