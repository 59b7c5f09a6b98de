import type { Site } from './site.ts';
import { GAS_CONSTANT } from '../numeric/gas-constant.ts';
import { power } from '../numeric/math.ts';
import type { Unit } from './unit.ts';

/**
 * SI value of a number in a unit. A gauge pressure needs the atmosphere, which the caller must have checked.
 *
 * @param number in `unit`
 * @param unit   of the table or compound
 * @param site   what the sheet states of its site; only units that rest on it use it
 * @returns SI value: absolute Pa for pressure levels, K for temperature levels
 */
export function toSi(number: number, unit: Unit, site: Site): number {
  return number * unit.factor * amountPerVolume(unit, site) + unit.shift + gaugeShift(unit, site);
}

/** The number that a SI value has in a unit: the inverse of {@link toSi}. */
export function fromSi(si: number, unit: Unit, site: Site): number {
  return (si - unit.shift - gaugeShift(unit, site)) / (unit.factor * amountPerVolume(unit, site));
}

function gaugeShift(unit: Unit, { atmosphere }: Site): number {
  if (!unit.gauge) return 0;
  if (atmosphere === undefined) throw new Error(`no atmosphere for the gauge unit ${unit.text}`);
  return atmosphere;
}

/** Amount of an ideal gas in a volume at the unit's reference state, p/(R T) in mol/m³, to the unit's power of it. */
function amountPerVolume({ reference, text }: Unit, site: Site): number {
  if (reference === undefined) return 1;
  const state = site[reference.state];
  if (state === undefined) throw new Error(`no ${reference.state} state for the unit ${text}`);
  return power(state.pressure / (GAS_CONSTANT * state.temperature), reference.power);
}
