import katex from 'katex';
import { describe, expect, it } from 'vitest';
import fc from 'fast-check';
import { checkSymbol, symbolFor } from '../../../core/expression/tex-symbol.ts';
import { spanOf } from './support.ts';

function typeset(tex: string): string {
  return katex.renderToString(`${tex}^{2}`, { throwOnError: true, strict: 'error', trust: false });
}

describe('symbols from names', () => {
  it.each([
    ['p', 'p'],
    ['p_d', 'p_{d}'],
    ['D_i', 'D_{i}'],
    ['F_lim', 'F_{\\mathrm{lim}}'],
    ['dp', '\\mathrm{dp}'],
    ['dp_m', '\\mathrm{dp}_{m}'],
    ['omega', '\\omega'],
    ['rho_2', '\\rho_{2}'],
    ['Omega', '\\Omega'],
    ['Delta', '\\Delta'],
    ['Delta_p', '\\Delta p'],
    ['Delta_p_d', '\\Delta p_{d}'],
    ['T_2d', 'T_{2d}'],
    ['f_1', 'f_{1}'],
    ['V1', 'V_{1}'],
    ['rho2', '\\rho_{2}'],
    ['L_half_2', 'L_{\\mathrm{half},2}'],
    ['x_alpha', 'x_{\\alpha}'],
    ['N2O', '\\mathrm{N2O}'],
    ['a_', 'a'],
    ['a__b', 'a_{b}'],
  ])('%s is %s', (name, tex) => {
    expect(symbolFor(name)).toBe(tex);
    expect(typeset(tex)).toContain('katex');
  });

  it('can always be typeset', () => {
    fc.assert(
      fc.property(fc.stringMatching(/^[A-Za-z][A-Za-z0-9_]{0,12}$/), (name) => {
        expect(typeset(`{${symbolFor(name)}}`)).toContain('katex');
      }),
    );
  });
});

const GOOD = [
  'p',
  '\\Delta p',
  '\\hat{p}',
  '\\hat{p}_2',
  '\\hat p_2',
  'F_{\\mathrm{lim}}',
  'F_\\mathrm{lim}',
  "p'",
  "p''_1",
  'p^*',
  'p_{d,2}^{*}',
  '\\overline{T}_{12}',
  '\\dot{m}',
  '\\mathrm{Re}',
  'M\\,c',
  '{p_1}_2',
  '\\ell / 2',
];

const BAD = [
  '',
  '  ',
  '\\href{javascript:alert(1)}{p}',
  '\\includegraphics{a}',
  '\\def\\a{b}',
  '\\newcommand{\\a}{b}',
  '\\rule{1em}{1em}',
  '\\frac{a}{b}',
  '\\url{a}',
  '\\htmlClass{a}{b}',
  '\\text{a}',
  '\\input{a}',
  '\\\\',
  'p_1_2',
  "p'^2",
  'p_',
  '^2',
  '_1',
  '{',
  '}',
  'p}',
  '{p',
  'p_{}',
  '\\hat',
  '\\hat{}',
  '\\hat\\hat{p}',
  '\\hat\\mathrm{p}',
  'a & b',
  'a % b',
  '$p$',
  '#1',
  'p~q',
  'Δp',
  '<b>',
  '{'.repeat(20) + 'p' + '}'.repeat(20),
  'p'.repeat(200),
];

describe('symbols that an engineer gives', () => {
  it.each(GOOD)('%s', (tex) => {
    expect(checkSymbol(tex, spanOf(tex))).toEqual([]);
    expect(symbolFor('x', tex)).toBe(tex);
    expect(typeset(`{${tex}}`)).toContain('katex');
  });

  it.each(BAD)('%s is refused', (tex) => {
    const [fault] = checkSymbol(tex, spanOf(tex));
    expect(fault).toMatchObject({ code: 'EXPRESSION_NOT_ALLOWED', span: spanOf(tex) });
    expect(fault?.hints).toHaveLength(1);
    expect(symbolFor('p_d', tex)).toBe('p_{d}');
  });

  it('can always be typeset, where they are let through', () => {
    const part = fc.constantFrom(
      'p',
      '1',
      '_',
      '^',
      '{',
      '}',
      "'",
      ' ',
      '\\hat',
      '\\Delta',
      '\\,',
      '\\mathrm',
      '*',
      '\\max',
      ',',
    );
    fc.assert(
      fc.property(fc.array(part, { maxLength: 12 }), (parts) => {
        const tex = parts.join('');
        fc.pre(checkSymbol(tex, spanOf(tex)).length === 0);
        expect(typeset(`{${tex}}`)).toContain('katex');
      }),
      { numRuns: 2000 },
    );
  });
});
