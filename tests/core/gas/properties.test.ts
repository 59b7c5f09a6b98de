import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { COMPONENT_IDS } from '../../../core/gas/find-component.ts';
import { GAS_CONSTANT } from '../../../core/numeric/gas-constant.ts';
import type { GasModel } from '../../../core/gas/gas-model.ts';
import { molarMass } from '../../../core/gas/molar-mass.ts';
import { gasProperty, type GasProperty } from '../../../core/gas/properties.ts';

const PROPERTIES: readonly GasProperty[] = [
  'density',
  'compressibilityFactor',
  'heatCapacityCp',
  'heatCapacityCv',
  'isentropicExponent',
  'speedOfSound',
];
const pressure = fc.double({ min: 1e3, max: 20e5, noNaN: true });
const temperature = fc.double({ min: 200, max: 600, noNaN: true });

/** Mixtures of two components, so that mixing is part of every law. */
const gas = fc
  .tuple(
    fc.constantFrom(...COMPONENT_IDS),
    fc.constantFrom(...COMPONENT_IDS),
    fc.double({ min: 0.01, max: 0.99, noNaN: true }),
  )
  .filter(([a, b]) => a !== b)
  .map(([a, b, x]): GasModel => ({
    name: 'mix',
    method: 'ideal',
    moleFractions: new Map([
      [a, x],
      [b, 1 - x],
    ]),
  }));

function near(actual: number, expected: number): void {
  expect(Math.abs(actual / expected - 1)).toBeLessThan(1e-12);
}

describe('an ideal gas', () => {
  it('obeys p M = rho R T, Mayer, and c² = kappa p / rho', () => {
    fc.assert(
      fc.property(gas, pressure, temperature, (mixture, p, T) => {
        const of = (property: GasProperty): number => {
          const { value, notices } = gasProperty(property, mixture, p, T);
          expect(notices).toEqual([]);
          return value;
        };
        near(of('density') * GAS_CONSTANT * T, p * molarMass(mixture));
        near(of('heatCapacityCp') - of('heatCapacityCv'), GAS_CONSTANT / molarMass(mixture));
        near(of('isentropicExponent'), of('heatCapacityCp') / of('heatCapacityCv'));
        near(of('speedOfSound') * of('speedOfSound'), (of('isentropicExponent') * p) / of('density'));
        expect(of('compressibilityFactor')).toBe(1);
      }),
    );
  });

  it('says at which pressure it leaves its range', () => {
    const methane: GasModel = { name: 'methane', method: 'ideal', moleFractions: new Map([['methane', 1]]) };
    for (const property of PROPERTIES)
      expect(gasProperty(property, methane, 20.01e5, 300).notices).toMatchObject([
        { code: 'VALIDITY', severity: 'warning', concerns: 'pressure' },
      ]);
  });

  it('says at which temperatures its heat capacities leave theirs', () => {
    const methane: GasModel = { name: 'methane', method: 'ideal', moleFractions: new Map([['methane', 1]]) };
    for (const T of [199.9, 600.1])
      expect(gasProperty('speedOfSound', methane, 1e5, T).notices).toMatchObject([
        { code: 'VALIDITY', severity: 'warning', concerns: 'temperature' },
      ]);
    expect(gasProperty('density', methane, 1e5, 1000).notices).toEqual([]);
  });
});

describe('the methods that this version does not have', () => {
  it.each(['gerg2008', 'aga8_detail', 'peng_robinson', 'soave_redlich_kwong'] as const)(
    '%s gives no value',
    (method) => {
      for (const property of PROPERTIES) {
        const { value, notices } = gasProperty(
          property,
          { name: 'g', method, moleFractions: new Map([['methane', 1]]) },
          1e5,
          300,
        );
        expect(value).toBeNaN();
        expect(notices).toMatchObject([{ code: 'GAS_METHOD', severity: 'error', concerns: 'gas' }]);
      }
    },
  );
});
