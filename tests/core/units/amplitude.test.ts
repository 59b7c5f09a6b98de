import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { amplitudeFactor } from '../../../core/units/amplitude.ts';
import type { Amplitude, QuantityType } from '../../../core/units/dimension.ts';
import { describeType, FORCE, LENGTH, PRESSURE } from '../../../core/units/dimensions.ts';
import { displayUnit, inSystem } from '../../../core/units/display.ts';
import { parseUnit, suggestUnits } from '../../../core/units/parse-unit.ts';
import {
  addTypes,
  compareTypes,
  divideTypes,
  multiplyTypes,
  powerType,
  subtractTypes,
} from '../../../core/units/type-algebra.ts';
import type { TypeResult } from '../../../core/units/type-faults.ts';
import { convertType } from '../../../core/units/type-conversion.ts';
import { typeOfUnit, type Unit } from '../../../core/units/unit.ts';

const AMPLITUDES: readonly Amplitude[] = ['peak', 'peak to peak', 'rms'];

function unit(text: string): Unit {
  const found = parseUnit(text);
  if (found === null) throw new Error(`not a unit: ${text}`);
  return found;
}

const type = (text: string): QuantityType => typeOfUnit(unit(text));
const shown = (result: TypeResult): string => ('type' in result ? describeType(result.type) : result.fault.code);
const operands = (a: string, b: string) => [{ type: type(a) }, { type: type(b) }] as const;

describe('units of an amplitude', () => {
  it.each([
    ['mil pp', 'length, peak to peak'],
    ['in/s pk', 'speed, peak'],
    ['mm/s rms', 'speed, rms'],
    ['psi pp', 'pressure difference, peak to peak'],
    ['% pp', 'percentage, peak to peak'],
    ['lbf  pp', 'force, peak to peak'],
  ])('%s is a %s', (text, words) => {
    expect(describeType(type(text))).toBe(words);
  });

  it.each(['psig pp', 'degC rms', 'bara pk', 'pp', 'mil pkpk', 'mil pp pp'])('%s is none', (text) => {
    expect(parseUnit(text)).toBeNull();
  });

  it('say what was meant', () => {
    expect(suggestUnits('psig pp')).toEqual(['psi pp']);
    expect(suggestUnits('mill rms')).toContain('mil rms');
  });

  it('keep their word in the other system and by default', () => {
    expect(inSystem(unit('mil pp'), 'si').text).toBe('um pp');
    expect(inSystem(unit('psi pp'), 'si').text).toBe('bar pp');
    expect(displayUnit(type('lbf pp'), 'si').text).toBe('N pp');
  });
});

describe('amplitudes that meet', () => {
  it.each([
    [addTypes(...operands('mil pp', 'mm pp')), 'length, peak to peak'],
    [addTypes(...operands('mil pp', 'mm')), 'length, peak to peak'],
    [addTypes(...operands('mil pp', 'mm rms')), 'AMPLITUDES_DIFFER'],
    [subtractTypes(...operands('psia', 'psi pk')), 'pressure level'],
    [compareTypes(...operands('lbf pk', 'lbf pp')), 'AMPLITUDES_DIFFER'],
    [multiplyTypes(...operands('psi pp', 'in^2')), 'force, peak to peak'],
    [multiplyTypes(...operands('% pp', 'psia')), 'pressure difference, peak to peak'],
    [multiplyTypes(...operands('mm pp', 'mm pk')), 'AMPLITUDES_DIFFER'],
    [multiplyTypes(...operands('mm pp', 'mm pp')), 'area'],
    [divideTypes(...operands('lbf pp', 'in^2')), 'pressure difference, peak to peak'],
    [divideTypes(...operands('lbf pp', 'lbf pp')), 'number'],
    [divideTypes(...operands('in', 'in pk')), 'number'],
    [powerType({ type: type('mm pp') }, 2), 'area'],
    [powerType({ type: type('mm pp') }, 1), 'length, peak to peak'],
  ])('%#', (result, words) => {
    expect(shown(result)).toBe(words);
  });

  it('never mix, whatever the operation and the order', () => {
    const mark = fc.constantFrom(...AMPLITUDES);
    const dimension = fc.constantFrom(LENGTH, FORCE, PRESSURE);
    fc.assert(
      fc.property(mark, mark, dimension, (a, b, of) => {
        const kind = of === PRESSURE ? 'difference' : 'plain';
        const left = { type: { dimension: of, kind, amplitude: a } } as const;
        const right = { type: { dimension: of, kind, amplitude: b } } as const;
        for (const operation of [addTypes, subtractTypes, compareTypes, multiplyTypes, divideTypes]) {
          const [one, other] = [operation(left, right), operation(right, left)];
          expect('fault' in one).toBe(a !== b);
          expect(shown(one).split(',')[1]).toBe(shown(other).split(',')[1]);
        }
      }),
    );
  });
});

describe('showing an amplitude', () => {
  it.each([
    ['mil pp', 'mm', 'length, peak to peak'],
    ['mil', 'mm pp', 'length, peak to peak'],
    ['mil pp', 'mm pp', 'length, peak to peak'],
    ['mil pp', 'mm rms', 'AMPLITUDES_DIFFER'],
  ])('of %s in %s: %s', (from, to, words) => {
    const converted = convertType(type(from), unit(to));
    expect('fault' in converted ? converted.fault.code : describeType(converted.type)).toBe(words);
  });
});

it('turns the amplitudes of a sine into each other: 1 peak is 2 peak to peak and 1/√2 rms', () => {
  expect(amplitudeFactor('peak', 'peak to peak')).toBe(2);
  expect(amplitudeFactor('peak', 'rms')).toBeCloseTo(Math.SQRT1_2, 15);
  expect(amplitudeFactor('rms', 'peak to peak')).toBeCloseTo(2 * Math.SQRT2, 14);
  for (const a of AMPLITUDES)
    for (const b of AMPLITUDES) expect(amplitudeFactor(a, b) * amplitudeFactor(b, a)).toBeCloseTo(1, 15);
});
