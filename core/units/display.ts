import type { Dimension, QuantityType } from './dimension.ts';
import * as D from './dimensions.ts';
import { bareUnit, parseUnit, unitOfAmplitude } from './parse-unit.ts';
import { typeOfUnit, type Unit } from './unit.ts';

type System = 'us' | 'si';

/** Units in which results read, where the sheet asks for no other. */
const DEFAULTS: readonly (readonly [Dimension, { readonly us: string; readonly si: string }])[] = [
  [D.NUMBER, { us: '1', si: '1' }],
  [D.LENGTH, { us: 'in', si: 'mm' }],
  [D.AREA, { us: 'in^2', si: 'mm^2' }],
  [D.VOLUME, { us: 'ft^3', si: 'm^3' }],
  [D.SECOND_MOMENT_OF_AREA, { us: 'in^4', si: 'mm^4' }],
  [D.MASS, { us: 'lbm', si: 'kg' }],
  [D.TIME, { us: 's', si: 's' }],
  [D.FREQUENCY, { us: '1/s', si: '1/s' }],
  [D.SPEED, { us: 'ft/s', si: 'm/s' }],
  [D.ACCELERATION, { us: 'ft/s^2', si: 'm/s^2' }],
  [D.FORCE, { us: 'lbf', si: 'N' }],
  [D.ENERGY, { us: 'ft-lbf', si: 'J' }],
  [D.POWER, { us: 'hp', si: 'kW' }],
  [D.DENSITY, { us: 'lbm/ft^3', si: 'kg/m^3' }],
  [D.DYNAMIC_VISCOSITY, { us: 'cP', si: 'cP' }],
  [D.KINEMATIC_VISCOSITY, { us: 'ft^2/s', si: 'm^2/s' }],
  [D.MASS_FLOW, { us: 'lbm/s', si: 'kg/s' }],
  [D.VOLUME_FLOW, { us: 'ft^3/s', si: 'm^3/s' }],
  [D.AMOUNT, { us: 'lbmol', si: 'kmol' }],
  [D.MOLAR_MASS, { us: 'lbm/lbmol', si: 'kg/kmol' }],
  [D.SPECIFIC_ENERGY, { us: 'BTU/lbm', si: 'kJ/kg' }],
  [D.SPECIFIC_HEAT, { us: 'BTU/(lbm*degF)', si: 'kJ/(kg*K)' }],
  [D.MOLAR_HEAT, { us: 'BTU/(lbmol*degF)', si: 'J/(mol*K)' }],
  [D.MOLAR_ENERGY, { us: 'BTU/lbmol', si: 'kJ/kmol' }],
  [D.STIFFNESS, { us: 'lbf/in', si: 'N/mm' }],
  [D.MOMENT_OF_INERTIA, { us: 'lbm*ft^2', si: 'kg*m^2' }],
  [D.UNBALANCE, { us: 'lbm*in', si: 'kg*m' }],
  [D.THERMAL_CONDUCTIVITY, { us: 'BTU/(h*ft*degF)', si: 'W/(m*K)' }],
  [D.JOULE_THOMSON, { us: 'degF/psi', si: 'K/bar' }],
  [D.MOLAR_FLOW, { us: 'lbmol/h', si: 'kmol/h' }],
  [D.HEAT_CAPACITY, { us: 'BTU/degF', si: 'J/K' }],
];

/** Units with a counterpart in the other system, by pairs. */
const COUNTERPARTS: readonly (readonly [us: string, si: string])[] = [
  ['psig', 'barg'],
  ['psia', 'bara'],
  ['psi', 'bar'],
  ['ksi', 'MPa'],
  ['inHg', 'mbar'],
  ['inH2O', 'mbar'],
  ['degF', 'degC'],
  ['degR', 'K'],
  ['delta_degF', 'delta_degC'],
  ['delta_degR', 'delta_K'],
  ['in', 'mm'],
  ['ft', 'm'],
  ['mil', 'um'],
  ['microinch', 'um'],
  ['mile', 'km'],
  ['in^2', 'mm^2'],
  ['ft^2', 'm^2'],
  ['in^3', 'cm^3'],
  ['ft^3', 'm^3'],
  ['gal', 'L'],
  ['lbf', 'N'],
  ['kip', 'kN'],
  ['lbm', 'kg'],
  ['hp', 'kW'],
  ['BTU', 'kJ'],
  ['ft-lbf', 'J'],
  ['in/s', 'mm/s'],
  ['ft/s', 'm/s'],
  ['lbf/in', 'N/mm'],
  ['acfm', 'm^3/h'],
  ['gpm', 'm^3/h'],
  ['SCF', 'Sm3'],
  ['MMSCFD', 'Sm3/h'],
  ['SCFM', 'Sm3/h'],
  ['lbm/h', 'kg/h'],
  ['lb/min', 'kg/min'],
];

/** The unit in which a result of a type is shown by default. */
export function displayUnit(type: QuantityType, system: System): Unit {
  const unit = displayBare(type, system);
  return type.amplitude === undefined ? unit : unitOfAmplitude(unit, type.amplitude);
}

