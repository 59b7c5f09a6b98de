import { describe, expect, it } from 'vitest';
import type { DiagnosticCode } from '../../../core/diagnostics/codes.ts';
import { inferComparison, inferFormula, inferType } from '../../../core/expression/infer-type.ts';
import { parseComparison, parseFormula } from '../../../core/expression/parse-formula.ts';
import { describeType } from '../../../core/units/dimensions.ts';
import { SAMPLES } from './sample-functions.ts';
import { evaluate, faultsOf, parsed, scopeWith, spanOf, underlined } from './support.ts';

describe('types', () => {
  it.each([
    ['pi/4*D_i^2', 'area'],
    ['p_d - p_s', 'pressure difference'],
    ['p_d + 10 psi', 'pressure level'],
    ['share*p_d', 'pressure difference'],
    ['(p_d/p_s)^((k-1)/k)', 'number'],
    ['T*(p_d/p_s)^((k-1)/k)', 'temperature level'],
    ['T + dT', 'temperature level'],
    ['T - 10 K', 'temperature level'],
    ['T_K - T', 'temperature difference'],
    ['sqrt(p_d*p_s)', 'pressure level'],
    ['mean(p_d, p_s)', 'pressure level'],
    ['max(N, f)', 'frequency'],
    ['2*pi*N', 'angular frequency'],
    ['N*2*pi', 'angular frequency'],
    ['2*pi*n*f', 'angular frequency'],
    ['w/(2*pi)', 'frequency'],
    ['(1/(2*pi))*w', 'frequency'],
    ['w/2/pi', 'frequency'],
    ['sqrt(k_s/m)/(2*pi)', 'frequency'],
    ['1/(2*pi)*sqrt(k_s/m)', 'frequency'],
    ['(k_s/m)^(1/2)/(2*pi)', 'frequency'],
    ['c/(2*L)', 'frequency'],
    ['pi/4*D_i^2/(1 in^2)*f', 'frequency'],
    ['cos(2*pi*f*(0.1 s))', 'number'],
    ['asin(0.5)', 'angle'],
    ['D_i^3/L', 'area'],
    ['p_d*D_i^2', 'force'],
  ])('%s is a %s', (text, type) => {
    const found = evaluate(text);
    expect(found.diagnostics).toEqual([]);
    expect(found.type && describeType(found.type)).toBe(type);
  });
});

type Case = readonly [text: string, code: DiagnosticCode, underlined: string, hint: string];

