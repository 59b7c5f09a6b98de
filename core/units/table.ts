import type { Dimension, Kind } from './dimension.ts';
import * as D from './dimensions.ts';
import type { Unit, UnitSystem } from './unit.ts';

/**
 * The closed table of units. Factors are exact by definition where a definition exists: the international yard and pound
 * (1 in = 0.0254 m, 1 lb = 0.45359237 kg), standard gravity 9.80665 m/s², the standard atmosphere 101 325 Pa, the
 * International Table Btu (1055.05585262 J); conventional columns of mercury and water at 0 °C and 4 °C.
 * Source: NIST Special Publication 811 (2008), appendix B; ISO 80000-1.
 */
const INCH = 0.0254;
const FOOT = 0.3048;
const POUND = 0.45359237;
const GRAVITY = 9.80665;
const POUND_FORCE = POUND * GRAVITY;
const CUBIC_FOOT = FOOT * FOOT * FOOT;
const PSI = POUND_FORCE / (INCH * INCH);
const BTU = 1055.05585262;
const RANKINE = 5 / 9;
const GALLON = 231 * INCH * INCH * INCH;
const MERCURY = 13595.1 * GRAVITY;
const WATER = 1000 * GRAVITY;

type Row = readonly [text: string, dimension: Dimension, factor: number, system: UnitSystem, extra?: Extra];

interface Extra {
  readonly kind?: Kind;
  readonly shift?: number;
  readonly gauge?: boolean;
  readonly reference?: 'normal' | 'standard';
  readonly tex?: string;
  readonly aliases?: readonly string[];
}

const level: Extra = { kind: 'level' };
const gauge: Extra = { kind: 'level', gauge: true };
const difference: Extra = { kind: 'difference' };
const standard: Extra = { reference: 'standard' };
const cycles: Extra = { kind: 'cycles' };
const radians: Extra = { kind: 'radians' };

