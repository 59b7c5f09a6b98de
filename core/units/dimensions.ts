import type { Dimension, QuantityType } from './dimension.ts';

export const NUMBER: Dimension = [0, 0, 0, 0, 0];
export const LENGTH: Dimension = [1, 0, 0, 0, 0];
export const MASS: Dimension = [0, 1, 0, 0, 0];
export const TIME: Dimension = [0, 0, 1, 0, 0];
export const TEMPERATURE: Dimension = [0, 0, 0, 1, 0];
export const AMOUNT: Dimension = [0, 0, 0, 0, 1];
export const AREA: Dimension = [2, 0, 0, 0, 0];
export const VOLUME: Dimension = [3, 0, 0, 0, 0];
export const FREQUENCY: Dimension = [0, 0, -1, 0, 0];
export const SPEED: Dimension = [1, 0, -1, 0, 0];
export const ACCELERATION: Dimension = [1, 0, -2, 0, 0];
export const FORCE: Dimension = [1, 1, -2, 0, 0];
export const PRESSURE: Dimension = [-1, 1, -2, 0, 0];
export const ENERGY: Dimension = [2, 1, -2, 0, 0];
export const POWER: Dimension = [2, 1, -3, 0, 0];
export const DENSITY: Dimension = [-3, 1, 0, 0, 0];
export const DYNAMIC_VISCOSITY: Dimension = [-1, 1, -1, 0, 0];
export const KINEMATIC_VISCOSITY: Dimension = [2, 0, -1, 0, 0];
export const MASS_FLOW: Dimension = [0, 1, -1, 0, 0];
export const VOLUME_FLOW: Dimension = [3, 0, -1, 0, 0];
export const MOLAR_MASS: Dimension = [0, 1, 0, 0, -1];
export const SPECIFIC_ENERGY: Dimension = [2, 0, -2, 0, 0];
export const SPECIFIC_HEAT: Dimension = [2, 0, -2, -1, 0];
export const MOLAR_HEAT: Dimension = [2, 1, -2, -1, -1];
export const MOLAR_ENERGY: Dimension = [2, 1, -2, 0, -1];
export const STIFFNESS: Dimension = [0, 1, -2, 0, 0];
export const MOMENT_OF_INERTIA: Dimension = [2, 1, 0, 0, 0];
export const UNBALANCE: Dimension = [1, 1, 0, 0, 0];
export const SECOND_MOMENT_OF_AREA: Dimension = [4, 0, 0, 0, 0];
export const THERMAL_CONDUCTIVITY: Dimension = [1, 1, -3, -1, 0];
export const JOULE_THOMSON: Dimension = [1, -1, 2, 1, 0];
export const HEAT_CAPACITY: Dimension = [2, 1, -2, -1, 0];
export const MOLAR_FLOW: Dimension = [0, 0, -1, 0, 1];

/** Names under which messages and reports speak of a dimension. Kinds of pressure and temperature add their own word. */
const NAMES: readonly (readonly [Dimension, string])[] = [
  [NUMBER, 'number'],
  [LENGTH, 'length'],
  [MASS, 'mass'],
  [TIME, 'time'],
  [TEMPERATURE, 'temperature'],
  [AMOUNT, 'amount of substance'],
  [AREA, 'area'],
  [VOLUME, 'volume'],
  [FREQUENCY, 'frequency'],
  [SPEED, 'speed'],
  [ACCELERATION, 'acceleration'],
  [FORCE, 'force'],
  [PRESSURE, 'pressure'],
  [ENERGY, 'energy or moment'],
  [POWER, 'power'],
  [DENSITY, 'density'],
  [DYNAMIC_VISCOSITY, 'dynamic viscosity'],
  [KINEMATIC_VISCOSITY, 'kinematic viscosity'],
  [MASS_FLOW, 'mass flow'],
  [VOLUME_FLOW, 'volume flow'],
  [MOLAR_MASS, 'molar mass'],
  [SPECIFIC_ENERGY, 'specific energy'],
  [SPECIFIC_HEAT, 'specific heat capacity'],
  [MOLAR_HEAT, 'molar heat capacity'],
  [MOLAR_ENERGY, 'molar energy'],
  [STIFFNESS, 'stiffness'],
  [MOMENT_OF_INERTIA, 'moment of inertia'],
  [UNBALANCE, 'unbalance'],
  [SECOND_MOMENT_OF_AREA, 'second moment of area'],
  [THERMAL_CONDUCTIVITY, 'thermal conductivity'],
  [JOULE_THOMSON, 'temperature per pressure'],
  [HEAT_CAPACITY, 'heat capacity'],
  [MOLAR_FLOW, 'molar flow'],
];

