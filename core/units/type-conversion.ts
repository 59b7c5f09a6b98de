import type { Kind, QuantityType } from './dimension.ts';
import {
  article,
  describeDimension,
  describeType,
  FREQUENCY,
  isNumber,
  PRESSURE,
  sameDimension,
} from './dimensions.ts';
import { amplitudesDiffer, withAmplitude } from './amplitude.ts';
import type { TypeFault } from './type-faults.ts';
import type { Unit } from './unit.ts';

/** A type seen as another one, and the factor that its SI number takes on the way (1, 2π or 1/2π). */
export type ConversionResult = { readonly type: QuantityType; readonly factor: number } | { readonly fault: TypeFault };

/**
 * Type of `from to unit`. The dimension must be the unit's; a level stays a level and a difference a difference; this is
 * the one place, with {@link acceptType}, where cycles become radians.
 */
export function convertType(from: QuantityType, unit: Unit): ConversionResult {
  if (from.amplitude !== undefined && unit.amplitude !== undefined && from.amplitude !== unit.amplitude) {
    const { code, hints } = amplitudesDiffer(from.amplitude, unit.amplitude, '');
    return fault(code, `${article(describeType(from))} cannot be shown in \`${unit.text}\``, hints);
  }
  const converted = convertBare(from, unit);
  if ('fault' in converted) return converted;
  // A unit that names an amplitude states it; one that names none leaves it as it is.
  return { ...converted, type: withAmplitude(converted.type, unit.amplitude ?? from.amplitude) };
}

function convertBare(from: QuantityType, unit: Unit): ConversionResult {
  const wanted: QuantityType = { dimension: unit.dimension, kind: unit.kind };
  if (!sameDimension(from.dimension, unit.dimension)) {
    return {
      fault: {
        code: 'UNIT_MISMATCH',
        message: `${article(describeType(from))} cannot be shown in \`${unit.text}\`, a unit of ${describeDimension(unit.dimension)}`,
        hints: [],
      },
    };
  }
  const turning = convertTurning(from, wanted);
  if (turning !== null) return turning;
  if (isNumber(from.dimension)) return same({ dimension: from.dimension, kind: wanted.kind });
  return convertLevel(from, unit);
}

function convertLevel(from: QuantityType, unit: Unit): ConversionResult {
  const { dimension } = from;
  const name = describeDimension(dimension);
  if (unit.kind === 'level') {
    if (from.kind === 'level' || from.kind === 'open') return same({ dimension, kind: 'level' });
    const zero = sameDimension(dimension, PRESSURE) ? '0 psia' : '0 K';
    return fault('LEVEL_WANTED', `a ${name} difference cannot be shown in \`${unit.text}\`, a unit of ${name} levels`, [
      `show it in a unit of differences (${differenceUnits(dimension)}), or add it to a level: \`${zero} + …\` if it is absolute`,
    ]);
  }
  if (unit.kind === 'difference' && from.kind === 'level') {
    return fault(
      'DIFFERENCE_WANTED',
      `a ${name} level cannot be shown in \`${unit.text}\`, a unit of ${name} differences`,
      [
        `show it in a unit of levels (${levelUnits(dimension)}), or subtract another level first; a share of a level is a difference when it is written in percent (\`2.4 %\`)`,
      ],
    );
  }
  return same({ dimension, kind: unit.kind === 'open' ? from.kind : unit.kind });
}

/**
 * Fits an argument to the type that a function's parameter wants.
 *
 * @param given  type of the argument
 * @param wanted type of the parameter; `level` wants a point on the scale, `cycles` a rate in turns
 */
export function acceptType(given: QuantityType, wanted: QuantityType): ConversionResult {
  if (!sameDimension(given.dimension, wanted.dimension)) {
    return fault(
      'UNIT_MISMATCH',
      `${article(describeType(wanted))} is wanted, and ${article(describeType(given))} is given`,
      [],
    );
  }
  const turning = convertTurning(given, wanted);
  if (turning !== null) return turning;
  if (wanted.kind === 'level' && given.kind === 'difference') return levelWanted(given);
  if (wanted.kind === 'difference' && given.kind === 'level') return differenceWanted(given);
  return same(wanted);
}

function levelWanted({ dimension }: QuantityType): ConversionResult {
  return sameDimension(dimension, PRESSURE)
    ? fault('LEVEL_WANTED', 'an absolute pressure is wanted, and a pressure difference is given', [
        'write psia (bara, kPaa) for absolute or psig (barg, kPag) for gauge; a computed pressure that is absolute: `0 psia + …`',
      ])
    : fault('LEVEL_WANTED', 'a temperature level is wanted, and a temperature difference is given', [
        'write degF, degC, K or degR; a computed temperature that is absolute: `0 K + …`',
      ]);
}

function differenceWanted({ dimension }: QuantityType): ConversionResult {
  const name = describeDimension(dimension);
  return fault('DIFFERENCE_WANTED', `a ${name} difference is wanted, and a ${name} level is given`, [
    `subtract another level, or write a unit of differences (${differenceUnits(dimension)})`,
  ]);
}

/** Rates and angles: null where neither side turns. */
function convertTurning(from: QuantityType, wanted: QuantityType): ConversionResult | null {
  const kinds: readonly Kind[] = [from.kind, wanted.kind];
  if (!kinds.some((kind) => kind === 'cycles' || kind === 'radians' || kind === 'root')) return null;
  if (from.kind === wanted.kind) return same(wanted);
  if (from.kind === 'cycles' && wanted.kind === 'radians') return { type: wanted, factor: 2 * Math.PI };
  if (from.kind === 'radians' && wanted.kind === 'cycles') return { type: wanted, factor: 1 / (2 * Math.PI) };
  if (from.kind === 'root') return rootFault(wanted);
  if (wanted.kind === 'radians' && sameDimension(wanted.dimension, FREQUENCY)) return plainRateFault();
  return same(wanted);
}

function rootFault(wanted: QuantityType): ConversionResult {
  if (wanted.kind === 'plain') return same(wanted);
  return fault('CYCLES_AND_RADIANS', 'this rate comes out of a square root, and could count radians or cycles', [
    'the root of stiffness over mass counts radians: write sqrt(k/m)/(2*pi) to Hz, or sqrt(k/m)*(1 rad) to rad/s',
  ]);
}

function plainRateFault(): ConversionResult {
  return fault('CYCLES_AND_RADIANS', 'a rate in 1/s does not say that it counts radians', [
    'write `to Hz` if it counts cycles, or multiply a frequency by 2*pi',
  ]);
}

function differenceUnits(dimension: QuantityType['dimension']): string {
  return sameDimension(dimension, PRESSURE) ? 'psi, bar, kPa' : 'delta_degF, delta_degC';
}

function levelUnits(dimension: QuantityType['dimension']): string {
  return sameDimension(dimension, PRESSURE) ? 'psia, psig, bara, barg' : 'degF, degC, K';
}

function same(type: QuantityType): ConversionResult {
  return { type, factor: 1 };
}

function fault(code: TypeFault['code'], message: string, hints: readonly string[]): ConversionResult {
  return { fault: { code, message, hints } };
}
