import {
  chokeFilterFrequency,
  flangedEndCorrection,
  halfWaveFrequency,
  helmholtzFrequency,
  longestLumpedLength,
  quarterWaveFrequency,
  unflangedEndCorrection,
  wavelength,
} from '../acoustics/lengths.ts';
import { power } from '../numeric/math.ts';
import { FREQUENCY, LENGTH } from '../units/dimensions.ts';
import { numberAt } from './arguments.ts';
import type { Argument, FunctionNotice, FunctionResult, LibraryFunction } from './function.ts';
import {
  FREQUENCY_OF_SOUND,
  SOUND_SPEED,
  areaParameter,
  lengthParameter,
  orderParameter,
  volumeParameter,
} from './parameters.ts';

type Returns = LibraryFunction['returns'];

const NATURAL_FREQUENCY: Returns = { dimension: FREQUENCY, kind: 'cycles', unit: 'Hz', summary: 'natural frequency' };
const ADDED_LENGTH: Returns = { dimension: LENGTH, kind: 'plain', unit: 'mm', summary: 'length to add to the pipe' };
const ACOUSTIC_LENGTH = lengthParameter('L', 'L', 'acoustic length, end corrections included');
const END_DIAMETER = lengthParameter('d', 'd', 'inside diameter of the open end', 'mm');

const PLANE_WAVES = 'Plane waves, no mean flow, no damping.';
const LUMPED = 'Neck and volumes shorter than a tenth of the wavelength, with a warning beyond; no damping.';
const KINSLER = 'Kinsler, Frey, Coppens, Sanders, Fundamentals of Acoustics, 4th ed. (2000)';

export const ACOUSTICS_FUNCTIONS: readonly LibraryFunction[] = [
  {
    name: 'quarter_wave_frequency',
    topic: 'acoustics',
    summary: 'Natural frequency of a pipe closed at one end and open at the other',
    symbol: 'f_{1/4}',
    formula: 'f = \\frac{n\\,c}{4\\,L}',
    parameters: [SOUND_SPEED, ACOUSTIC_LENGTH, orderParameter('odd multiple of the lowest: 1, 3, 5, …')],
    returns: NATURAL_FREQUENCY,
    validity: PLANE_WAVES,
    source: `${KINSLER}, section 10.2`,
    example: { call: 'quarter_wave_frequency(400 m/s, 5 m, 1)', result: '20.00 Hz' },
    evaluate: quarterWave,
  },
  {
    name: 'half_wave_frequency',
    topic: 'acoustics',
    summary: 'Natural frequency of a pipe with two like ends, both closed or both open',
    symbol: 'f_{1/2}',
    formula: 'f = \\frac{n\\,c}{2\\,L}',
    parameters: [SOUND_SPEED, ACOUSTIC_LENGTH, orderParameter('multiple of the lowest: 1, 2, 3, …')],
    returns: NATURAL_FREQUENCY,
    validity: PLANE_WAVES,
    source: `${KINSLER}, section 10.2`,
    example: { call: 'half_wave_frequency(400 m/s, 5 m, 1)', result: '40.00 Hz' },
    evaluate: (args) => sound(halfWaveFrequency(numberAt(args, 0), numberAt(args, 1), numberAt(args, 2))),
  },
  {
    name: 'helmholtz_frequency',
    topic: 'acoustics',
    summary: 'Natural frequency of a volume behind a neck',
    symbol: 'f_\\mathrm{H}',
    formula: 'f = \\frac{c}{2\\pi}\\sqrt{\\frac{A}{L\\,V}}',
    parameters: [
      SOUND_SPEED,
      areaParameter('A', 'A', 'cross-section of the neck'),
      lengthParameter('L', 'L', 'length of the neck, end corrections included'),
      volumeParameter('V', 'V', 'volume behind the neck'),
    ],
    returns: NATURAL_FREQUENCY,
    validity: LUMPED,
    source: `${KINSLER}, section 10.8`,
    example: { call: 'helmholtz_frequency(400 m/s, 5000 mm^2, 320 mm, 0.045 m^3)', result: '37.51 Hz' },
    evaluate: helmholtz,
  },
  {
    name: 'choke_filter_frequency',
    topic: 'acoustics',
    summary: 'Natural frequency of a volume-choke-volume filter',
    symbol: 'f_\\mathrm{F}',
    formula: 'f = \\frac{c}{2\\pi}\\sqrt{\\frac{A}{L}\\left(\\frac{1}{V_1}+\\frac{1}{V_2}\\right)}',
    parameters: [
      SOUND_SPEED,
      areaParameter('A', 'A', 'cross-section of the choke tube'),
      lengthParameter('L', 'L', 'length of the choke tube, end corrections included'),
      volumeParameter('V_1', 'V_1', 'volume of the first chamber'),
      volumeParameter('V_2', 'V_2', 'volume of the second chamber'),
    ],
    returns: NATURAL_FREQUENCY,
    validity: LUMPED,
    source:
      'Derived from the lumped mass of the choke and the stiffness of both chambers; its use in design: Brun and Kurz (ed.), Compression Machinery for Oil and Gas (2019), p. 452',
    example: {
      call: 'choke_filter_frequency(400 m/s, 17671 mm^2, 1.5 m, 0.35 m^3, 0.25 m^3)',
      result: '18.09 Hz',
    },
    evaluate: chokeFilter,
  },
  {
    name: 'flanged_end_correction',
    topic: 'acoustics',
    summary: 'Length to add for one flanged open end',
    symbol: '\\delta_\\mathrm{fl}',
    formula: '\\delta = \\frac{8}{3\\pi}\\,\\frac{d}{2}',
    parameters: [END_DIAMETER],
    returns: ADDED_LENGTH,
    validity: 'Wavelength long against the diameter, flange wide against it, no mean flow.',
    source: 'Rayleigh, The Theory of Sound, vol. 2, 2nd ed. (1896), section 307 and appendix A (piston value)',
    example: { call: 'flanged_end_correction(100 mm)', result: '42.44 mm' },
    evaluate: (args) => sound(flangedEndCorrection(numberAt(args, 0))),
  },
  {
    name: 'unflanged_end_correction',
    topic: 'acoustics',
    summary: 'Length to add for one open end without a flange',
    symbol: '\\delta_\\mathrm{un}',
    formula: '\\delta = 0.6133\\,\\frac{d}{2}',
    parameters: [END_DIAMETER],
    returns: ADDED_LENGTH,
    validity: 'Wavelength long against the diameter, thin wall, no mean flow.',
    source: 'Levine and Schwinger, Physical Review 73 (1948), p. 383',
    example: { call: 'unflanged_end_correction(100 mm)', result: '30.66 mm' },
    evaluate: (args) => sound(unflangedEndCorrection(numberAt(args, 0))),
  },
  {
    name: 'wavelength',
    topic: 'acoustics',
    summary: 'Wavelength of a frequency',
    symbol: '\\lambda',
    formula: '\\lambda = \\frac{c}{f}',
    parameters: [SOUND_SPEED, FREQUENCY_OF_SOUND],
    returns: { dimension: LENGTH, kind: 'plain', unit: 'm', summary: 'wavelength' },
    validity: 'Plane waves, no mean flow.',
    source: 'Definition, ISO 80000-8',
    example: { call: 'wavelength(400 m/s, 20 Hz)', result: '20.00 m' },
    evaluate: (args) => sound(wavelength(numberAt(args, 0), numberAt(args, 1))),
  },
];

