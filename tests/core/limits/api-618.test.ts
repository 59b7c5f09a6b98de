import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  API_618_DAMPER_PRESSURE_DROP,
  API_618_FLANGE_PULSATION,
  API_618_LINE_PULSATION,
  api618DamperPressureDropLimit,
  api618FlangePulsationLimit,
  api618LinePulsationLimit,
} from '../../../core/limits/api-618.ts';

const speed = fc.double({ min: 150, max: 1500, noNaN: true });
const pressure = fc.double({ min: 3.5e5, max: 350e5, noNaN: true });
const bore = fc.double({ min: 0.01, max: 1.2, noNaN: true });
const frequency = fc.double({ min: 1, max: 500, noNaN: true });

describe('the line-side pulsation limit', () => {
  it('is the same in both unit systems of the standard but for their rounding, 0.83 %', () => {
    fc.assert(
      fc.property(speed, pressure, bore, frequency, (c, p, D, f) => {
        const ratio = api618LinePulsationLimit(c, p, D, f, 'us') / api618LinePulsationLimit(c, p, D, f, 'si');
        expect(ratio).toBeGreaterThan(1 - 0.0083);
        expect(ratio).toBeLessThan(1);
      }),
    );
  });

  it('falls with the root of pressure, bore and frequency', () => {
    fc.assert(
      fc.property(speed, bore, frequency, (c, D, f) => {
        const limit = api618LinePulsationLimit(c, 50e5, D, f);
        for (const quarter of [
          api618LinePulsationLimit(c, 200e5, D, f),
          api618LinePulsationLimit(c, 50e5, 4 * D, f),
          api618LinePulsationLimit(c, 50e5, D, 4 * f),
        ])
          expect(Math.abs((2 * quarter) / limit - 1)).toBeLessThan(1e-12);
      }),
    );
  });

  it('allows the same pressure below 3.5 bar(a) as at 3.5 bar(a), and has no step there', () => {
    const allowed = (p: number): number => p * api618LinePulsationLimit(400, p, 0.2, 20);
    for (const p of [0.5e5, 1e5, 2e5, 3.4999e5]) expect(allowed(p)).toBeCloseTo(allowed(3.5e5), 6);
    expect(allowed(3.6e5)).toBeGreaterThan(allowed(3.5e5));
  });
});

describe('the other limits', () => {
  it('the cylinder flange is held by 7 % from a pressure ratio of 7/3 on', () => {
    expect(api618FlangePulsationLimit(1)).toBeCloseTo(0.03, 12);
    expect(api618FlangePulsationLimit(2.3)).toBeCloseTo(0.069, 12);
    expect(api618FlangePulsationLimit(7 / 3)).toBeCloseTo(0.07, 12);
    expect(api618FlangePulsationLimit(5)).toBe(0.07);
  });

  it('a damper may drop at least 0.25 %', () => {
    expect(api618DamperPressureDropLimit(1)).toBe(0.0025);
    expect(api618DamperPressureDropLimit(1.17)).toBe(0.0025);
    expect(api618DamperPressureDropLimit(2)).toBeCloseTo(0.00835, 12);
  });

  it('all say which edition and clause they come from, and that they are to be verified', () => {
    for (const entry of [API_618_LINE_PULSATION, API_618_FLANGE_PULSATION, API_618_DAMPER_PRESSURE_DROP]) {
      expect(entry.edition).toBe('5th ed. (2007)');
      expect(entry.clause).toMatch(/^7\.9\.4\.2\.5\./);
      expect(entry.status).toBe('verify against your edition');
    }
  });
});
