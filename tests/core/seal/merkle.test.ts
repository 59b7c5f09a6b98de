import { createHash } from 'node:crypto';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  consistencyProof,
  inclusionProof,
  leafHash,
  treeRoot,
  verifyConsistency,
  verifyInclusion,
} from '../../../core/seal/merkle.ts';

// The test tree that implementations of RFC 6962 share: entries and hashes from memory, confirmed by the independent
// recomputation below.
const ENTRIES = ['', '00', '10', '2021', '3031', '40414243', '5051525354555657', '606162636465666768696a6b6c6d6e6f'];
const ROOTS = [
  'e3b0c44298fc1c149afbf4c8996fb92427ae41e4649b934ca495991b7852b855',
  '6e340b9cffb37a989ca544e6bb780a2c78901d3fb33738768511a30617afa01d',
  'fac54203e7cc696cf0dfcb42c92a1d9dbaf70ad9e621f4bd8d98662f00e3c125',
  'aeb6bcfe274b70a14fb067a5e5578264db0fa9b51af5e0ba159158f329e06e77',
  'd37ee418976dd95753c1c73862b9398fa2a2cf9b4ff0fdfe8b30cd95209614b7',
  '4e3bbb1f7b478dcfe71fb631631519a3bca12c9aefca1612bfce4c13a86264d4',
  '76e67dadbcdf1e10e1b74ddc608abd2f98dfb16fbce75277b5232a127f2087ef',
  'ddb89be403809e325750d3d263cd78929c2942b7942a34b77e122c9594a74c8c',
  '5dc9da79a70659a9ad559cb701ded9a2ab9d823aad2f4960cfe370eff4604328',
];
const PATHS: readonly (readonly [index: number, size: number, path: readonly string[]])[] = [
  [0, 1, []],
  [
    0,
    8,
    [
      '96a296d224f285c67bee93c30f8a309157f0daa35dc5b87e410b78630a09cfc7',
      '5f083f0a1a33ca076a95279832580db3e0ef4584bdff1f54c8a360f50de3031e',
      '6b47aaf29ee3c2af9af889bc1fb9254dabd31177f16232dd6aab035ca39bf6e4',
    ],
  ],
  [
    5,
    8,
    [
      'bc1a0643b12e4d2d7c77918f44e0f4f79a838b6cf9ec5b5c283e1f4d88599e6b',
      'ca854ea128ed050b41b35ffc1b87b8eb2bde461e9e3b5596ece6b9d5975a0ae0',
      'd37ee418976dd95753c1c73862b9398fa2a2cf9b4ff0fdfe8b30cd95209614b7',
    ],
  ],
  [2, 3, ['fac54203e7cc696cf0dfcb42c92a1d9dbaf70ad9e621f4bd8d98662f00e3c125']],
];
const LEAVES = ENTRIES.map((entry) => leafHash(Buffer.from(entry, 'hex')));
const ALL_SIZES = Array.from({ length: 41 }, (_, size) => size);
const MANY = ALL_SIZES.slice(1).map((number) => leafHash(`entry ${number}`));

describe('treeRoot', () => {
  it.each(ROOTS.map((root, size) => [size, root] as const))(
    'of the first %i leaves of the shared tree',
    (size, root) => {
      expect(treeRoot(LEAVES.slice(0, size))).toBe(root);
    },
  );

  it('equals the definition of RFC 9162 section 2.1.1, at all sizes to 40', () => {
    for (const size of ALL_SIZES) {
      const entries = ALL_SIZES.slice(1, size + 1).map((number) => Buffer.from(`entry ${number}`));
      expect(treeRoot(MANY.slice(0, size))).toBe(definition(entries).toString('hex'));
    }
  });

  it('refuses what is not a hash', () => {
    expect(() => treeRoot(['abc'])).toThrow(TypeError);
  });
});

