import { HEAT_CAPACITY_RANGE } from './data/components.ts';
import type { GasModel } from './gas-model.ts';
import {
  idealDensity,
  idealHeatCapacityCp,
  idealHeatCapacityCv,
  idealIsentropicExponent,
  idealSpeedOfSound,
} from './ideal-gas.ts';

export type GasProperty =
  'density' | 'compressibilityFactor' | 'heatCapacityCp' | 'heatCapacityCv' | 'isentropicExponent' | 'speedOfSound';

/** What a method has to say about a state. `concerns` says which of gas, pressure and temperature it is about. */
export interface GasNotice {
  readonly code: 'GAS_METHOD' | 'VALIDITY';
  readonly severity: 'error' | 'warning';
  readonly concerns: 'gas' | 'pressure' | 'temperature';
  readonly message: string;
  readonly hints: readonly string[];
}

export interface PropertyResult {
  /** SI; NaN goes with an error notice. */
  readonly value: number;
  readonly notices: readonly GasNotice[];
}

/** Above this pressure an equation of state should be used: common practice, no source. */
export const IDEAL_PRESSURE_LIMIT = 20e5;

/** Properties that rest on the heat capacities, and so on their range of temperature. */
const CALORIC: ReadonlySet<GasProperty> = new Set([
  'heatCapacityCp',
  'heatCapacityCv',
  'isentropicExponent',
  'speedOfSound',
]);

/**
 * A property of a gas by the method that its model names. Methods that this version does not have are refused: an ideal
 * value in their place would look like theirs.
 *
 * @param property  which one
 * @param gas       composition and method
 * @param pressure     p  pressure     [Pa abs]  > 0
 * @param temperature  T  temperature  [K]       > 0
 * @returns SI value: kg/m^3, -, J/(kg K), -, m/s
 * @validity `ideal`: up to 20 bar(a) (common practice), heat capacities from 200 to 600 K; warnings outside
 * @diagnostic GAS_METHOD (error), VALIDITY (warning)
 * @source as the functions of each method say
 */
export function gasProperty(
  property: GasProperty,
  gas: GasModel,
  pressure: number,
  temperature: number,
): PropertyResult {
  switch (gas.method) {
    case 'ideal':
      return {
        value: idealProperty(property, gas, pressure, temperature),
        notices: idealNotices(property, pressure, temperature),
      };
    case 'gerg2008':
    case 'aga8_detail':
    case 'peng_robinson':
    case 'soave_redlich_kwong':
      return { value: Number.NaN, notices: [unavailable(gas)] };
  }
}

function idealProperty(property: GasProperty, gas: GasModel, pressure: number, temperature: number): number {
  switch (property) {
    case 'density':
      return idealDensity(gas, pressure, temperature);
    case 'compressibilityFactor':
      return 1;
    case 'heatCapacityCp':
      return idealHeatCapacityCp(gas, temperature);
    case 'heatCapacityCv':
      return idealHeatCapacityCv(gas, temperature);
    case 'isentropicExponent':
      return idealIsentropicExponent(gas, temperature);
    case 'speedOfSound':
      return idealSpeedOfSound(gas, temperature);
  }
}

function idealNotices(property: GasProperty, pressure: number, temperature: number): GasNotice[] {
  const notices: GasNotice[] = [];
  if (pressure > IDEAL_PRESSURE_LIMIT) {
    notices.push({
      code: 'VALIDITY',
      severity: 'warning',
      concerns: 'pressure',
      message: `the gas is taken as ideal at ${shown(pressure / 1e5)} bar(a), and the model is meant for up to ${shown(IDEAL_PRESSURE_LIMIT / 1e5)} bar(a)`,
      hints: ['hold the result against a measured or published value of the real gas'],
    });
  }
  const { from, to } = HEAT_CAPACITY_RANGE;
  if (CALORIC.has(property) && (temperature < from || temperature > to)) {
    const end = temperature < from ? from : to;
    notices.push({
      code: 'VALIDITY',
      severity: 'warning',
      concerns: 'temperature',
      message: `the heat capacities hold from ${from} to ${to} K, and the temperature is ${shown(temperature)} K: their value at ${end} K is used`,
      hints: [],
    });
  }
  return notices;
}

function unavailable(gas: GasModel): GasNotice {
  return {
    code: 'GAS_METHOD',
    severity: 'error',
    concerns: 'gas',
    message: `the gas method \`${gas.method}\` of \`${gas.name}\` is not available in this version`,
    hints: [
      `state \`method: ideal\` for \`${gas.name}\` where an ideal gas is good enough; without a method, \`gerg2008\` is meant`,
    ],
  };
}

function shown(number: number): string {
  return String(Number(number.toPrecision(4)));
}
