import { componentById } from './find-component.ts';
import type { GasModel } from './gas-model.ts';

/**
 * Molar mass of a gas.
 *
 * @formula M = \sum_i x_i M_i
 * @param gas  its mole fractions
 * @returns molar mass [kg/mol]
 * @validity any composition
 * @source definition; molar masses as `core/gas/data/components.ts` says
 * @check methane -> 0.0160428
 */
export function molarMass(gas: GasModel): number {
  let grams = 0;
  for (const [id, fraction] of gas.moleFractions) grams += fraction * componentById(id).molarMass;
  return grams / 1000;
}
