import type { Dimension, Kind } from '../units/dimension.ts';
import { AREA, FREQUENCY, LENGTH, NUMBER, PRESSURE, SPEED, TEMPERATURE, VOLUME } from '../units/dimensions.ts';
import type { Parameter } from './function.ts';

interface Head {
  readonly name: string;
  readonly symbol: string;
  readonly summary: string;
}

/** A quantity that has a meaning above zero only. */
function positive(head: Head, dimension: Dimension, kind: Kind, unit: string): Parameter {
  return { ...head, kind: { takes: 'quantity', dimension, kind, unit }, range: { above: 0 } };
}

export const SOUND_SPEED = positive(
  { name: 'c', symbol: 'c', summary: 'speed of sound in the gas' },
  SPEED,
  'plain',
  'm/s',
);

export const FREQUENCY_OF_SOUND = positive({ name: 'f', symbol: 'f', summary: 'frequency' }, FREQUENCY, 'cycles', 'Hz');

export function lengthParameter(name: string, symbol: string, summary: string, unit = 'm'): Parameter {
  return positive({ name, symbol, summary }, LENGTH, 'plain', unit);
}

export function areaParameter(name: string, symbol: string, summary: string): Parameter {
  return positive({ name, symbol, summary }, AREA, 'plain', 'm^2');
}

export function volumeParameter(name: string, symbol: string, summary: string): Parameter {
  return positive({ name, symbol, summary }, VOLUME, 'plain', 'm^3');
}

export function pressureParameter(name: string, symbol: string, summary: string): Parameter {
  return positive({ name, symbol, summary }, PRESSURE, 'level', 'bara');
}

export function temperatureParameter(name: string, symbol: string, summary: string): Parameter {
  return positive({ name, symbol, summary }, TEMPERATURE, 'level', 'K');
}

/** Multiple of the lowest natural frequency. */
export function orderParameter(summary: string): Parameter {
  return { name: 'n', symbol: 'n', summary, kind: { takes: 'number', integer: true }, range: { from: 1 } };
}

export const PRESSURE_RATIO: Parameter = {
  name: 'ratio',
  symbol: 'R',
  summary: 'stage pressure ratio, absolute over absolute',
  kind: { takes: 'number' },
  range: { from: 1 },
};

export const GAS: Parameter = {
  name: 'gas',
  symbol: '\\mathrm{gas}',
  summary: 'name of a gas of the sheet',
  kind: { takes: 'gas' },
};

export const PERCENT = { dimension: NUMBER, kind: 'percent', unit: '%' } as const;