/** Units that read better than the default where the largest value is below, or from there on above, a magnitude in SI. */
const BY_MAGNITUDE: readonly {
  readonly dimension: Dimension;
  readonly system: System;
  readonly below?: number;
  readonly from?: number;
  readonly unit: string;
}[] = [
  { dimension: D.LENGTH, system: 'us', below: 0.02 * 0.0254, unit: 'mil' },
  { dimension: D.LENGTH, system: 'us', from: 20 * 0.3048, unit: 'ft' },
  { dimension: D.LENGTH, system: 'si', below: 1e-4, unit: 'um' },
  { dimension: D.LENGTH, system: 'si', from: 10, unit: 'm' },
  { dimension: D.FORCE, system: 'si', from: 1e4, unit: 'kN' },
  { dimension: D.ENERGY, system: 'si', from: 1e5, unit: 'kJ' },
  { dimension: D.POWER, system: 'si', below: 1e3, unit: 'W' },
  { dimension: D.POWER, system: 'si', from: 1e7, unit: 'MW' },
];

/**
 * The unit in which a result is shown where nothing else is asked for: by its type, and by how large it is.
 *
 * @param magnitude SI; the largest of several values, which all are shown in one unit
 */
export function displayUnitFor(type: QuantityType, system: System, magnitude: number): Unit {
  const row = BY_MAGNITUDE.find(
    (each) =>
      each.system === system &&
      D.sameDimension(each.dimension, type.dimension) &&
      magnitude > 0 &&
      magnitude < (each.below ?? Number.POSITIVE_INFINITY) &&
      magnitude >= (each.from ?? 0),
  );
  if (row === undefined) return displayUnit(type, system);
  return type.amplitude === undefined ? known(row.unit) : unitOfAmplitude(known(row.unit), type.amplitude);
}

function displayBare(type: QuantityType, system: System): Unit {
  const special = specialUnit(type, system);
  if (special !== undefined) return known(special);
  const row = DEFAULTS.find(([dimension]) => D.sameDimension(dimension, type.dimension));
  return row === undefined ? baseUnit(type.dimension) : known(row[1][system]);
}

/** Levels, differences, percentages and turning rates have units of their own kind. */
function specialUnit({ dimension, kind }: QuantityType, system: System): string | undefined {
  const pick = (us: string, si: string): string => (system === 'us' ? us : si);
  if (kind === 'percent') return '%';
  if (kind === 'cycles')
    return D.isNumber(dimension) ? 'rev' : D.sameDimension(dimension, D.FREQUENCY) ? 'Hz' : undefined;
  if (kind === 'radians')
    return D.isNumber(dimension) ? 'rad' : D.sameDimension(dimension, D.FREQUENCY) ? 'rad/s' : undefined;
  if (D.sameDimension(dimension, D.PRESSURE)) return kind === 'level' ? pick('psia', 'bara') : pick('psi', 'bar');
  if (!D.sameDimension(dimension, D.TEMPERATURE)) return undefined;
  if (kind === 'level') return pick('degF', 'degC');
  return kind === 'open' ? pick('degR', 'K') : pick('delta_degF', 'delta_degC');
}

/** The unit itself where it belongs to the system (or to both), else its counterpart. */
export function inSystem(unit: Unit, system: System): Unit {
  if (unit.amplitude !== undefined) return unitOfAmplitude(inSystem(bareUnit(unit), system), unit.amplitude);
  if (unit.system === 'both' || unit.system === system) return unit;
  const [from, to] = system === 'si' ? ([0, 1] as const) : ([1, 0] as const);
  const pair = COUNTERPARTS.find((names) => names[from] === unit.text);
  if (pair !== undefined) return known(pair[to]);
  if (unit.gauge) return known(system === 'us' ? 'psig' : 'barg');
  return displayUnit(typeOfUnit(unit), system);
}

const ABSOLUTE: ReadonlyMap<string, string> = new Map([
  ['psig', 'psia'],
  ['barg', 'bara'],
  ['kPag', 'kPaa'],
  ['MPag', 'MPaa'],
]);

/** The absolute counterpart of a gauge unit; any other unit as it is. In a product a gauge reading would mislead. */
export function absoluteUnit(unit: Unit): Unit {
  const absolute = ABSOLUTE.get(unit.text);
  return absolute === undefined ? unit : known(absolute);
}

function known(text: string): Unit {
  const unit = parseUnit(text);
  if (unit === null) throw new Error(`the display table names an unknown unit: ${text}`);
  return unit;
}

const BASE = ['m', 'kg', 's', 'K', 'mol'] as const;

/** A dimension without a row is shown in SI base units. */
function baseUnit(dimension: Dimension): Unit {
  const powers = dimension.flatMap((exponent, i) =>
    exponent === 0 ? [] : [`${BASE[i] ?? ''}^${Number(exponent.toFixed(6))}`],
  );
  return known(powers.join('*'));
}
