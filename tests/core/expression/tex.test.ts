import katex from 'katex';
import { describe, expect, it } from 'vitest';
import { parseComparison } from '../../../core/expression/parse-formula.ts';
import { comparisonTex, expressionTex, type TexOptions } from '../../../core/expression/tex.ts';
import { symbolFor } from '../../../core/expression/tex-symbol.ts';
import { parseQuantity } from '../../../core/units/parse-quantity.ts';
import { printTyped } from '../../../core/units/print.ts';
import type { Printed } from '../../../core/units/printed.ts';
import { SAMPLES } from './sample-functions.ts';
import { parsed, QUANTITIES, spanOf } from './support.ts';

const functions = new Map(SAMPLES.map((fn) => [fn.name, fn]));
const GIVEN: Readonly<Record<string, string>> = { share: '\\hat{p}', p_star: 'p^{*}', p_prime: "p'" };
const symbolic: TexOptions = { nameTex: (name) => symbolFor(name, GIVEN[name]), functions };
const substituted: TexOptions = { ...symbolic, printed };

/** As typed, and two results that need care: one below zero, one with a power of ten. */
function printed(name: string): Printed | undefined {
  const text = { ...QUANTITIES, low: '-3.5 psi', tiny: '1.05e-6' }[name];
  const quantity = text === undefined ? undefined : parseQuantity(text, spanOf(text)).value;
  return quantity && printTyped(quantity.numberText, quantity.unit);
}

function typeset(tex: string): string {
  return katex.renderToString(tex, { throwOnError: true, strict: 'error', trust: false, displayMode: true });
}

describe('in symbols', () => {
  it.each([
    ['pi/4*D_i^2', '\\frac{\\pi}{4}\\,D_{i}^{2}'],
    ['dp*A', '\\mathrm{dp}\\,A'],
    ['2*pi*f*t', '2\\,\\pi\\,f\\,t'],
    ['2*3*x', '2 \\times 3\\,x'],
    ['x*2', 'x \\times 2'],
    ['2*(a + b)', '2\\,\\left(a + b\\right)'],
    ['a - (b - c)', 'a - \\left(b - c\\right)'],
    ['a - (b + c)', 'a - \\left(b + c\\right)'],
    ['a + (b - c)', 'a + b - c'],
    ['(a - b) - c', 'a - b - c'],
    ['a*(b*c)', 'a\\,b\\,c'],
    ['a/(b*c)', '\\frac{a}{b\\,c}'],
    ['a/b*c', '\\frac{a}{b}\\,c'],
    ['a*(b/c)', 'a\\,\\frac{b}{c}'],
    ['2*(3/4)', '2 \\times \\frac{3}{4}'],
    ['(a + b)^2', '\\left(a + b\\right)^{2}'],
    ['(a*b)^2', '\\left(a\\,b\\right)^{2}'],
    ['(a/b)^2', '\\left(\\frac{a}{b}\\right)^{2}'],
    ['(a^b)^c', '\\left(a^{b}\\right)^{c}'],
    ['a^b^c', 'a^{b^{c}}'],
    ['(-a)^2', '\\left(-a\\right)^{2}'],
    ['-a^2', '-a^{2}'],
    ['-(a + b)', '-\\left(a + b\\right)'],
    ['-(a*b)', '-a\\,b'],
    ['-(-a)', '-\\left(-a\\right)'],
    ['a*(-b)', 'a\\,\\left(-b\\right)'],
    ['(-a)*b', '-a\\,b'],
    ['a - (-a)*b', 'a - \\left(-a\\,b\\right)'],
    ['a - -b', 'a - \\left(-b\\right)'],
    ['-a + b', '-a + b'],
    ['-a/b', '\\frac{-a}{b}'],
    ['-(a/b)', '-\\frac{a}{b}'],
    ['a/b/c', '\\frac{a/b}{c}'],
    ['a/(b/c)', '\\frac{a}{b/c}'],
    ['(a/b/c)/d', '\\frac{\\left(a/b\\right)/c}{d}'],
    ['(a*b/c)/(d/(a*b))', '\\frac{a\\,b/c}{d/\\left(a\\,b\\right)}'],
    ['((a + b)/c + d)/2', '\\frac{\\left(a + b\\right)/c + d}{2}'],
    ['(a/b*c)/d', '\\frac{\\left(a/b\\right)\\,c}{d}'],
    ['(p_2/p_1)^((k - 1)/k)', '\\left(\\frac{p_{2}}{p_{1}}\\right)^{\\left(k - 1\\right)/k}'],
    ['x^(1/2)', 'x^{1/2}'],
    ['x^-1', 'x^{-1}'],
    ['sqrt(k/m)', '\\sqrt{\\frac{k}{m}}'],
    ['sqrt(k)^2', '\\left(\\sqrt{k}\\right)^{2}'],
    ['sin(a)^2', '\\left(\\sin\\left(a\\right)\\right)^{2}'],
    ['abs(a - b)', '\\left|a - b\\right|'],
    ['max(a, b/c)', '\\max\\left(a,\\ \\frac{b}{c}\\right)'],
    ['floor(a) + ceil(b)', '\\left\\lfloor a\\right\\rfloor + \\left\\lceil b\\right\\rceil'],
    ['ln(a)/log10(b)', '\\frac{\\ln\\left(a\\right)}{\\log_{10}\\left(b\\right)}'],
    ['e^(-a)', '\\mathrm{e}^{-a}'],
    ['share*p_d', '\\hat{p}\\,p_{d}'],
    ['p_star^2', '{p^{*}}^{2}'],
    ['p_prime^2', "{p'}^{2}"],
    ['p - 10 psi', 'p - 10\\,\\mathrm{psi}'],
    ['10 psi*A', '10\\,\\mathrm{psi} \\times A'],
    ['(3 in)^2', '\\left(3\\,\\mathrm{in}\\right)^{2}'],
    ['1.5e-6*a', '1.5\\times 10^{-6}\\,a'],
    ['(2e3)^2', '\\left(2\\times 10^{3}\\right)^{2}'],
    ['quarter_wave(c, L, 1)', 'f_{1/4}(c,\\allowbreak\\ L,\\allowbreak\\ 1)'],
    ["pipe_bore(6, 'Sch 80')", '\\operatorname{pipe\\,bore}(6,\\allowbreak\\ \\text{Sch 80})'],
    ['molar_mass(residue)', 'M(\\mathrm{residue})'],
    [
      "f('a_b $5 \\ ~ ^ {x} 50% #1 &')",
      'f(\\text{a\\_b \\$5 \\textbackslash  \\textasciitilde  \\textasciicircum  \\{x\\} 50\\% \\#1 \\&})',
    ],
  ])('%s', (text, tex) => {
    const set = expressionTex(parsed(text), symbolic);
    expect(set).toBe(tex);
    expect(typeset(set)).toContain('katex');
  });
});

