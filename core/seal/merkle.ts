/**
 * The Merkle tree of RFC 9162 section 2.1 over SHA-256. Hashes are lower-case hexadecimal at the edge of this file and
 * bytes inside. Leaves and nodes are hashed with different prefixes, so that a node can't pass as a leaf.
 */
import { sha256 } from '@noble/hashes/sha2.js';
import { bytesToHex, concatBytes, hexToBytes, utf8ToBytes } from '@noble/hashes/utils.js';

const LEAF = Uint8Array.of(0x00);
const NODE = Uint8Array.of(0x01);
const HASH = /^[0-9a-f]{64}$/;

/** That a leaf stands at an index of a tree. */
export interface Inclusion {
  readonly leaf: string;
  readonly index: number;
  readonly size: number;
  readonly proof: readonly string[];
  readonly root: string;
}

/** That a tree of `size` leaves begins with the very leaves of the older, smaller one. */
export interface Consistency {
  readonly oldSize: number;
  readonly oldRoot: string;
  readonly size: number;
  readonly root: string;
  readonly proof: readonly string[];
}

/** Hash of one leaf; a text counts as its UTF-8 bytes. */
export function leafHash(entry: string | Uint8Array): string {
  return bytesToHex(sha256(concatBytes(LEAF, typeof entry === 'string' ? utf8ToBytes(entry) : entry)));
}

/** Merkle tree hash over leaf hashes (section 2.1.1); that of an empty tree is the hash of nothing. */
export function treeRoot(leaves: readonly string[]): string {
  return bytesToHex(rootOf(leaves.map(fromHex), 0, leaves.length));
}

/** Inclusion proof of the leaf at `index`, hashes from the leaf up (section 2.1.3.1). */
export function inclusionProof(leaves: readonly string[], index: number): string[] {
  if (!Number.isSafeInteger(index) || index < 0 || index >= leaves.length) {
    throw new RangeError(`no leaf ${index} in a tree of ${leaves.length}`);
  }
  const hashes = leaves.map(fromHex);
  const path: Uint8Array[] = [];
  let [start, end] = [0, hashes.length];
  while (end - start > 1) {
    const middle = start + split(end - start);
    if (index < middle) {
      path.push(rootOf(hashes, middle, end));
      end = middle;
    } else {
      path.push(rootOf(hashes, start, middle));
      start = middle;
    }
  }
  return path.reverse().map((hash) => bytesToHex(hash));
}

/** Section 2.1.3.2. Everything but `root` may come from an attacker: anything out of shape is simply not included. */
export function verifyInclusion({ leaf, index, size, proof, root }: Inclusion): boolean {
  if (!isCount(index) || !isCount(size) || index >= size) return false;
  if (![leaf, root, ...proof].every((hash) => HASH.test(hash))) return false;
  let hash: Uint8Array = hexToBytes(leaf);
  // Numbers beyond 2^32 rule out bit operations: halving and parity do the same.
  let [node, last] = [index, size - 1];
  for (const sibling of proof.map(hexToBytes)) {
    if (last === 0) return false;
    if (isOdd(node) || node === last) {
      hash = nodeHash(sibling, hash);
      [node, last] = skipRightEdge(node, last);
    } else {
      hash = nodeHash(hash, sibling);
    }
    [node, last] = [half(node), half(last)];
  }
  return last === 0 && bytesToHex(hash) === root;
}

/** Proof that the first `oldSize` leaves have not changed since (section 2.1.4.1). */
export function consistencyProof(leaves: readonly string[], oldSize: number): string[] {
  if (!Number.isSafeInteger(oldSize) || oldSize < 1 || oldSize > leaves.length) {
    throw new RangeError(`no tree of ${oldSize} in a tree of ${leaves.length}`);
  }
  const hashes = leaves.map(fromHex);
  const path: Uint8Array[] = [];
  let [start, end] = [0, hashes.length];
  while (oldSize < end) {
    const middle = start + split(end - start);
    if (oldSize <= middle) {
      path.push(rootOf(hashes, middle, end));
      end = middle;
    } else {
      path.push(rootOf(hashes, start, middle));
      start = middle;
    }
  }
  // The verifier holds the old root; the subtree where the paths part is left out only where it is that root.
  if (start !== 0) path.push(rootOf(hashes, start, end));
  return path.reverse().map((hash) => bytesToHex(hash));
}

/** Section 2.1.4.2. The proof may come from an attacker. */
export function verifyConsistency({ oldSize, oldRoot, size, root, proof }: Consistency): boolean {
  if (!isCount(oldSize) || !isCount(size) || oldSize < 1 || oldSize > size) return false;
  if (![oldRoot, root, ...proof].every((hash) => HASH.test(hash))) return false;
  if (oldSize === size) return proof.length === 0 && oldRoot === root;
  const [first, ...rest] = (isPowerOfTwo(oldSize) ? [oldRoot, ...proof] : proof).map(hexToBytes);
  if (first === undefined) return false;
  let [node, last] = [oldSize - 1, size - 1];
  while (isOdd(node)) [node, last] = [half(node), half(last)];
  let [older, newer]: [Uint8Array, Uint8Array] = [first, first];
  for (const sibling of rest) {
    if (last === 0) return false;
    if (isOdd(node) || node === last) {
      [older, newer] = [nodeHash(sibling, older), nodeHash(sibling, newer)];
      [node, last] = skipRightEdge(node, last);
    } else {
      newer = nodeHash(newer, sibling);
    }
    [node, last] = [half(node), half(last)];
  }
  return last === 0 && bytesToHex(older) === oldRoot && bytesToHex(newer) === root;
}

/** A last node without a right sibling rises unhashed until it is a right child, or the root. */
function skipRightEdge(node: number, last: number): [node: number, last: number] {
  while (!isOdd(node) && node !== 0) [node, last] = [half(node), half(last)];
  return [node, last];
}

function rootOf(hashes: readonly Uint8Array[], start: number, end: number): Uint8Array {
  const only = end - start === 1 ? hashes[start] : undefined;
  if (only !== undefined) return only;
  if (end === start) return sha256(new Uint8Array());
  const middle = start + split(end - start);
  return nodeHash(rootOf(hashes, start, middle), rootOf(hashes, middle, end));
}

function nodeHash(left: Uint8Array, right: Uint8Array): Uint8Array {
  return sha256(concatBytes(NODE, left, right));
}

/** Largest power of two below n. */
function split(n: number): number {
  let power = 1;
  while (power * 2 < n) power *= 2;
  return power;
}

function isPowerOfTwo(n: number): boolean {
  return n === 1 || split(n) * 2 === n;
}

function isCount(n: number): boolean {
  return Number.isSafeInteger(n) && n >= 0;
}

function isOdd(n: number): boolean {
  return n % 2 === 1;
}

function half(n: number): number {
  return Math.floor(n / 2);
}

function fromHex(hash: string): Uint8Array {
  if (!HASH.test(hash)) throw new TypeError(`not a SHA-256 hash: ${hash}`);
  return hexToBytes(hash);
}
