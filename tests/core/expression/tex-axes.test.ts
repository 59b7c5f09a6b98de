import { describe, expect, it } from 'vitest';
import { expressionTex } from '../../../core/expression/tex.ts';
import { parsed } from './support.ts';

const options = { nameTex: (name: string) => name, functions: new Map() };

describe('formulas along axes, in TeX', () => {
  it.each([
    ["max_over(F, 'speed')", '\\max_{\\text{speed}}\\left(F\\right)'],
    ["sum_over(F^2, 'harmonic')", '\\sum_{\\text{harmonic}}\\left(F^{2}\\right)'],
    ["mean_over(F, 'angle')", '\\operatorname{mean}_{\\text{angle}}\\left(F\\right)'],
    ["at(F, 'condition', 'C07')", '\\left.F\\right|_{\\text{C07}}'],
    ["at(F, 'speed', 900 rpm)", '\\left.F\\right|_{900\\,\\mathrm{rpm}}'],
    ['envelope(F)', '\\operatorname{env}\\left(F\\right)'],
    ['interpolate(k, x/2)', 'k\\left(\\frac{x}{2}\\right)'],
    ['harmonics(10)', '(1\\ldots 10)'],
    ['where(N <= M, a/b, 0)', '\\begin{cases}\\frac{a}{b}&\\text{where }N \\le M\\\\0&\\text{elsewhere}\\end{cases}'],
    ['as_rms(x)', '\\operatorname{as\\,rms}\\left(x\\right)'],
    ['4 mil pp*x', '4\\,\\mathrm{mil}\\ \\text{pp} \\times x'],
  ])('%s', (text, tex) => {
    expect(expressionTex(parsed(text), options)).toBe(tex);
  });
});
