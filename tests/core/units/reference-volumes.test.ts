import { describe, expect, it } from 'vitest';
import { evaluateText, places, reportOf, sheetOf } from '../evaluate/sheet-text.ts';

const STATES = ['normal_state: 1.01325 bara, 0 degC', 'standard_state: 14.696 psia, 60 degF'];
const flow = (value: string, calc: string): string =>
  sheetOf(
    ...STATES,
    `inputs: { Q: { value: ${value}, source: b } }`,
    `sections: [{ title: S, steps: { n: "${calc}" } }]`,
  );

describe('normal and standard volumes are amounts', () => {
  it.each([
    // Molar volume of an ideal gas at 101.325 kPa and 273.15 K: 22.413 969 54 dm³/mol (CODATA 2018).
    ['1000 Nm3/h', 'Q to kmol/h', 1000 / 22.41396954, 1e-9],
    // At 14.696 psia and 60 °F: 379.48 ft³ per lbmol (GPSA Engineering Data Book, section 1: 379.49 at 14.696 psia).
    ['1 MMSCFD', 'Q to lbmol/h', 1e6 / 379.482 / 24, 3e-6],
    ['24 MSCFD', 'Q to SCFH', 1000, 1e-12],
    ['1 MMSCFD', 'Q to Sm3/h', (1e6 * 0.3048 ** 3) / 24, 1e-12],
    ['2 SCF', 'Q to MMSCF', 2e-6, 1e-12],
  ])('%s, %s', (value, calc, expected, tolerance) => {
    const found = reportOf(evaluateText(flow(value, calc))).quantities['n']?.value;
    expect(Math.abs(Number(found) / expected - 1)).toBeLessThan(tolerance);
  });

  it('turn into each other by their states: 1 Nm3 is T_s/T_n times p_n/p_s of a standard one', () => {
    const ratio = ((288.705556 / 273.15) * 101_325) / (14.696 * 6894.757293168361);
    const found = reportOf(evaluateText(flow('1 Nm3', 'Q to Sm3'))).quantities['n']?.value;
    expect(Math.abs(Number(found) / ratio - 1)).toBeLessThan(1e-8);
  });

  it('give a mass with a molar mass', () => {
    const text = sheetOf(
      ...STATES,
      'gases: { g: { method: ideal, fractions: { methane: 100 % } } }',
      'sections: [{ title: S, steps: { m: "1000 Nm3/h*molar_mass(g) to kg/h" } }]',
    );
    // 44.6150 kmol/h times 16.0425 kg/kmol.
    expect(Number(reportOf(evaluateText(text)).quantities['m']?.value)).toBeCloseTo(715.74, 1);
  });
});

describe('what cannot be', () => {
  it('a standard volume without its state', () => {
    const text = sheetOf('inputs: { Q: { value: 1 MMSCFD, source: b } }');
    expect(evaluateText(text).diagnostics).toMatchObject([
      { code: 'REFERENCE_MISSING', line: 7, hints: [expect.stringContaining('standard_state: 14.696 psia, 60 degF')] },
    ]);
  });

  it('a standard volume in a formula without its state', () => {
    expect(places(evaluateText(sheetOf('sections: [{ title: S, steps: { n: 1 Nm3 } }]')))).toEqual([
      'REFERENCE_MISSING 7:36',
    ]);
  });

  it('an actual volume beside a standard one', () => {
    expect(evaluateText(flow('1 acfm', 'Q + 1 SCFM')).diagnostics).toMatchObject([{ code: 'UNIT_MISMATCH' }]);
  });

  it.each(['1.01325 bar, 0 degC', '1 barg, 0 degC', '1 bara', '0 degC, 1 bara', '1 bara, 10 delta_degC', 'none'])(
    'a state like %s',
    (state) => {
      const { report, diagnostics } = evaluateText(sheetOf(`normal_state: ${state}`));
      expect(report).toBeNull();
      expect(diagnostics[0]?.line).toBe(7);
    },
  );
});