function sound(value: number): FunctionResult {
  return { value, notices: [] };
}

function quarterWave(args: readonly Argument[]): FunctionResult {
  const order = numberAt(args, 2);
  if (order % 2 !== 0) return sound(quarterWaveFrequency(numberAt(args, 0), numberAt(args, 1), order));
  const notice: FunctionNotice = {
    code: 'DOMAIN',
    severity: 'error',
    message: `\`n\` of \`quarter_wave_frequency\` is odd, and is ${order}`,
    hints: [
      'a pipe closed at one end resonates at 1, 3, 5, … times its lowest frequency; with two like ends use `half_wave_frequency`',
    ],
    argument: 2,
  };
  return { value: Number.NaN, notices: [notice] };
}

function helmholtz(args: readonly Argument[]): FunctionResult {
  const [c, area, length, volume] = [numberAt(args, 0), numberAt(args, 1), numberAt(args, 2), numberAt(args, 3)];
  const value = helmholtzFrequency(c, area, length, volume);
  const longest = longestLumpedLength(c, value);
  return { value, notices: [...neckNotices(length, longest, 2), ...volumeNotices(volume, longest, 3)] };
}

function chokeFilter(args: readonly Argument[]): FunctionResult {
  const [c, area, length] = [numberAt(args, 0), numberAt(args, 1), numberAt(args, 2)];
  const [volume1, volume2] = [numberAt(args, 3), numberAt(args, 4)];
  const value = chokeFilterFrequency(c, area, length, volume1, volume2);
  const longest = longestLumpedLength(c, value);
  return {
    value,
    notices: [
      ...neckNotices(length, longest, 2),
      ...volumeNotices(volume1, longest, 3),
      ...volumeNotices(volume2, longest, 4),
    ],
  };
}

function neckNotices(length: number, longest: number, argument: number): FunctionNotice[] {
  return length <= longest ? [] : [tooLong(`the neck is ${inMetres(length)} long`, longest, argument)];
}

/** No vessel is shorter than the edge of a cube of its volume, so this is the mildest reading of the rule. */
function volumeNotices(volume: number, longest: number, argument: number): FunctionNotice[] {
  const edge = power(volume, 1 / 3);
  return edge <= longest ? [] : [tooLong(`the volume is at least ${inMetres(edge)} long`, longest, argument)];
}

function tooLong(what: string, longest: number, argument: number): FunctionNotice {
  return {
    code: 'VALIDITY',
    severity: 'warning',
    message: `${what}, more than a tenth of the wavelength (${inMetres(longest)}), and is taken as lumped`,
    hints: ['the real frequency lies a few percent off or more'],
    argument,
  };
}

function inMetres(length: number): string {
  return `${Number(length.toPrecision(3))} m`;
}
