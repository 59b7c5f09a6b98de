import { molarMass } from '../gas/molar-mass.ts';
import { gasProperty, type GasNotice, type GasProperty } from '../gas/properties.ts';
import type { Dimension } from '../units/dimension.ts';
import { DENSITY, MOLAR_MASS, NUMBER, SPECIFIC_HEAT, SPEED } from '../units/dimensions.ts';
import { gasAt, numberAt } from './arguments.ts';
import type { FunctionNotice, LibraryFunction } from './function.ts';
import { GAS, pressureParameter, temperatureParameter } from './parameters.ts';

const STATE = [
  GAS,
  pressureParameter('p', 'p', 'pressure, absolute'),
  temperatureParameter('T', 'T', 'temperature, absolute'),
];

const ARGUMENT_OF: Readonly<Record<GasNotice['concerns'], number>> = { gas: 0, pressure: 1, temperature: 2 };

const METHODS = 'Method `ideal` only in this version; up to 20 bar(a) (common practice)';
const CALORIC = `${METHODS}, 200 to 600 K, with a warning outside.`;
const R = 'R = 8.31446261815324 J/(mol K), exact (SI Brochure, 9th ed.)';
const HEAT_CAPACITIES =
  'ideal-gas heat capacities fitted to the published reference equation of each component, as carried by CoolProp 8.0.0';

export const GAS_FUNCTIONS: readonly LibraryFunction[] = [
  {
    name: 'molar_mass',
    topic: 'gas',
    summary: 'Molar mass of a gas',
    symbol: 'M',
    formula: 'M = \\sum_i x_i\\,M_i',
    parameters: [GAS],
    returns: { dimension: MOLAR_MASS, kind: 'plain', unit: 'kg/kmol', summary: 'molar mass' },
    validity: 'Any composition and method.',
    source:
      'Definition; molar masses of the published reference equation of each component, as carried by CoolProp 8.0.0',
    example: { call: 'molar_mass(methane)', result: '16.04 kg/kmol' },
    evaluate: (args) => ({ value: molarMass(gasAt(args, 0)), notices: [] }),
  },
  stateFunction({
    name: 'density',
    property: 'density',
    summary: 'Density of a gas',
    symbol: '\\rho',
    formula: '\\rho = \\frac{p\\,M}{R\\,T}',
    returns: [DENSITY, 'kg/m^3'],
    validity: `${METHODS}, with a warning above.`,
    source: `Ideal-gas law; ${R}`,
    result: '0.6785 kg/m^3',
  }),
  stateFunction({
    name: 'compressibility_factor',
    property: 'compressibilityFactor',
    summary: 'Compressibility factor of a gas',
    symbol: 'Z',
    formula: 'Z = \\frac{p\\,M}{\\rho\\,R\\,T}',
    returns: [NUMBER, '1'],
    validity: `${METHODS}, with a warning above; an ideal gas has Z = 1.`,
    source: `Definition; ${R}`,
    result: '1.000',
  }),
  stateFunction({
    name: 'heat_capacity_cp',
    property: 'heatCapacityCp',
    summary: 'Heat capacity at constant pressure, per mass',
    symbol: 'c_p',
    formula: 'c_p = \\frac{1}{M}\\sum_i x_i\\,c_{p,i}(T)',
    returns: [SPECIFIC_HEAT, 'kJ/(kg*K)'],
    validity: CALORIC,
    source: `Definition; ${HEAT_CAPACITIES}`,
    result: '2.204 kJ/(kg*K)',
  }),
  stateFunction({
    name: 'heat_capacity_cv',
    property: 'heatCapacityCv',
    summary: 'Heat capacity at constant volume, per mass',
    symbol: 'c_v',
    formula: 'c_v = c_p - \\frac{R}{M}',
    returns: [SPECIFIC_HEAT, 'kJ/(kg*K)'],
    validity: CALORIC,
    source: `Mayer's relation; ${R}; ${HEAT_CAPACITIES}`,
    result: '1.686 kJ/(kg*K)',
  }),
  stateFunction({
    name: 'isentropic_exponent',
    property: 'isentropicExponent',
    summary: 'Isentropic exponent of a gas',
    symbol: '\\kappa',
    formula: '\\kappa = \\frac{c_p}{c_p - R/M}',
    returns: [NUMBER, '1'],
    validity: CALORIC,
    source: `Definition; ${R}; ${HEAT_CAPACITIES}`,
    result: '1.307',
  }),
  stateFunction({
    name: 'speed_of_sound',
    property: 'speedOfSound',
    summary: 'Speed of sound in a gas',
    symbol: 'c',
    formula: 'c = \\sqrt{\\frac{\\kappa\\,R\\,T}{M}}',
    returns: [SPEED, 'm/s'],
    validity: CALORIC,
    source: `Kinsler, Frey, Coppens, Sanders, Fundamentals of Acoustics, 4th ed. (2000), section 5.6; ${R}; ${HEAT_CAPACITIES}`,
    result: '441.9 m/s',
  }),
];

interface StateFunction extends Pick<
  LibraryFunction,
  'name' | 'summary' | 'symbol' | 'formula' | 'validity' | 'source'
> {
  readonly property: GasProperty;
  readonly returns: readonly [dimension: Dimension, unit: string];
  /** Of methane at 1.01325 bar(a) and 15 °C, as printed. */
  readonly result: string;
}

/** A property by (gas, p, T), computed by the method that the gas names. */
function stateFunction({ property, returns: [dimension, unit], result, ...rest }: StateFunction): LibraryFunction {
  return {
    ...rest,
    topic: 'gas',
    parameters: STATE,
    returns: { dimension, kind: 'plain', unit, summary: rest.summary },
    example: { call: `${rest.name}(methane, 1.01325 bara, 15 degC)`, result },
    evaluate: (args) => {
      const { value, notices } = gasProperty(property, gasAt(args, 0), numberAt(args, 1), numberAt(args, 2));
      return { value, notices: notices.map(toNotice) };
    },
  };
}

function toNotice({ concerns, ...notice }: GasNotice): FunctionNotice {
  return { ...notice, argument: ARGUMENT_OF[concerns] };
}