describe('what must not happen', () => {
  it.each<Case>([
    ['sqrt((1000 N/m)/(10 kg)) to Hz', 'CYCLES_AND_RADIANS', 'Hz', '2*pi'],
    ['cos(10 Hz * 0.1 s)', 'CYCLES_AND_RADIANS', '10 Hz * 0.1 s', '2*pi'],
    ['25 degC + 5 degC', 'LEVEL_SUM', '25 degC + 5 degC', 'delta_degC'],
    ['p_d + p_s', 'LEVEL_SUM', 'p_d + p_s', 'mean'],
    ['-T', 'LEVEL_SUM', '-T', 'subtract'],
    ['p_d to psi', 'DIFFERENCE_WANTED', 'psi', 'psia'],
    ['share*p_d to psig', 'LEVEL_WANTED', 'psig', 'psi'],
    ['25 degC - 20 degC to K + 1', 'EXPRESSION_NOT_ALLOWED', '+ 1', 'very end'],
    ['T - T_K', 'LEVEL_AMBIGUOUS', 'T - T_K', 'delta_K'],
    ['D_i + p_d', 'UNIT_MISMATCH', 'D_i + p_d', ''],
    ['D_i + 5', 'UNIT_MISMATCH', 'D_i + 5', 'unit'],
    ['D_i to psi', 'UNIT_MISMATCH', 'psi', ''],
    ['N + w', 'CYCLES_AND_RADIANS', 'N + w', '2*pi'],
    ['2^(3 in)', 'UNIT_MISMATCH', '3 in', ''],
    ['D_i^n', 'UNIT_MISMATCH', 'D_i', 'reference'],
    ['2^(f*(1 s))', 'UNIT_MISMATCH', '(f*(1 s))', ''],
    ['exp(D_i)', 'UNIT_MISMATCH', 'D_i', 'reference'],
    ['round(2.4 %)', 'UNIT_MISMATCH', '2.4 %', '1 %'],
    ['round(D_i)', 'UNIT_MISMATCH', 'D_i', ''],
    ['max(D_i, 3 in, p_d)', 'UNIT_MISMATCH', 'p_d', ''],
    ['mean(T, dT)', 'UNIT_MISMATCH', 'dT', 'delta_degC'],
  ])('%s', (text, code, marked, hint) => {
    const [fault, ...others] = faultsOf(text);
    expect(fault).toMatchObject({ code });
    expect(others).toEqual([]);
    expect(fault && underlined(text, fault.span)).toBe(marked);
    expect(fault?.hints.join('\n')).toContain(hint);
  });

  it('takes the offset of a scale along: 8.314 J/(mol*K) * 25 degC is that of 298.15 K', () => {
    expect(evaluate('8.314 J/(mol*K) * 25 degC').value).toBeCloseTo(8.314 * 298.15, 9);
    expect(evaluate('(100 psig)*(1 m^2) to N').value).toBeCloseTo(100 * 6894.757293168361 + 101_325, 6);
    expect(evaluate('25 degC - 20 degC to delta_degC').value).toBeCloseTo(5, 9);
    expect(evaluate('100 psig / (50 psig)').value).toBeCloseTo(
      (100 * 6894.757293168361 + 101_325) / (50 * 6894.757293168361 + 101_325),
      12,
    );
  });

  it('turns cycles into radians and back, once', () => {
    expect(evaluate('1200 rpm to Hz').value).toBeCloseTo(20, 12);
    expect(evaluate('1200 rpm to rad/s').value).toBeCloseTo(40 * Math.PI, 12);
    expect(evaluate('2*pi*f to rad/s').value).toBeCloseTo(20 * Math.PI, 12);
    expect(evaluate('2*pi*f to Hz').value).toBeCloseTo(10, 12);
    expect(evaluate('w to Hz').value).toBeCloseTo(100 / (2 * Math.PI), 12);
    expect(evaluate('(1/(2*pi))*w to Hz').value).toBeCloseTo(100 / (2 * Math.PI), 12);
    expect(evaluate('w/(2*pi) to Hz').value).toBeCloseTo(100 / (2 * Math.PI), 12);
    expect(evaluate('sqrt(k_s/m)/(2*pi) to Hz').value).toBeCloseTo(20 / (2 * Math.PI), 12);
    expect(evaluate('c/(2*L) to Hz').value).toBeCloseTo(40, 12);
    expect(evaluate('pi/4*D_i^2/(1 in^2)*f to Hz').value).toBeCloseTo((Math.PI / 4) * 5.761 ** 2 * 10, 9);
  });
});

