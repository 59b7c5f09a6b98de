import { describe, it } from 'vitest';
import {
  chokeFilterFrequency,
  flangedEndCorrection,
  halfWaveFrequency,
  helmholtzFrequency,
  quarterWaveFrequency,
  unflangedEndCorrection,
  wavelength,
} from '../../core/acoustics/lengths.ts';
import { byId, expectRow, type Row } from './row.ts';

type Call = readonly [fn: (...args: number[]) => number, ...args: number[]];

const ROUND = Math.PI / 4;
const REFERENCE = 'closed form, computed by separately written code from invented data';
const DIGITS = 'same formula in double precision';

function reference(id: string, inputs: Call, expected: number): Row<Call> {
  return {
    id,
    source: REFERENCE,
    inputs,
    expected,
    tolerance: 1e-12 * expected,
    whyTolerance: DIGITS,
    kind: 'independent',
  };
}

function hand(id: string, inputs: Call, expected: number): Row<Call> {
  return { id, source: 'by hand', inputs, expected, tolerance: 1e-12 * expected, whyTolerance: DIGITS, kind: 'hand' };
}

/** The distributed solution of the same system: the lumped formula must come near it while the lengths are short. */
function distributed(id: string, inputs: Call, expected: number, tolerance: number, whyTolerance: string): Row<Call> {
  const source =
    'exact plane-wave solution with a distributed neck, computed by separately written code from invented data';
  return { id, source, inputs, expected, tolerance, whyTolerance, kind: 'independent' };
}

const ROWS: readonly Row<Call>[] = [
  hand('quarter wave, 400 m/s and 5 m', [quarterWaveFrequency, 400, 5, 1], 20),
  hand('quarter wave, third harmonic', [quarterWaveFrequency, 400, 5, 3], 60),
  hand('half wave, 400 m/s and 5 m', [halfWaveFrequency, 400, 5, 1], 40),
  hand('half wave, 1000 ft/s and 12.5 ft', [halfWaveFrequency, 304.8, 3.81, 1], 40),
  hand('Helmholtz, all ones and c = 2 pi', [helmholtzFrequency, 2 * Math.PI, 1, 1, 1], 1),
  hand('choke filter, equal chambers of 2 m³', [chokeFilterFrequency, 2 * Math.PI, 1, 1, 2, 2], 1),
  hand('wavelength of 20 Hz at 400 m/s', [wavelength, 400, 20], 20),
  reference('quarter wave, 6 m, n = 1', [quarterWaveFrequency, 400, 6, 1], 16.666666666666668),
  reference('quarter wave, 6 m, n = 5', [quarterWaveFrequency, 400, 6, 5], 83.33333333333333),
  reference('quarter wave, 6 m, n = 9', [quarterWaveFrequency, 400, 6, 9], 150),
  reference('half wave, 6 m, n = 1', [halfWaveFrequency, 400, 6, 1], 33.333333333333336),
  reference('half wave, 6 m, n = 5', [halfWaveFrequency, 400, 6, 5], 166.66666666666666),
  reference(
    'Helmholtz, neck 80 mm by 320 mm',
    [helmholtzFrequency, 400, ROUND * 0.08 ** 2, 0.32, 0.045],
    37.61263890318375,
  ),
  reference(
    'choke filter, tube 150 mm by 1.5 m',
    [chokeFilterFrequency, 400, ROUND * 0.15 ** 2, 1.5, 0.35, 0.25],
    18.094321052763224,
  ),
  distributed(
    'Helmholtz against a distributed neck',
    [helmholtzFrequency, 400, ROUND * 0.08 ** 2, 0.32, 0.045],
    37.390028283894345,
    0.3,
    'the neck is 0.03 of a wavelength long, which lowers the frequency by 0.6 %',
  ),
  distributed(
    'choke filter against a distributed choke',
    [chokeFilterFrequency, 400, ROUND * 0.15 ** 2, 1.5, 0.35, 0.25],
    17.94758292431649,
    0.2,
    'the choke is 0.07 of a wavelength long, which lowers the frequency by 0.8 %',
  ),
  {
    id: 'flanged end, in radii',
    source:
      'Rayleigh, The Theory of Sound, vol. 2, 2nd ed. (1896), section 307 and appendix A: 8 / (3 pi), about 0.849',
    inputs: [flangedEndCorrection, 2],
    expected: 0.849,
    tolerance: 0.0005,
    whyTolerance: 'printed to three digits',
    kind: 'published',
  },
  {
    id: 'unflanged end, in radii',
    source: 'Levine and Schwinger, Physical Review 73 (1948), 383: 0.6133',
    inputs: [unflangedEndCorrection, 2],
    expected: 0.6133,
    tolerance: 1e-12,
    whyTolerance: DIGITS,
    kind: 'published',
  },
];

describe('acoustic lengths', () => {
  it.each(byId(ROWS))('%s', (_, row) => {
    const [fn, ...args] = row.inputs;
    expectRow(fn(...args), row);
  });
});
