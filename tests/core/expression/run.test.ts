import { describe, expect, it } from 'vitest';
import { onlyValue, single } from '../../../core/axes/column.ts';
import type { DiagnosticCode } from '../../../core/diagnostics/codes.ts';
import { compile } from '../../../core/expression/compile.ts';
import { inferType } from '../../../core/expression/infer-type.ts';
import type { Program } from '../../../core/expression/program.ts';
import { run } from '../../../core/expression/run.ts';
import { parseUnit } from '../../../core/units/parse-unit.ts';
import { typeOfUnit } from '../../../core/units/unit.ts';
import { parsed, evaluate, faultsOf, scopeWith, underlined } from './support.ts';
import { SAMPLES } from './sample-functions.ts';

describe('values worked by hand', () => {
  it.each([
    // Area of a 5.761 in bore: 0.25·π·5.761² = 26.067 in².
    ['pi/4*D_i^2', 0.25 * Math.PI * 5.761 ** 2 * 0.0254 ** 2],
    // 905 psig at 101.325 kPa is 919.696 psia; 2.4 % of it 22.073 psi.
    ['share*p_d', 0.024 * (905 * 6894.757293168361 + 101_325)],
    ['mean(p_d, p_s)', 602.5 * 6894.757293168361 + 101_325],
    ['abs(3 in - 5 in)', 2 * 0.0254],
    ['T - 32 degF', (208 * 5) / 9],
    ['max(1 in, 2 cm, 0.01 m)', 0.0254],
    ['e^1', Math.E],
    ['(k - 1)/k', 0.2],
    ['-D_i^2', -((5.761 * 0.0254) ** 2)],
    ['(-2)^3', -8],
    ['4^0.5 + 16^0.25 + 8^(1/3)', 6],
  ])('%s', (text, value) => {
    const found = evaluate(text);
    expect(found.diagnostics).toEqual([]);
    expect(Math.abs(found.value / value - 1)).toBeLessThan(1e-12);
  });
});

type Case = readonly [text: string, code: DiagnosticCode, underlined: string, said: string];

describe('faults of values', () => {
  it.each<Case>([
    ['c/zero', 'DIVISION_BY_ZERO', 'zero', '`zero` is zero'],
    ['c/(n - 3)', 'DIVISION_BY_ZERO', '(n - 3)', 'made of `n`'],
    ['c/(n*zero)', 'DIVISION_BY_ZERO', '(n*zero)', '`zero` is zero'],
    ['1/(k - 1.25)/2', 'DIVISION_BY_ZERO', '(k - 1.25)', '`k`'],
    ['1/0', 'DIVISION_BY_ZERO', '0', ''],
    ['zero^-1', 'DIVISION_BY_ZERO', 'zero', '1/x^n'],
    ['sqrt(3 in - L)', 'DOMAIN', '3 in - L', 'negative'],
    ['(n - 5)^0.5', 'DOMAIN', '(n - 5)', 'whole'],
    ['ln(zero)', 'DOMAIN', 'zero', 'above zero'],
    ['log10(-n)', 'DOMAIN', '-n', 'above zero'],
    ['asin(n)', 'DOMAIN', 'n', 'sine'],
    ['acos(-n)', 'DOMAIN', '-n', 'cosine'],
    ['10^200*10^200', 'RESULT_NOT_FINITE', '10^200*10^200', ''],
    ['exp(1000)', 'RESULT_NOT_FINITE', 'exp(1000)', ''],
    ['quarter_wave(0 m/s, L)', 'DOMAIN', '0 m/s', 'must be above 0 m/s, and is 0 m/s'],
    ['quarter_wave(c, -L)', 'DOMAIN', '-L', 'must be above 0 m, and is -5.000 m'],
    ['quarter_wave(c, L, 0)', 'DOMAIN', '0', 'at least 1'],
    ['quarter_wave(c, L, 101)', 'DOMAIN', '101', 'at most 99'],
    ['quarter_wave(c, L, 1.5)', 'DOMAIN', '1.5', 'a whole number'],
    ["pipe_bore(7, 'Sch 80')", 'LOOKUP_MISSING', "pipe_bore(7, 'Sch 80')", 'no such pipe'],
  ])('%s', (text, code, marked, said) => {
    const found = evaluate(text, SAMPLES);
    expect(found.value).toBeNaN();
    expect(found.diagnostics).toHaveLength(1);
    const [fault] = found.diagnostics;
    expect(fault).toMatchObject({ code, severity: 'error' });
    expect(fault && underlined(text, fault.span)).toBe(marked);
    expect([fault?.message, ...(fault?.hints ?? [])].join('\n')).toContain(said);
  });

  it('are all reported, each once', () => {
    expect(faultsOf('1/zero + sqrt(-n)*(2 + 3/zero)').map(({ code }) => code)).toEqual([
      'DIVISION_BY_ZERO',
      'DOMAIN',
      'DIVISION_BY_ZERO',
    ]);
  });

  it('of a method outside its validity leave the value, with a warning', () => {
    const found = evaluate('quarter_wave(c, L, 2)', SAMPLES);
    expect(found.value).toBeCloseTo(40, 12);
    expect(found.diagnostics).toMatchObject([{ code: 'VALIDITY', severity: 'warning' }]);
  });

  it('are silent where a value that is read is not known', () => {
    const typed = inferType(parsed('1/(n - n) + ln(n) + n'), scopeWith()).value;
    if (typed === undefined) throw new Error('no type');
    const program = compile(typed, { slots: new Map([['n', 0]]), gases: new Map(), functions: new Map(), site: {} });
    const { column, diagnostics } = run(program, [single(Number.NaN)], new Map());
    expect(onlyValue(column)).toBeNaN();
    expect(diagnostics).toEqual([]);
  });
});