describe('calls of the library', () => {
  it.each([
    ['quarter_wave(c, L)', 20],
    ['quarter_wave(c, L, 3)', 60],
    ["pipe_bore(6, 'Sch 80')", 5.761 * 0.0254],
    ['pipe_bore(\'6\', "Sch 80")', 5.761 * 0.0254],
    ["pipe_bore(2*n, 'Sch 80')", 5.761 * 0.0254],
    ['molar_mass(residue)', 0.01604],
    ['levelled(p_d, f)', 20 * Math.PI],
    ['levelled(p_d, w)', 100],
    ['levelled(p_d, f) to Hz', 10],
  ])('%s', (text, value) => {
    const found = evaluate(text, SAMPLES);
    expect(found.diagnostics).toEqual([]);
    expect(found.value).toBeCloseTo(value, 12);
  });

  it.each<Case>([
    ['quarter_wave(c)', 'FUNCTION_ARGUMENTS', 'quarter_wave(c)', 'quarter_wave(c, L, n?)'],
    ['quarter_wave(c, L, 1, 2, 3)', 'FUNCTION_ARGUMENTS', '2, 3', 'quarter_wave(c, L, n?)'],
    ['quarter_wave(L, L)', 'UNIT_MISMATCH', 'L', ''],
    ["quarter_wave('a', L)", 'FUNCTION_ARGUMENTS', "'a'", ''],
    ['quarter_wave(residue, L)', 'EXPRESSION_NOT_ALLOWED', 'residue', 'molar_mass'],
    ["pipe_bore(6 in, 'Sch 80')", 'UNIT_MISMATCH', '6 in', ''],
    ['pipe_bore(6, Sch80)', 'FUNCTION_ARGUMENTS', 'Sch80', "'Sch 80'"],
    ['pipe_bore(6, 80)', 'FUNCTION_ARGUMENTS', '80', 'quotation marks'],
    ['molar_mass(residu)', 'GAS_UNKNOWN', 'residu', '`residue`'],
    ['molar_mass(air)', 'GAS_UNKNOWN', 'air', '`residue`'],
    ["molar_mass('residue')", 'FUNCTION_ARGUMENTS', "'residue'", 'without quotation marks'],
    ['molar_mass(p_d)', 'FUNCTION_ARGUMENTS', 'p_d', 'gases'],
    ['molar_mass(2*3)', 'FUNCTION_ARGUMENTS', '2*3', 'gases'],
    ['levelled(5 psi, f)', 'LEVEL_WANTED', '5 psi', 'psia'],
    ['levelled(p_d, sqrt(k_s/m))', 'CYCLES_AND_RADIANS', 'sqrt(k_s/m)', ''],
    ['quarterwave(c, L)', 'FUNCTION_UNKNOWN', 'quarterwave', '`quarter_wave`'],
    ['sqrt(2, 3)', 'FUNCTION_ARGUMENTS', '3', 'sqrt(x)'],
    ['max()', 'FUNCTION_ARGUMENTS', 'max()', 'max(x, …)'],
  ])('%s', (text, code, marked, hint) => {
    const [fault, ...others] = faultsOf(text, SAMPLES);
    expect(fault).toMatchObject({ code });
    expect(others).toEqual([]);
    expect(fault && underlined(text, fault.span)).toBe(marked);
    expect(fault?.hints.join('\n')).toContain(hint);
  });

  it('names the argument that does not fit', () => {
    expect(faultsOf('levelled(5 psi, f)', SAMPLES)[0]?.message).toMatch(/^`p` of `levelled`: /);
  });

  it('checks all arguments, those of unknown functions too', () => {
    expect(faultsOf('quarter_wave(p_d, q_1, 2)', SAMPLES).map(({ code }) => code)).toEqual([
      'UNIT_MISMATCH',
      'NAME_UNKNOWN',
    ]);
    expect(faultsOf("foo(residue, 'a', q_1)", SAMPLES).map(({ code }) => code)).toEqual([
      'FUNCTION_UNKNOWN',
      'NAME_UNKNOWN',
    ]);
  });
});

describe('faults of other formulas', () => {
  it.each(['broken', 'broken + D_i', 'sqrt(broken)*2', 'quarter_wave(broken, L)', '2^broken', 'broken to psi'])(
    '%s says nothing more',
    (text) => {
      expect(evaluate(text, SAMPLES)).toMatchObject({ value: Number.NaN, type: undefined, diagnostics: [] });
    },
  );

  it('does not hide a fault of its own', () => {
    expect(faultsOf('broken + D_j').map(({ code }) => code)).toEqual(['NAME_UNKNOWN']);
  });

  it('offers a faulty name for a misspelt one', () => {
    expect(faultsOf('brokn*2')[0]?.hints).toEqual(['did you mean `broken`?']);
  });
});

describe('gauge pressures in a sheet without an atmosphere', () => {
  const scope = scopeWith([], { site: {} });

  it.each(['5 psig', 'p_d - 5 barg', 'p_d to psig'])('%s', (text) => {
    const formula = parseFormula(text, spanOf(text)).value;
    expect(formula && inferFormula(formula, scope)).toMatchObject({ diagnostics: [{ code: 'ATMOSPHERE_MISSING' }] });
  });
});

it('gives the common type of a comparison', () => {
  const comparison = parseComparison('p_d <= 80 bara', spanOf('p_d <= 80 bara')).value;
  const typed = comparison && inferComparison(comparison, scopeWith());
  expect(typed?.diagnostics).toEqual([]);
  expect(typed?.value && describeType(typed.value.type)).toBe('pressure level');
});

it('keeps the factors of arguments that change from cycles to radians', () => {
  const typed = inferType(parsed('levelled(p_d, f)'), scopeWith(SAMPLES)).value;
  expect([...(typed?.factors.values() ?? [])]).toEqual([2 * Math.PI]);
});
