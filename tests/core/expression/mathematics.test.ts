import katex from 'katex';
import { describe, expect, it } from 'vitest';
import { CONSTANTS } from '../../../core/expression/constants.ts';
import { MATHEMATICS } from '../../../core/expression/mathematics.ts';
import { evaluate } from './support.ts';

const ALL = [...MATHEMATICS.values()];

it('offers what the catalogue promises', () => {
  expect([...MATHEMATICS.keys(), ...CONSTANTS.keys()]).toEqual([
    'sqrt', 'abs', 'min', 'max', 'mean', 'sin', 'cos', 'tan', 'asin', 'acos', 'atan', 'exp', 'ln', 'log10', 'round',
    'floor', 'ceil', 'as_peak', 'as_peak_to_peak', 'as_rms', 'pi', 'e',
  ]); // prettier-ignore
});

describe('the example of each function', () => {
  it.each(ALL.map((fn) => [fn.example.call, fn.example.result] as const))('%s gives %s', (call, result) => {
    const [found, wanted] = [evaluate(call), evaluate(result)];
    expect(found.diagnostics).toEqual([]);
    expect(found.type?.dimension).toEqual(wanted.type?.dimension);
    expect(found.value).toBeCloseTo(wanted.value, 12);
  });
});

describe('the TeX of each function', () => {
  it.each(ALL.map((fn) => [fn.name, fn] as const))('%s', (_name, fn) => {
    const tex = fn.tex(fn.repeats ? ['x', 'y'] : ['x']);
    expect(katex.renderToString(tex, { throwOnError: true, strict: 'error', trust: false })).toContain('katex');
  });
});

describe('documentation', () => {
  it.each(ALL.map((fn) => [fn.name, fn] as const))('%s', (_name, fn) => {
    expect([fn.summary, fn.returns, fn.validity, ...fn.parameters.map(({ summary }) => summary)]).not.toContain('');
    expect(fn.example.call.startsWith(`${fn.name}(`)).toBe(true);
  });
});

describe('rounding', () => {
  it.each([
    ['round(2.5)', 3],
    ['round(-2.5)', -3],
    ['round(2.4)', 2],
    ['floor(-2.1)', -3],
    ['ceil(-2.9)', -2],
    ['min(3, 1, 2) + max(3, 1, 2)', 4],
    ['mean(1, 2, 6)', 3],
    ['exp(ln(5))', 5],
    ['atan(1)*4/pi', 1],
    ['round(2.4 %/(1 %))', 2],
  ])('%s is %d', (text, value) => {
    expect(evaluate(text).value).toBeCloseTo(value, 12);
  });
});