const BASE_SYMBOLS = ['m', 'kg', 's', 'K', 'mol'] as const;

/** Exponents come out of sums of fractions such as 1/3, so they are compared within this. */
const EXPONENT_TOLERANCE = 1e-9;

/** Whether two dimensions have the same exponents, within the rounding of fractions. */
export function sameDimension(a: Dimension, b: Dimension): boolean {
  return a.every((exponent, i) => Math.abs(exponent - (b[i] ?? 0)) < EXPONENT_TOLERANCE);
}

/** Whether a dimension is that of a plain number. */
export function isNumber(dimension: Dimension): boolean {
  return sameDimension(dimension, NUMBER);
}

/** Dimension of a product. */
export function multiplyDimensions(a: Dimension, b: Dimension): Dimension {
  return [a[0] + b[0], a[1] + b[1], a[2] + b[2], a[3] + b[3], a[4] + b[4]];
}

/** Dimension of a quotient. */
export function divideDimensions(a: Dimension, b: Dimension): Dimension {
  return [a[0] - b[0], a[1] - b[1], a[2] - b[2], a[3] - b[3], a[4] - b[4]];
}

/** Dimension of a power; `n` may be a fraction, as in a root. */
export function powerDimension(a: Dimension, n: number): Dimension {
  return [a[0] * n, a[1] * n, a[2] * n, a[3] * n, a[4] * n];
}

/** Name of a dimension, or its SI base units where it has none: `m^2·kg/s`. */
export function describeDimension(dimension: Dimension): string {
  return NAMES.find(([named]) => sameDimension(named, dimension))?.[1] ?? inBaseUnits(dimension);
}

/** What a quantity is, in words: `force`, `pressure level`, `pressure difference`, `angular frequency`, `percentage`. */
export function describeType(type: QuantityType): string {
  const bare = describeBare(type);
  return type.amplitude === undefined ? bare : `${bare}, ${type.amplitude}`;
}

function describeBare({ dimension, kind }: QuantityType): string {
  const name = describeDimension(dimension);
  switch (kind) {
    case 'level':
    case 'difference':
      return `${name} ${kind}`;
    case 'percent':
      return 'percentage';
    case 'radians':
      return isNumber(dimension) ? 'angle' : 'angular frequency';
    case 'cycles':
      return isNumber(dimension) ? 'number of turns' : name;
    case 'root':
      return 'rate out of a square root';
    case 'plain':
    case 'open':
      return name;
  }
}

function inBaseUnits(dimension: Dimension): string {
  const part = (sign: 1 | -1): string =>
    dimension
      .flatMap((exponent, i) =>
        exponent * sign > EXPONENT_TOLERANCE ? [power(BASE_SYMBOLS[i] ?? '', exponent * sign)] : [],
      )
      .join('·');
  const [above, below] = [part(1), part(-1)];
  if (below === '') return above;
  return `${above === '' ? '1' : above}/${below.includes('·') ? `(${below})` : below}`;
}

function power(symbol: string, exponent: number): string {
  return Math.abs(exponent - 1) < EXPONENT_TOLERANCE ? symbol : `${symbol}^${Number(exponent.toFixed(4))}`;
}

/** A noun with its article: `a force`, `an angle`. */
export function article(noun: string): string {
  return `${/^[aeiou]/.test(noun) ? 'an' : 'a'} ${noun}`;
}