describe('with values put in', () => {
  it.each([
    ['pi/4*D_i^2', '\\frac{\\pi}{4}\\,\\left(5.761\\,\\mathrm{in}\\right)^{2}'],
    ['share*p_d', '2.4\\,\\% \\times 905\\,\\mathrm{psig}'],
    ['c/(2*L)', '\\frac{400\\,\\mathrm{m}/\\mathrm{s}}{2 \\times 5\\,\\mathrm{m}}'],
    [
      '(p_d/p_s)^((k - 1)/k)',
      '\\left(\\frac{905\\,\\mathrm{psig}}{300\\,\\mathrm{psig}}\\right)^{\\left(1.25 - 1\\right)/1.25}',
    ],
    [
      '(c/L)/f',
      '\\frac{\\left(400\\,\\mathrm{m}/\\mathrm{s}\\right)/\\left(5\\,\\mathrm{m}\\right)}{10\\,\\mathrm{Hz}}',
    ],
    ['k*n', '1.25 \\times 3'],
    ['n^2', '3^{2}'],
    ['low*n', '-3.5\\,\\mathrm{psi} \\times 3'],
    ['n*low', '3 \\times \\left(-3.5\\,\\mathrm{psi}\\right)'],
    ['p_d - low', '905\\,\\mathrm{psig} - \\left(-3.5\\,\\mathrm{psi}\\right)'],
    ['low - p_d', '-3.5\\,\\mathrm{psi} - 905\\,\\mathrm{psig}'],
    ['-low', '-\\left(-3.5\\,\\mathrm{psi}\\right)'],
    ['low^2', '\\left(-3.5\\,\\mathrm{psi}\\right)^{2}'],
    ['tiny^2', '\\left(1.05\\times 10^{-6}\\right)^{2}'],
    ['tiny*n', '1.05\\times 10^{-6} \\times 3'],
    ['molar_mass(residue)', 'M(\\mathrm{residue})'],
    ['sqrt(k_s/m)', '\\sqrt{\\frac{4000\\,\\mathrm{N}/\\mathrm{m}}{10\\,\\mathrm{kg}}}'],
  ])('%s', (text, tex) => {
    const set = expressionTex(parsed(text), substituted);
    expect(set).toBe(tex);
    expect(typeset(set)).toContain('katex');
  });
});

describe('comparisons', () => {
  it.each([
    ['F <= F_lim', 'F \\le F_{\\mathrm{lim}}'],
    ['s_2 >= s_min', 's_{2} \\ge s_{\\mathrm{min}}'],
    ['a < b', 'a < b'],
    ['a > 2*b', 'a > 2\\,b'],
  ])('%s', (text, tex) => {
    const comparison = parseComparison(text, spanOf(text)).value;
    const set = comparison && comparisonTex(comparison, symbolic);
    expect(set).toBe(tex);
    expect(typeset(tex)).toContain('katex');
  });

  it('take values too', () => {
    const comparison = parseComparison('L <= 6 m', spanOf('L <= 6 m')).value;
    expect(comparison && comparisonTex(comparison, substituted)).toBe('5\\,\\mathrm{m} \\le 6\\,\\mathrm{m}');
  });
});

it('sets every character that a quoted text may have', () => {
  const quotable = [...Array(0x100).keys()]
    .map((code) => String.fromCharCode(code))
    .filter((character) => /[ -&(-~À-ÖØ-öø-ÿ]/.test(character));
  for (const character of quotable) {
    const set = expressionTex(parsed(`f('a${character}b')`), symbolic);
    expect(typeset(set), character).toContain('katex');
  }
});
