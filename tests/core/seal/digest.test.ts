import { describe, expect, it } from 'vitest';
import { digestJson, digestText } from '../../../core/seal/digest.ts';

describe('digestText', () => {
  // NIST FIPS 180-4 example messages for SHA-256.
  it.each([
    ['', 'e3b0c44298fc1c149afbf4c8996fb92427ae41e4649b934ca495991b7852b855'],
    ['abc', 'ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad'],
    [
      'abcdbcdecdefdefgefghfghighijhijkijkljklmklmnlmnomnopnopq',
      '248d6a61d20638b8e5c026930c3e6039a33ce45964ff2167f6ecedd419db06c1',
    ],
  ])('of %j', (text, hash) => {
    expect(digestText(text)).toBe(`sha256-${hash}`);
  });

  it('refuses what UTF-8 cannot carry', () => {
    expect(() => digestText('a\ud800')).toThrow(TypeError);
  });
});

describe('digestJson', () => {
  it('does not depend on the order of members', () => {
    expect(digestJson({ a: 1, b: [2] })).toBe(digestText('{"a":1,"b":[2]}'));
    expect(digestJson({ b: [2], a: 1 })).toBe(digestJson({ a: 1, b: [2] }));
  });
});
