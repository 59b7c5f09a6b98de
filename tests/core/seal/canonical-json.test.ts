import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { canonicalJson, isCanonical } from '../../../core/seal/canonical-json.ts';

describe('canonicalJson: vectors of RFC 8785', () => {
  it('section 3.2.2 and 3.2.3: white space, numbers, strings, order', () => {
    const text = String.raw`{
      "numbers": [333333333.33333329, 1E30, 4.50,
                  2e-3, 0.000000000000000000000000001],
      "string": "\u20ac$\u000F\u000aA'\u0042\u0022\u005c\\\"\/",
      "literals": [null, true, false]
    }`;
    const expected = String.raw`{"literals":[null,true,false],"numbers":[333333333.3333333,1e+30,4.5,0.002,1e-27],"string":"€$\u000f\nA'B\"\\\\\"/"}`;
    expect(canonicalJson(JSON.parse(text))).toBe(expected);
  });

  it('section 3.2.3: members in the order of UTF-16 code units', () => {
    const text = String.raw`{
      "\u20ac": "Euro Sign",
      "\r": "Carriage Return",
      "\ufb33": "Hebrew Letter Dalet With Dagesh",
      "1": "One",
      "\ud83d\ude00": "Emoji: Grinning Face",
      "\u0080": "Control",
      "\u00f6": "Latin Small Letter O With Diaeresis"
    }`;
    const order = [...canonicalJson(JSON.parse(text)).matchAll(/:"([^"]+)"/g)].map((match) => match[1]);
    expect(order).toEqual([
      'Carriage Return',
      'One',
      'Control',
      'Latin Small Letter O With Diaeresis',
      'Euro Sign',
      'Emoji: Grinning Face',
      'Hebrew Letter Dalet With Dagesh',
    ]);
  });

  // Appendix B, table of IEEE 754 bit patterns.
  it.each([
    ['0000000000000000', '0'],
    ['8000000000000000', '0'],
    ['0000000000000001', '5e-324'],
    ['8000000000000001', '-5e-324'],
    ['7fefffffffffffff', '1.7976931348623157e+308'],
    ['ffefffffffffffff', '-1.7976931348623157e+308'],
    ['4340000000000000', '9007199254740992'],
    ['c340000000000000', '-9007199254740992'],
    ['4430000000000000', '295147905179352830000'],
    ['44b52d02c7e14af5', '9.999999999999997e+22'],
    ['44b52d02c7e14af6', '1e+23'],
    ['44b52d02c7e14af7', '1.0000000000000001e+23'],
    ['444b1ae4d6e2ef4e', '999999999999999700000'],
    ['444b1ae4d6e2ef4f', '999999999999999900000'],
    ['444b1ae4d6e2ef50', '1e+21'],
    ['3eb0c6f7a0b5ed8c', '9.999999999999997e-7'],
    ['3eb0c6f7a0b5ed8d', '0.000001'],
    ['41b3de4355555553', '333333333.3333332'],
    ['41b3de4355555554', '333333333.33333325'],
    ['41b3de4355555555', '333333333.3333333'],
    ['41b3de4355555556', '333333333.3333334'],
    ['41b3de4355555557', '333333333.33333343'],
    ['becbf647612f3696', '-0.0000033333333333333333'],
    ['43143ff3c1cb0959', '1424953923781206.2'],
  ])('appendix B: %s is %s', (bits, text) => {
    expect(canonicalJson(fromBits(bits))).toBe(text);
  });

  it.each(['7fffffffffffffff', '7ff0000000000000'])('appendix B: %s is refused', (bits) => {
    expect(() => canonicalJson(fromBits(bits))).toThrow(TypeError);
  });
});

describe('canonicalJson: what JSON cannot carry unchanged is refused', () => {
  const circular: unknown[] = [];
  circular.push(circular);
  const decorated = Object.assign([1], { note: 'lost' });

  it.each<[string, unknown]>([
    ['undefined', undefined],
    ['undefined inside', { a: undefined }],
    ['undefined in a list', [undefined]],
    ['a hole', Array(1)],
    ['a list with members', decorated],
    ['a function', () => 1],
    ['a method named toJSON', { toJSON: () => 'other' }],
    ['a symbol', Symbol('s')],
    ['a member named by a symbol', { [Symbol('s')]: 1 }],
    ['a big integer', 1n],
    ['minus infinity', -Infinity],
    ['a date', { at: new Date(0) }],
    ['a map', new Map([['a', 1]])],
    ['a set', new Set([1])],
    ['a typed array', new Uint8Array(2)],
    ['a boxed string', Object('text')],
    ['a class instance', new (class Quantity {})()],
    ['a lone high surrogate', 'a\ud800b'],
    ['a lone low surrogate', '\udc00'],
    ['a lone surrogate in a name', { '\ud83d': 1 }],
    ['a circle', circular],
  ])('%s', (_, value) => {
    expect(() => canonicalJson(value)).toThrow(TypeError);
  });

  it('names the place', () => {
    expect(() => canonicalJson({ a: [1, { b: NaN }] })).toThrow('$.a[1].b is NaN');
  });

  it('ends at a depth instead of exhausting the stack', () => {
    const text = '['.repeat(100_000) + ']'.repeat(100_000);
    expect(() => canonicalJson(JSON.parse(text))).toThrow('nested deeper');
  });
});

describe('canonicalJson: laws', () => {
  it('reads back as the same value, whatever the order of the members', () => {
    fc.assert(
      fc.property(fc.jsonValue(), (value) => {
        const text = canonicalJson(value);
        expect(canonicalJson(JSON.parse(text))).toBe(text);
        expect(canonicalJson(reversed(value))).toBe(text);
        expect(isCanonical(text, JSON.parse(text))).toBe(true);
      }),
    );
  });

  it('takes a member named __proto__ as any other', () => {
    expect(canonicalJson(JSON.parse('{"a":1,"__proto__":{"b":2}}'))).toBe('{"__proto__":{"b":2},"a":1}');
  });

  it.each(['{"a":1 }', '{"b":1,"a":2}', '{"a":1,"a":1}', '1.0', '-0', '"\\u0041"', '[1e2]'])(
    '%s is not canonical',
    (text) => {
      expect(isCanonical(text, JSON.parse(text))).toBe(false);
    },
  );
});

function fromBits(bits: string): number {
  const view = new DataView(new ArrayBuffer(8));
  view.setBigUint64(0, BigInt(`0x${bits}`));
  return view.getFloat64(0);
}

function reversed(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(reversed);
  if (typeof value !== 'object' || value === null) return value;
  return Object.fromEntries(
    Object.entries(value)
      .reverse()
      .map(([name, member]) => [name, reversed(member)]),
  );
}