describe('programs', () => {
  function programOf(text: string, slots: readonly string[]) {
    const typed = inferType(parsed(text), scopeWith(SAMPLES)).value;
    if (typed === undefined) throw new Error('no type');
    const functions = new Map(SAMPLES.map((fn) => [fn.name, fn]));
    const slotsByName = new Map(slots.map((name, slot) => [name, slot]));
    return compile(typed, { slots: slotsByName, gases: new Map(), functions, site: {} });
  }

  const result = (program: Program, values: readonly number[]): number =>
    onlyValue(run(program, values.map(single), new Map()).column);

  it('read each quantity once and keep few registers', () => {
    const program = programOf('n*k + n*k + n*k + n*k + 2 + 2', ['m', 'n', 'k']);
    const [stage] = program.stages;
    const kernel = stage?.stage === 'kernel' ? stage.kernel : undefined;
    expect(kernel?.inputs).toEqual([
      { name: 'n', slot: 1 },
      { name: 'k', slot: 2 },
    ]);
    expect(kernel?.constants).toEqual([2]);
    expect(kernel?.registers).toBe(2 + 1 + 2);
    expect(result(program, [10, 3, 5])).toBe(64);
  });

  it('run again with other values', () => {
    const program = programOf('quarter_wave(c, L)', ['c', 'L']);
    expect(result(program, [400, 5])).toBe(20);
    expect(result(program, [300, 5])).toBe(15);
  });

  it('may be a single quantity or a single number', () => {
    expect(result(programOf('n', ['n']), [7])).toBe(7);
    expect(result(programOf('2', []), [])).toBe(2);
  });
});

describe('programs over an axis', () => {
  const unit = parseUnit('Hz');
  if (unit === null) throw new Error('no hertz');
  const coordinates = Float64Array.from({ length: 1000 }, (_, i) => i - 2);
  const axes = new Map([['speed', { name: 'speed', coordinates, type: typeOfUnit(unit), unit }]] as const);
  const column = { axes: ['speed'] as const, data: coordinates };

  function runOver(text: string, values: Readonly<Record<string, number>>) {
    const names = ['n', ...Object.keys(values)];
    const scope = scopeWith(SAMPLES, { shapes: new Map([['n', ['speed']]]), axes: new Map(axes) });
    const typed = inferType(parsed(text), scope).value;
    if (typed === undefined) throw new Error('no type');
    const slots = new Map(names.map((name, slot) => [name, slot]));
    const program = compile(typed, { slots, gases: new Map(), functions: new Map(), site: {} });
    return { program, ...run(program, [column, ...Object.values(values).map(single)], axes) };
  }

  it('take what does not vary out of the loop, and products of it in one go', () => {
    const { program, column: found } = runOver('n*pi/4*k^2*3', { k: 5 });
    expect(program.stages.map(({ stage }) => stage)).toEqual(['kernel', 'kernel']);
    const last = program.stages.at(-1);
    expect(last?.stage === 'kernel' && last.kernel.instructions.map(({ op }) => op)).toEqual(['chain']);
    expect(found.data[10]).toBe(8 * Math.PI * 0.25 * 25 * 3);
  });

  it('say once what is wrong at many points, and hide nothing behind a quotient', () => {
    // n is zero at the third point only; 1e308·n cannot be held from n = 2 on, nor for n = −2.
    expect(runOver('1/n', {}).diagnostics).toMatchObject([
      { code: 'DIVISION_BY_ZERO', message: 'this divisor is zero (at 0 Hz)' },
    ]);
    const hidden = runOver('1/(1e308*n*k)', { k: 9 }).diagnostics;
    expect(hidden.map(({ code }) => code).toSorted()).toEqual(['DIVISION_BY_ZERO', 'RESULT_NOT_FINITE']);
    const quotient = runOver('1e308*n*9/k', { k: 3 });
    expect(quotient.diagnostics).toMatchObject([{ code: 'RESULT_NOT_FINITE' }]);
    expect(Number.isNaN(quotient.column.data[999])).toBe(true);
    expect(quotient.column.data[2]).toBe(0);
  });

  it('leave what is not known unknown, without a word', () => {
    const { column: found, diagnostics } = runOver('n*k + n', { k: Number.NaN });
    expect(diagnostics).toEqual([]);
    expect(found.data.every(Number.isNaN)).toBe(true);
  });
});
