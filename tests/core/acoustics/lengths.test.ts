import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  chokeFilterFrequency,
  flangedEndCorrection,
  halfWaveFrequency,
  helmholtzFrequency,
  longestLumpedLength,
  quarterWaveFrequency,
  unflangedEndCorrection,
  wavelength,
} from '../../../core/acoustics/lengths.ts';

const speed = fc.double({ min: 150, max: 1500, noNaN: true });
const length = fc.double({ min: 0.01, max: 50, noNaN: true });
const area = fc.double({ min: 1e-5, max: 1, noNaN: true });
const volume = fc.double({ min: 1e-4, max: 50, noNaN: true });

function near(actual: number, expected: number): void {
  expect(Math.abs(actual / expected - 1)).toBeLessThan(1e-12);
}

describe('resonances of pipes', () => {
  it('put half a wavelength into a pipe with like ends, and a quarter into one with unlike ends', () => {
    fc.assert(
      fc.property(speed, length, (c, L) => {
        near(wavelength(c, halfWaveFrequency(c, L, 1)) / 2, L);
        near(wavelength(c, quarterWaveFrequency(c, L, 1)) / 4, L);
      }),
    );
  });

  it('are whole multiples of the lowest', () => {
    fc.assert(
      fc.property(speed, length, fc.integer({ min: 1, max: 40 }), (c, L, n) => {
        near(halfWaveFrequency(c, L, n), n * halfWaveFrequency(c, L, 1));
        near(quarterWaveFrequency(c, L, n), n * quarterWaveFrequency(c, L, 1));
      }),
    );
  });
});

describe('lumped resonators', () => {
  it('a choke filter with equal chambers swings like a Helmholtz resonator with half the volume', () => {
    fc.assert(
      fc.property(speed, area, length, volume, (c, A, L, V) => {
        near(chokeFilterFrequency(c, A, L, V, V), helmholtzFrequency(c, A, L, V / 2));
      }),
    );
  });

  it('a choke filter does not care which chamber comes first, and swings faster than either alone', () => {
    fc.assert(
      fc.property(speed, area, length, volume, volume, (c, A, L, V1, V2) => {
        const frequency = chokeFilterFrequency(c, A, L, V1, V2);
        near(frequency, chokeFilterFrequency(c, A, L, V2, V1));
        expect(frequency).toBeGreaterThan(helmholtzFrequency(c, A, L, Math.min(V1, V2)));
      }),
    );
  });

  it('a choke filter with a boundless second chamber is a Helmholtz resonator', () => {
    near(chokeFilterFrequency(400, 0.005, 0.3, 0.05, 1e18), helmholtzFrequency(400, 0.005, 0.3, 0.05));
  });

  it('count as lumped up to a tenth of the wavelength', () => {
    near(longestLumpedLength(400, 20), 2);
  });
});

describe('end corrections', () => {
  it('are larger with a flange, and grow with the diameter', () => {
    fc.assert(
      fc.property(length, (d) => {
        expect(flangedEndCorrection(d)).toBeGreaterThan(unflangedEndCorrection(d));
        near(flangedEndCorrection(2 * d), 2 * flangedEndCorrection(d));
        near(unflangedEndCorrection(2 * d), 2 * unflangedEndCorrection(d));
      }),
    );
  });
});