describe('inclusion', () => {
  it.each(PATHS)('proof of leaf %i in the shared tree of %i', (index, size, path) => {
    expect(inclusionProof(LEAVES.slice(0, size), index)).toEqual(path);
  });

  it('is proved for every leaf of every size to 40, at its index and at no other', () => {
    for (const size of ALL_SIZES) {
      const leaves = MANY.slice(0, size);
      const root = treeRoot(leaves);
      leaves.forEach((leaf, index) => {
        const proof = inclusionProof(leaves, index);
        const claim = { leaf, index, size, proof, root };
        expect(verifyInclusion(claim)).toBe(true);
        const elsewhere = ALL_SIZES.filter((other) => other !== index);
        expect(elsewhere.some((other) => verifyInclusion({ ...claim, index: other }))).toBe(false);
        expect(verifyInclusion({ ...claim, leaf: leafHash('forged') })).toBe(false);
        expect(verifyInclusion({ ...claim, root: leafHash('forged') })).toBe(false);
        expect(verifyInclusion({ ...claim, proof: [...proof, root] })).toBe(false);
        if (proof.length > 0) expect(verifyInclusion({ ...claim, proof: proof.slice(1) })).toBe(false);
      });
    }
  });

  it('does not take a node for a leaf', () => {
    const [first, second] = LEAVES;
    const root = treeRoot(LEAVES.slice(0, 2));
    const forged = leafHash(Buffer.from(`${first}${second}`, 'hex'));
    expect(verifyInclusion({ leaf: forged, index: 0, size: 1, proof: [], root })).toBe(false);
  });

  it('is refused, never thrown at, for anything out of shape', () => {
    const good = { leaf: MANY[0] ?? '', index: 0, size: 1, proof: [], root: MANY[0] ?? '' };
    expect(verifyInclusion(good)).toBe(true);
    for (const index of [-1, 0.5, NaN, Infinity, 2 ** 53, 1]) expect(verifyInclusion({ ...good, index })).toBe(false);
    for (const size of [0, -1, 1.5, NaN, Infinity, 2 ** 60]) expect(verifyInclusion({ ...good, size })).toBe(false);
    expect(verifyInclusion({ ...good, leaf: good.leaf.toUpperCase() })).toBe(false);
    expect(verifyInclusion({ ...good, proof: ['xyz'] })).toBe(false);
  });

  it('counts beyond 2^32, where bit operations would wrap', () => {
    // A tree of 2^40 + 1 leaves: the last one hangs below the root on the right, by itself.
    const [left, leaf] = [leafHash('left subtree'), leafHash('last')];
    const root = node(Buffer.from(left, 'hex'), Buffer.from(leaf, 'hex')).toString('hex');
    const size = 2 ** 40 + 1;
    expect(verifyInclusion({ leaf, index: 2 ** 40, size, proof: [left], root })).toBe(true);
    expect(verifyInclusion({ leaf, index: 0, size, proof: [left], root })).toBe(false);
  });

  it('has no proof for a leaf that is not there', () => {
    for (const index of [-1, 0.5, 8]) expect(() => inclusionProof(LEAVES, index)).toThrow(RangeError);
  });
});

describe('consistency', () => {
  it('is proved for every older tree of every size to 40, and for no altered one', () => {
    for (const size of ALL_SIZES.slice(1)) {
      const leaves = MANY.slice(0, size);
      const root = treeRoot(leaves);
      for (const oldSize of ALL_SIZES.slice(1, size + 1)) {
        const proof = consistencyProof(leaves, oldSize);
        const claim = { oldSize, oldRoot: treeRoot(leaves.slice(0, oldSize)), size, root, proof };
        expect(verifyConsistency(claim)).toBe(true);
        const altered = treeRoot([leafHash('forged'), ...leaves.slice(1, oldSize)]);
        expect(verifyConsistency({ ...claim, oldRoot: altered })).toBe(false);
        expect(verifyConsistency({ ...claim, root: leafHash('forged') })).toBe(false);
        expect(verifyConsistency({ ...claim, proof: [...proof, root] })).toBe(false);
      }
    }
  });

  it('is refused for sizes that make no sense', () => {
    const good = {
      oldSize: 3,
      oldRoot: ROOTS[3] ?? '',
      size: 7,
      root: ROOTS[7] ?? '',
      proof: consistencyProof(LEAVES.slice(0, 7), 3),
    };
    expect(verifyConsistency(good)).toBe(true);
    for (const oldSize of [0, -1, 8, NaN, 2.5]) expect(verifyConsistency({ ...good, oldSize })).toBe(false);
    expect(() => consistencyProof(LEAVES, 0)).toThrow(RangeError);
  });

  it('holds along any growth of a log', () => {
    const growth = fc.tuple(fc.integer({ min: 1, max: 300 }), fc.nat(300));
    fc.assert(
      fc.property(growth, ([oldSize, more]) => {
        const leaves = Array.from({ length: oldSize + more }, (_, index) => leafHash(String(index)));
        const [oldRoot, root] = [treeRoot(leaves.slice(0, oldSize)), treeRoot(leaves)];
        const proof = consistencyProof(leaves, oldSize);
        expect(verifyConsistency({ oldSize, oldRoot, size: leaves.length, root, proof })).toBe(true);
      }),
      { numRuns: 30 },
    );
  });
});

/** RFC 9162 section 2.1.1 word by word, over entries, with another implementation of SHA-256. */
function definition(entries: readonly Buffer[]): Buffer {
  const [only] = entries;
  if (only === undefined) return createHash('sha256').digest();
  if (entries.length === 1) return createHash('sha256').update(Buffer.of(0)).update(only).digest();
  let k = 1;
  while (k < entries.length / 2) k *= 2;
  return node(definition(entries.slice(0, k)), definition(entries.slice(k)));
}

function node(left: Buffer, right: Buffer): Buffer {
  return createHash('sha256').update(Buffer.of(1)).update(left).update(right).digest();
}