const ROWS: readonly Row[] = [
  ['1', D.NUMBER, 1, 'both', { tex: '1' }],
  ['%', D.NUMBER, 0.01, 'both', { kind: 'percent', tex: '\\%' }],
  ['mol%', D.NUMBER, 0.01, 'both', { kind: 'percent', tex: '\\mathrm{mol}\\,\\%', aliases: ['mole%', 'mol-%'] }],
  ['ppm', D.NUMBER, 1e-6, 'both', { kind: 'percent' }],
  ['rad', D.NUMBER, 1, 'both', radians],
  ['mrad', D.NUMBER, 1e-3, 'both', radians],
  ['deg', D.NUMBER, Math.PI / 180, 'both', { kind: 'radians', tex: '{}^{\\circ}', aliases: ['°'] }],
  ['rev', D.NUMBER, 1, 'both', { kind: 'cycles', aliases: ['turn', 'turns'] }],

  ['m', D.LENGTH, 1, 'si'],
  ['km', D.LENGTH, 1000, 'si'],
  ['cm', D.LENGTH, 0.01, 'si'],
  ['mm', D.LENGTH, 1e-3, 'si'],
  ['um', D.LENGTH, 1e-6, 'si', { tex: '\\text{µ}\\mathrm{m}', aliases: ['µm', 'μm', 'micron'] }],
  ['in', D.LENGTH, INCH, 'us', { aliases: ['inch', 'inches'] }],
  ['ft', D.LENGTH, FOOT, 'us', { aliases: ['foot', 'feet'] }],
  ['yd', D.LENGTH, 0.9144, 'us'],
  ['mile', D.LENGTH, 1609.344, 'us'],
  ['mil', D.LENGTH, INCH / 1000, 'us', { aliases: ['mils'] }],
  ['microinch', D.LENGTH, INCH * 1e-6, 'us', { tex: '\\text{µ}\\mathrm{in}', aliases: ['uin', 'µin', 'μin'] }],

  ['s', D.TIME, 1, 'both', { aliases: ['sec'] }],
  ['ms', D.TIME, 1e-3, 'both'],
  ['us', D.TIME, 1e-6, 'both', { tex: '\\text{µ}\\mathrm{s}', aliases: ['µs', 'μs'] }],
  ['min', D.TIME, 60, 'both'],
  ['h', D.TIME, 3600, 'both', { aliases: ['hr'] }],
  ['d', D.TIME, 86_400, 'both', { aliases: ['day', 'days'] }],

  ['Hz', D.FREQUENCY, 1, 'both', cycles],
  ['kHz', D.FREQUENCY, 1000, 'both', cycles],
  ['rpm', D.FREQUENCY, 1 / 60, 'both', { kind: 'cycles', aliases: ['r/min', 'rev/min'] }],
  ['rad/s', D.FREQUENCY, 1, 'both', radians],

  ['kg', D.MASS, 1, 'si'],
  ['g', D.MASS, 1e-3, 'si'],
  ['t', D.MASS, 1000, 'si', { aliases: ['tonne'] }],
  ['lbm', D.MASS, POUND, 'us', { aliases: ['lb'] }],
  ['oz', D.MASS, POUND / 16, 'us'],
  ['slug', D.MASS, POUND_FORCE / FOOT, 'us'],

  ['K', D.TEMPERATURE, 1, 'si', { kind: 'open' }],
  ['degR', D.TEMPERATURE, RANKINE, 'us', { kind: 'open', tex: '{}^{\\circ}\\mathrm{R}', aliases: ['°R'] }],
  ['degC', D.TEMPERATURE, 1, 'si', { kind: 'level', shift: 273.15, tex: '{}^{\\circ}\\mathrm{C}', aliases: ['°C'] }],
  [
    'degF',
    D.TEMPERATURE,
    RANKINE,
    'us',
    { kind: 'level', shift: 459.67 * RANKINE, tex: '{}^{\\circ}\\mathrm{F}', aliases: ['°F'] },
  ],
  ['delta_degC', D.TEMPERATURE, 1, 'si', { kind: 'difference', tex: '\\Delta{}^{\\circ}\\mathrm{C}' }],
  ['delta_degF', D.TEMPERATURE, RANKINE, 'us', { kind: 'difference', tex: '\\Delta{}^{\\circ}\\mathrm{F}' }],
  ['delta_K', D.TEMPERATURE, 1, 'si', { kind: 'difference', tex: '\\mathrm{K}' }],
  ['delta_degR', D.TEMPERATURE, RANKINE, 'us', { kind: 'difference', tex: '{}^{\\circ}\\mathrm{R}' }],

  ['mol', D.AMOUNT, 1, 'both'],
  ['kmol', D.AMOUNT, 1000, 'si'],
  ['lbmol', D.AMOUNT, POUND * 1000, 'us'],

  // Volumes at a reference state of the sheet: amounts, whose factor takes p/(R T) of that state along.
  ['Nm3', D.AMOUNT, 1, 'si', { reference: 'normal', tex: '\\mathrm{Nm^3}' }],
  ['Sm3', D.AMOUNT, 1, 'si', { reference: 'standard', tex: '\\mathrm{Sm^3}' }],
  ['SCF', D.AMOUNT, CUBIC_FOOT, 'us', standard],
  ['MSCF', D.AMOUNT, CUBIC_FOOT * 1e3, 'us', standard],
  ['MMSCF', D.AMOUNT, CUBIC_FOOT * 1e6, 'us', standard],
  ['SCFM', D.MOLAR_FLOW, CUBIC_FOOT / 60, 'us', standard],
  ['SCFH', D.MOLAR_FLOW, CUBIC_FOOT / 3600, 'us', standard],
  ['MSCFD', D.MOLAR_FLOW, (CUBIC_FOOT * 1e3) / 86_400, 'us', standard],
  ['MMSCFD', D.MOLAR_FLOW, (CUBIC_FOOT * 1e6) / 86_400, 'us', standard],

  ['gn', D.ACCELERATION, GRAVITY, 'both', { tex: 'g_{\\mathrm{n}}' }],

  ['N', D.FORCE, 1, 'si'],
  ['kN', D.FORCE, 1000, 'si'],
  ['MN', D.FORCE, 1e6, 'si'],
  ['kgf', D.FORCE, GRAVITY, 'si'],
  ['lbf', D.FORCE, POUND_FORCE, 'us'],
  ['kip', D.FORCE, POUND_FORCE * 1000, 'us'],

  ['Pa', D.PRESSURE, 1, 'si', difference],
  ['kPa', D.PRESSURE, 1000, 'si', difference],
  ['MPa', D.PRESSURE, 1e6, 'si', difference],
  ['GPa', D.PRESSURE, 1e9, 'si', difference],
  ['bar', D.PRESSURE, 1e5, 'si', difference],
  ['mbar', D.PRESSURE, 100, 'si', difference],
  ['atm', D.PRESSURE, 101_325, 'both', difference],
  ['mmHg', D.PRESSURE, MERCURY * 1e-3, 'si', difference],
  ['mmH2O', D.PRESSURE, WATER * 1e-3, 'si', { kind: 'difference', tex: '\\mathrm{mmH_2O}' }],
  ['torr', D.PRESSURE, 101_325 / 760, 'si', difference],
  ['psi', D.PRESSURE, PSI, 'us', difference],
  ['ksi', D.PRESSURE, PSI * 1000, 'us', difference],
  ['inHg', D.PRESSURE, MERCURY * INCH, 'us', difference],
  ['inH2O', D.PRESSURE, WATER * INCH, 'us', { kind: 'difference', tex: '\\mathrm{inH_2O}' }],
  ['Paa', D.PRESSURE, 1, 'si', level],
  ['kPaa', D.PRESSURE, 1000, 'si', { kind: 'level', tex: '\\mathrm{kPa(a)}' }],
  ['MPaa', D.PRESSURE, 1e6, 'si', { kind: 'level', tex: '\\mathrm{MPa(a)}' }],
  ['bara', D.PRESSURE, 1e5, 'si', { kind: 'level', tex: '\\mathrm{bar(a)}' }],
  ['psia', D.PRESSURE, PSI, 'us', level],
  ['kPag', D.PRESSURE, 1000, 'si', { ...gauge, tex: '\\mathrm{kPa(g)}' }],
  ['MPag', D.PRESSURE, 1e6, 'si', { ...gauge, tex: '\\mathrm{MPa(g)}' }],
  ['barg', D.PRESSURE, 1e5, 'si', { ...gauge, tex: '\\mathrm{bar(g)}' }],
  ['psig', D.PRESSURE, PSI, 'us', gauge],

  ['J', D.ENERGY, 1, 'si'],
  ['kJ', D.ENERGY, 1000, 'si'],
  ['MJ', D.ENERGY, 1e6, 'si'],
  ['kWh', D.ENERGY, 3.6e6, 'si'],
  ['BTU', D.ENERGY, BTU, 'us', { aliases: ['Btu'] }],
  ['ft-lbf', D.ENERGY, FOOT * POUND_FORCE, 'us', { tex: '\\mathrm{ft{\\cdot}lbf}' }],
  ['in-lbf', D.ENERGY, INCH * POUND_FORCE, 'us', { tex: '\\mathrm{in{\\cdot}lbf}' }],

  ['W', D.POWER, 1, 'si'],
  ['kW', D.POWER, 1000, 'si'],
  ['MW', D.POWER, 1e6, 'si'],
  ['hp', D.POWER, 550 * FOOT * POUND_FORCE, 'us'],

  ['L', D.VOLUME, 1e-3, 'si'],
  ['mL', D.VOLUME, 1e-6, 'si'],
  ['gal', D.VOLUME, GALLON, 'us'],
  ['acfm', D.VOLUME_FLOW, CUBIC_FOOT / 60, 'us', { aliases: ['cfm'] }],
  ['gpm', D.VOLUME_FLOW, GALLON / 60, 'us'],

  ['P', D.DYNAMIC_VISCOSITY, 0.1, 'both'],
  ['cP', D.DYNAMIC_VISCOSITY, 1e-3, 'both'],
  ['cSt', D.KINEMATIC_VISCOSITY, 1e-6, 'both'],
  [
    'lb-in-s2',
    D.MOMENT_OF_INERTIA,
    POUND_FORCE * INCH,
    'us',
    { tex: '\\mathrm{lbf{\\cdot}in{\\cdot}s^2}', aliases: ['lbf-in-s2'] },
  ],
];

function fromRow([text, dimension, factor, system, extra = {}]: Row): Unit {
  return {
    text,
    tex: extra.tex ?? `\\mathrm{${text}}`,
    dimension,
    kind: extra.kind ?? 'plain',
    factor,
    shift: extra.shift ?? 0,
    gauge: extra.gauge ?? false,
    system,
    ...(extra.reference === undefined ? {} : { reference: { state: extra.reference, power: 1 } }),
  };
}

/** Every unit that has a name of its own, in the order of the table. */
export const ALL_UNITS: readonly Unit[] = ROWS.map(fromRow);

const BY_NAME: ReadonlyMap<string, Unit> = new Map(
  ROWS.flatMap((row) => {
    const unit = fromRow(row);
    return [row[0], ...(row[4]?.aliases ?? [])].map((name) => [name, unit] as const);
  }),
);

/** Names and aliases by which units can be written. */
export const UNIT_NAMES: readonly string[] = [...BY_NAME.keys()];

/** The unit of a name or alias; undefined when there is none. Case counts: `mPa` is not `MPa`. */
export function namedUnit(name: string): Unit | undefined {
  return BY_NAME.get(name);
}
