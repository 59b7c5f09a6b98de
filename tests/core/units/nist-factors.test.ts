import { describe, expect, it } from 'vitest';
import { toSi } from '../../../core/units/convert.ts';
import { parseUnit } from '../../../core/units/parse-unit.ts';

const SITE = { atmosphere: 101_325 };

/**
 * Conversion factors as printed in NIST Special Publication 811 (2008), appendix B.8, to seven significant digits; those
 * in bold there are exact. Tolerance: half a unit of the last printed digit, 5e-7 relative at most.
 */
const NIST = [
  ['in', 2.54e-2],
  ['ft', 3.048e-1],
  ['yd', 9.144e-1],
  ['mile', 1.609344e3],
  ['mil', 2.54e-5],
  ['microinch', 2.54e-8],
  ['in^2', 6.4516e-4],
  ['ft^2', 9.290304e-2],
  ['in^3', 1.638706e-5],
  ['ft^3', 2.831685e-2],
  ['gal', 3.785412e-3],
  ['L', 1e-3],
  ['lbm', 4.535924e-1],
  ['oz', 2.834952e-2],
  ['slug', 1.45939e1],
  ['t', 1e3],
  ['lbf', 4.448222],
  ['kip', 4.448222e3],
  ['kgf', 9.80665],
  ['psi', 6.894757e3],
  ['ksi', 6.894757e6],
  ['atm', 1.01325e5],
  ['torr', 1.333224e2],
  ['mmHg', 1.333224e2],
  ['inHg', 3.386389e3],
  ['inH2O', 2.490889e2],
  ['bar', 1e5],
  ['mbar', 1e2],
  ['kgf/cm^2', 9.80665e4],
  ['BTU', 1.055056e3],
  ['kWh', 3.6e6],
  ['ft-lbf', 1.355818],
  ['in-lbf', 1.129848e-1],
  ['hp', 7.456999e2],
  ['BTU/h', 2.930711e-1],
  ['lbm/ft^3', 1.601846e1],
  ['lbm/in^3', 2.76799e4],
  ['lbf/in', 1.751268e2],
  ['lbf/ft', 1.45939e1],
  ['ft/s', 3.048e-1],
  ['in/s', 2.54e-2],
  ['ft/s^2', 3.048e-1],
  ['cP', 1e-3],
  ['P', 1e-1],
  ['cSt', 1e-6],
  ['ft^3/min', 4.719474e-4],
  ['acfm', 4.719474e-4],
  ['gpm', 6.30902e-5],
  ['lb/min', 7.559873e-3],
  ['BTU/lb', 2.326e3],
  ['BTU/(lb*degF)', 4.1868e3],
  ['BTU/(h*ft*degF)', 1.730735],
  ['in^4', 4.162314e-7],
  ['lbm*ft^2', 4.214011e-2],
  ['lb-in-s2', 1.129848e-1],
  ['d', 8.64e4],
  ['h', 3.6e3],
] as const;

describe('factors of NIST SP 811', () => {
  it.each(NIST)('1 %s is %d in SI', (text, expected) => {
    const unit = parseUnit(text);
    if (unit === null) throw new Error(`no unit ${text}`);
    expect(Math.abs(toSi(1, unit, SITE) / expected - 1)).toBeLessThan(5e-7);
  });
});

describe('exact definitions', () => {
  it.each([
    ['psi', (0.45359237 * 9.80665) / 0.0254 ** 2],
    ['lbf', 4.4482216152605],
    ['hp', 550 * 0.3048 * 4.4482216152605],
    ['lbmol', 453.59237],
  ])('1 %s is %d', (text, expected) => {
    expect(Math.abs(toSi(1, parseUnit(text) ?? fail(text), SITE) / expected - 1)).toBeLessThan(1e-15);
  });

  it.each([
    ['degC', 0, 273.15],
    ['degC', 25, 298.15],
    ['degF', 32, 273.15],
    ['degF', 212, 373.15],
    ['degR', 491.67, 273.15],
    ['K', 273.15, 273.15],
    ['psig', 0, 101_325],
    ['barg', 1, 201_325],
    ['psia', 14.695948775513, 101_325],
    ['rpm', 1200, 20],
    ['deg', 180, Math.PI],
  ])('%s: %d is %d in SI', (text, number, expected) => {
    expect(toSi(number, parseUnit(text) ?? fail(text), SITE)).toBeCloseTo(expected, 8);
  });
});

function fail(text: string): never {
  throw new Error(`no unit ${text}`);
}
