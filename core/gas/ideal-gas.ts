import { HEAT_CAPACITY_RANGE } from './data/components.ts';
import { componentById } from './find-component.ts';
import { GAS_CONSTANT } from '../numeric/gas-constant.ts';
import type { GasModel } from './gas-model.ts';
import { molarMass } from './molar-mass.ts';

/**
 * Density of an ideal gas.
 *
 * @formula \rho = \frac{p\,M}{R\,T}
 * @param gas                     composition
 * @param pressure     p  pressure     [Pa abs]  > 0
 * @param temperature  T  temperature  [K]       > 0
 * @returns density [kg/m^3]
 * @validity low pressures; see `gasProperty`
 * @source ideal-gas law; R exact, SI Brochure, 9th ed.
 * @check ISO 2533 dry air, 101325 Pa, 288.15 K -> 1.225
 */
export function idealDensity(gas: GasModel, pressure: number, temperature: number): number {
  return (pressure * molarMass(gas)) / (GAS_CONSTANT * temperature);
}

/**
 * Isobaric heat capacity of an ideal gas.
 *
 * @formula c_p = \frac{1}{M}\sum_i x_i\,c_{p,i}(T)
 * @param gas                     composition
 * @param temperature  T  temperature  [K]  200 to 600; outside, the value at the nearer end is returned
 * @returns heat capacity per mass [J/(kg K)]
 * @validity 200 to 600 K
 * @source coefficients as `core/gas/data/components.ts` says
 * @check nitrogen, 300 K -> 1039.7 (29.126 J/(mol K) over 28.01348 g/mol)
 */
export function idealHeatCapacityCp(gas: GasModel, temperature: number): number {
  return molarHeatCapacityCp(gas, temperature) / molarMass(gas);
}

/**
 * Isochoric heat capacity of an ideal gas.
 *
 * @formula c_v = c_p - \frac{R}{M}
 * @param gas                     composition
 * @param temperature  T  temperature  [K]  as `idealHeatCapacityCp`
 * @returns heat capacity per mass [J/(kg K)]
 * @validity 200 to 600 K
 * @source Mayer's relation
 * @check argon -> 312.2 (3/2 R over 39.948 g/mol)
 */
export function idealHeatCapacityCv(gas: GasModel, temperature: number): number {
  return (molarHeatCapacityCp(gas, temperature) - GAS_CONSTANT) / molarMass(gas);
}

/**
 * Isentropic exponent of an ideal gas.
 *
 * @formula \kappa = \frac{c_p}{c_v}
 * @param gas                     composition
 * @param temperature  T  temperature  [K]  as `idealHeatCapacityCp`
 * @returns exponent [-]
 * @validity 200 to 600 K
 * @source definition
 * @check argon -> 5/3
 */
export function idealIsentropicExponent(gas: GasModel, temperature: number): number {
  const heatCapacity = molarHeatCapacityCp(gas, temperature);
  return heatCapacity / (heatCapacity - GAS_CONSTANT);
}

/**
 * Speed of sound in an ideal gas.
 *
 * @formula c = \sqrt{\frac{\kappa\,R\,T}{M}}
 * @param gas                     composition
 * @param temperature  T  temperature  [K]  as `idealHeatCapacityCp`
 * @returns speed [m/s]
 * @validity 200 to 600 K; frequencies low enough for the molecules to follow (no relaxation)
 * @source Kinsler, Frey, Coppens, Sanders, Fundamentals of Acoustics, 4th ed. (2000), section 5.6
 * @check ISO 2533 dry air, 288.15 K -> 340.3
 */
export function idealSpeedOfSound(gas: GasModel, temperature: number): number {
  return Math.sqrt((idealIsentropicExponent(gas, temperature) * GAS_CONSTANT * temperature) / molarMass(gas));
}

/** J/(mol K). The polynomials are of the fifth degree and run away outside their range, so they are held at its ends. */
function molarHeatCapacityCp(gas: GasModel, temperature: number): number {
  const held = Math.min(Math.max(temperature, HEAT_CAPACITY_RANGE.from), HEAT_CAPACITY_RANGE.to) / 1000;
  let sum = 0;
  for (const [id, fraction] of gas.moleFractions) {
    const { heatCapacity } = componentById(id);
    sum += fraction * heatCapacity.reduceRight((value, coefficient) => value * held + coefficient, 0);
  }
  return sum;
}
