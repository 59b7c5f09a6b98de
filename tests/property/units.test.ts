import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { fromSi, toSi } from '../../core/units/convert.ts';
import type { Dimension, Kind, QuantityType } from '../../core/units/dimension.ts';
import { PRESSURE, sameDimension, TEMPERATURE } from '../../core/units/dimensions.ts';
import { displayUnit, inSystem } from '../../core/units/display.ts';
import { parseQuantity } from '../../core/units/parse-quantity.ts';
import { parseUnit } from '../../core/units/parse-unit.ts';
import { ALL_UNITS } from '../../core/units/table.ts';
import { addTypes, compareTypes, divideTypes, multiplyTypes, subtractTypes } from '../../core/units/type-algebra.ts';
import type { TypeResult } from '../../core/units/type-faults.ts';
import type { Unit } from '../../core/units/unit.ts';

const ATMOSPHERE = 95_837.122_6;
const SITE = {
  atmosphere: ATMOSPHERE,
  normal: { pressure: 101_325, temperature: 273.15 },
  standard: { pressure: 101_560, temperature: 288.706 },
};
const unit = fc.constantFrom(...ALL_UNITS);
const factor = fc.constantFrom(
  ...ALL_UNITS.filter(
    ({ gauge, kind, text, reference }) => !gauge && kind === 'plain' && text !== '1' && reference === undefined,
  ),
);
const exponent = fc.constantFrom(1, 2, 3, -1, -2);
const number = fc.double({ min: -1e6, max: 1e6, noNaN: true });

const compound = fc
  .array(fc.tuple(factor, exponent), { minLength: 1, maxLength: 2 })
  .map((factors) => factors.map(([{ text }, power]) => `${text}^${power}`).join('*'));

function parsed(text: string): Unit {
  const found = parseUnit(text);
  if (found === null) throw new Error(`not a unit: ${text}`);
  return found;
}

describe('units', () => {
  it('convert to SI and back', () => {
    fc.assert(
      fc.property(unit, number, (of, value) => {
        const back = fromSi(toSi(value, of, SITE), of, SITE);
        const scale = Math.abs(value) + (Math.abs(of.shift) + ATMOSPHERE) / of.factor;
        expect(Math.abs(back - value)).toBeLessThanOrEqual(1e-12 * scale);
      }),
    );
  });

  it('are read back from their own text', () => {
    for (const of of ALL_UNITS) expect(parseUnit(of.text)).toEqual(of);
    fc.assert(
      fc.property(compound, (text) => {
        const once = parsed(text);
        const twice = parsed(once.text);
        expect(twice).toEqual(once);
      }),
    );
  });

  it('multiply in products as their factors do', () => {
    fc.assert(
      fc.property(compound, compound, (a, b) => {
        const [left, right, product] = [parsed(a), parsed(b), parsed(`(${a})*(${b})`)];
        expect(Math.abs(product.factor / (left.factor * right.factor) - 1)).toBeLessThan(1e-12);
        const quotient = parsed(`(${a})/(${a})`);
        expect(Math.abs(quotient.factor - 1)).toBeLessThan(1e-12);
      }),
    );
  });

  it('stay what they measure when they change system', () => {
    for (const of of ALL_UNITS) {
      for (const system of ['us', 'si'] as const) {
        const other = inSystem(of, system);
        expect(sameDimension(other.dimension, of.dimension)).toBe(true);
        expect(other.gauge).toBe(of.gauge);
        expect(other.kind === 'level').toBe(of.kind === 'level');
        expect(['both', system]).toContain(other.system === 'both' ? 'both' : other.system);
      }
    }
  });

  it('are found for a result of any dimension', () => {
    const dimension = fc.tuple(...Array.from({ length: 5 }, () => fc.integer({ min: -3, max: 3 })));
    fc.assert(
      fc.property(dimension, fc.constantFrom('us', 'si'), (exponents, system) => {
        const of = displayUnit({ dimension: exponents as unknown as Dimension, kind: 'plain' }, system);
        expect(sameDimension(of.dimension, exponents as unknown as Dimension)).toBe(true);
      }),
    );
  });
});

describe('parseQuantity', () => {
  it('never throws, and places every fault inside the text', () => {
    const piece = fc.constantFrom(
      '905',
      '.',
      '..',
      '-',
      '−',
      '1/2',
      ' ',
      'psig',
      'ft',
      'in',
      '%',
      'e9',
      '1e999',
      'kg/m^3',
      '(',
      '^',
      ',',
      'µm',
      '\u0000',
    );
    fc.assert(
      fc.property(fc.array(piece, { maxLength: 8 }), (pieces) => {
        const text = pieces.join('');
        const { value, diagnostics } = parseQuantity(text, { file: 'f', start: 10, end: 10 + text.length });
        expect((value === undefined) === diagnostics.length > 0).toBe(true);
        for (const { span } of diagnostics) {
          expect(span.start).toBeGreaterThanOrEqual(10);
          expect(span.end).toBeLessThanOrEqual(10 + text.length);
          expect(span.end).toBeGreaterThanOrEqual(span.start);
        }
      }),
      { numRuns: 2000 },
    );
  });
});

describe('the algebra of levels', () => {
  const scale = fc.constantFrom(PRESSURE, TEMPERATURE);
  const of = (dimension: Dimension, kind: Kind): { type: QuantityType } => ({ type: { dimension, kind } });
  const kindOf = (result: TypeResult): string => ('type' in result ? result.type.kind : result.fault.code);

  it('level − level is a difference, level ± difference a level, level + level a fault', () => {
    fc.assert(
      fc.property(scale, (dimension) => {
        const [level, difference] = [of(dimension, 'level'), of(dimension, 'difference')];
        expect(kindOf(subtractTypes(level, level))).toBe('difference');
        expect(kindOf(addTypes(level, difference))).toBe('level');
        expect(kindOf(addTypes(difference, level))).toBe('level');
        expect(kindOf(subtractTypes(level, difference))).toBe('level');
        expect(kindOf(addTypes(level, level))).toBe('LEVEL_SUM');
        expect(kindOf(subtractTypes(difference, level))).toBe('LEVEL_SUM');
        expect(kindOf(compareTypes(level, difference))).toBe('UNIT_MISMATCH');
      }),
    );
  });

  const types = fc.constantFrom(...ALL_UNITS).map(({ dimension, kind }) => ({ type: { dimension, kind } }));

  it('addition commutes in its type, and so does multiplication', () => {
    fc.assert(
      fc.property(types, types, (a, b) => {
        expect(kindOf(addTypes(a, b))).toBe(kindOf(addTypes(b, a)));
        expect(multiplyTypes(a, b)).toEqual(multiplyTypes(b, a));
      }),
    );
  });

  it('division undoes multiplication in its dimension', () => {
    fc.assert(
      fc.property(types, types, (a, b) => {
        const product = multiplyTypes(a, b);
        if (!('type' in product)) return;
        const quotient = divideTypes(product, b);
        if ('type' in quotient) expect(sameDimension(quotient.type.dimension, a.type.dimension)).toBe(true);
      }),
    );
  });
});
