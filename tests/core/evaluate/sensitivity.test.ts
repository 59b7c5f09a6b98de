import { describe, expect, it } from 'vitest';
import { evaluateSensitivity, type CheckSensitivity } from '../../../core/evaluate/sensitivity.ts';
import { evaluateText, places, sheetOf } from './sheet-text.ts';

function checkOf(text: string): CheckSensitivity {
  const [check] = evaluateSensitivity({ entry: 's.yaml', files: [{ name: 's.yaml', text }] })?.checks ?? [];
  if (check === undefined) throw new Error('no check');
  return check;
}

describe('a product of uncertain values, by hand', () => {
  // u = x·y/100 with x = 10 ± 1 and y = 5 from 4 to 7: 0.5 as stated; x alone 0.45 to 0.55, y alone 0.4 to 0.7.
  const check = checkOf(
    sheetOf(
      'inputs:',
      '  x: { value: 10 in, source: b, tolerance: 10 % }',
      '  y: { value: 5 in, source: b, range: [4 in, 7 in] }',
      '  z: { value: 100 in^2, source: b }',
      'sections: [{ title: S, checks: [{ that: x*y <= z }] }]',
    ),
  );

  it('ranks them by their effect', () => {
    expect(check.utilisation).toBeCloseTo(0.5, 12);
    expect(check.effects.map(({ path }) => path)).toEqual(['inputs/y', 'inputs/x']);
    const [y, x] = check.effects;
    expect([y?.low.value, y?.high.value, x?.low.value, x?.high.value]).toEqual([
      '4.000 in',
      '7.000 in',
      '9.000 in',
      '11.00 in',
    ]);
    expect([y?.low.utilisation, y?.high.utilisation].map(round)).toEqual([0.4, 0.7]);
    expect([x?.low.utilisation, x?.high.utilisation].map(round)).toEqual([0.45, 0.55]);
    expect([y?.change, x?.change].map(round)).toEqual([0.2, 0.05]);
    expect(check.effects.every(({ monotone }) => monotone)).toBe(true);
  });

  it('is exact at the corners: 9·4 and 11·7', () => {
    expect(round(check.corners.least)).toBe(0.36);
    expect(round(check.corners.greatest)).toBe(0.77);
  });

  it('adds up to first order: 0.25, and by squares √(0.2² + 0.05²)', () => {
    expect(check.firstOrder.sum).toBeCloseTo(0.25, 12);
    expect(check.firstOrder.independent).toBeCloseTo(Math.sqrt(0.0425), 12);
  });
});

it('takes the demand and the limit of a least value the right way round', () => {
  const check = checkOf(
    sheetOf(
      'inputs:',
      '  x: { value: 10 in, source: b, tolerance: ± 2 in }',
      'sections: [{ title: S, checks: [{ that: x >= 6 in }] }]',
    ),
  );
  expect([check.effects[0]?.low.utilisation, check.effects[0]?.high.utilisation].map(round)).toEqual([0.75, 0.5]);
  expect([check.corners.least, check.corners.greatest].map(round)).toEqual([0.5, 0.75]);
});

it('sees an effect that goes the same way to both sides', () => {
  const check = checkOf(
    sheetOf(
      'inputs:',
      '  x: { value: 0 in, source: b, tolerance: 1 in }',
      'sections: [{ title: S, checks: [{ that: x^2 + 1 in^2 <= 4 in^2 }] }]',
    ),
  );
  expect(check.effects[0]).toMatchObject({ monotone: false });
  expect(round(check.effects[0]?.change)).toBe(0.25);
});

it('moves the share of a component against the others', () => {
  const check = checkOf(
    sheetOf(
      'gases: { g: { method: ideal, fractions: { methane: 50 %, ethane: 25 %, propane: 25 % }, tolerance: { methane: 10 % } } }',
      'sections: [{ title: S, checks: [{ that: molar_mass(g) <= 100 kg/kmol }] }]',
    ),
  );
  // M = x·16.0425 + (1 − x)·(30.0690 + 44.0956)/2 with x = 0.4 and 0.6; the rest stay in proportion.
  const mass = (x: number): number => (x * 16.04246 + ((1 - x) * (30.06904 + 44.09562)) / 2) / 100;
  const [effect] = check.effects;
  expect(effect).toMatchObject({
    path: 'gases/g',
    label: 'methane in g',
    low: { value: '40.00 %' },
    high: { value: '60.00 %' },
  });
  expect(Math.abs((effect?.low.utilisation ?? 0) / mass(0.4) - 1)).toBeLessThan(2e-5);
  expect(Math.abs((effect?.high.utilisation ?? 0) / mass(0.6) - 1)).toBeLessThan(2e-5);
});

it('takes a level’s percentage of the absolute value', () => {
  const check = checkOf(
    sheetOf(
      'inputs:',
      '  p: { value: 85.3 psig, source: b, tolerance: 1 % }',
      'sections: [{ title: S, checks: [{ that: p <= 200 psia }] }]',
    ),
  );
  // 85.3 psig at 14.7 psia is 100 psia; a hundredth of it is 1 psi.
  expect([check.effects[0]?.low.value, check.effects[0]?.high.value]).toEqual(['84.30 psig', '86.30 psig']);
});

describe('tolerances that fit nothing', () => {
  const input = (tolerance: string): string => sheetOf('inputs:', `  p: { value: 85.3 psig, source: b, ${tolerance} }`);

  it.each([
    ['tolerance: 5 psig', 'UNIT_MISMATCH'],
    ['tolerance: 5 ft', 'UNIT_MISMATCH'],
    ['tolerance: "-5 psi"', 'DOMAIN'],
    ['tolerance: some', 'QUANTITY_SYNTAX'],
    ['range: [90 psig, 100 psig]', 'DOMAIN'],
    ['range: [80 psi, 100 psi]', 'UNIT_MISMATCH'],
    ['tolerance: 1 %, range: [80 psig, 90 psig]', 'SCHEMA_VALUE'],
  ])('%s', (text, code) => {
    const { report, diagnostics } = evaluateText(input(text));
    expect(report).toBeNull();
    expect(diagnostics.map((diagnostic) => diagnostic.code)).toEqual([code]);
  });

  it.each(['3 psig', '3 MSCFD', '3 ft'])('of a share in %s', (amount) => {
    const text = sheetOf(
      `gases: { g: { method: ideal, fractions: { methane: 100 % }, tolerance: { methane: ${amount} } } }`,
    );
    expect(evaluateText(text).diagnostics).toMatchObject([{ code: 'UNIT_MISMATCH', line: 7 }]);
  });

  it('of a component that the gas has not', () => {
    const text = sheetOf('gases: { g: { method: ideal, fractions: { methane: 100 % }, tolerance: { ethane: 1 % } } }');
    expect(places(evaluateText(text))).toEqual(['GAS_COMPONENT 7:74']);
  });
});

function round(value: number | null | undefined): number | null | undefined {
  return typeof value === 'number' ? Number(value.toPrecision(12)) : value;
}
