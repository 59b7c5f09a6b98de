import fc from 'fast-check';
import { beforeAll, describe, expect, it } from 'vitest';
import type { Verification } from '../../../core/seal/model.ts';
import { verifyBundle } from '../../../core/seal/verify-bundle.ts';
import { generateKeys, sameReport, sampleBundle } from './sample-bundle.ts';

let file: Uint8Array;

beforeAll(async () => {
  file = new TextEncoder().encode(await sampleBundle(await generateKeys()));
});

/** Refused, and every failing proof says why and of which kind it is. */
function isRefusedWithReason({ valid, proofs }: Verification): boolean {
  const failing = proofs.filter(({ holds }) => !holds);
  return !valid && failing.length > 0 && failing.every(({ fault, detail }) => fault !== undefined && detail.length > 5);
}

function withByte(position: number, byte: number): Uint8Array {
  const altered = Uint8Array.from(file);
  altered[position] = byte;
  return altered;
}

describe('a bundle with one byte changed', () => {
  it('is refused with a reason, at every position of the file', { timeout: 180_000 }, async () => {
    expect((await verifyBundle(file, sameReport)).valid).toBe(true);
    const accepted: number[] = [];
    const tryPosition = async (position: number): Promise<void> => {
      // One bit, another one from place to place: digits become letters, quotes brackets, letters capitals.
      const altered = withByte(position, (file[position] ?? 0) ^ (1 << (position % 8)));
      if (!isRefusedWithReason(await verifyBundle(altered, sameReport))) accepted.push(position);
    };
    const positions = [...file.keys()];
    // Some at a time, so that all cores take part in checking signatures.
    while (positions.length > 0) await Promise.all(positions.splice(0, 32).map(tryPosition));
    expect(accepted).toEqual([]);
  });

  it('is refused whatever the byte becomes', { timeout: 60_000 }, async () => {
    const change = fc.tuple(fc.nat(), fc.integer({ min: 1, max: 255 }));
    await fc.assert(
      fc.asyncProperty(change, async ([place, bits]) => {
        const position = place % file.length;
        const verification = await verifyBundle(withByte(position, (file[position] ?? 0) ^ bits), sameReport);
        expect(isRefusedWithReason(verification)).toBe(true);
      }),
      { numRuns: 500 },
    );
  });
});

describe('a bundle with bytes cut out, put in, or moved', () => {
  it('is refused', { timeout: 60_000 }, async () => {
    const splice = fc.tuple(fc.nat(), fc.nat(40), fc.uint8Array({ maxLength: 8 }));
    await fc.assert(
      fc.asyncProperty(splice, async ([place, count, added]) => {
        const position = place % (file.length + 1);
        const altered = Uint8Array.from([...file.subarray(0, position), ...added, ...file.subarray(position + count)]);
        fc.pre(!Buffer.from(altered).equals(file));
        expect(isRefusedWithReason(await verifyBundle(altered, sameReport))).toBe(true);
      }),
      { numRuns: 300 },
    );
  });
});

describe('any JSON at all', () => {
  it('is refused and never thrown at', async () => {
    await fc.assert(
      fc.asyncProperty(fc.json({ maxDepth: 6 }), async (text) => {
        expect(isRefusedWithReason(await verifyBundle(text, sameReport))).toBe(true);
      }),
    );
  });
});
