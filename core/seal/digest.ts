import { sha256 } from '@noble/hashes/sha2.js';
import { bytesToHex, utf8ToBytes } from '@noble/hashes/utils.js';
import type { Digest } from '../report/model.ts';
import { canonicalJson, hasLoneSurrogate } from './canonical-json.ts';

/** Digest of the UTF-8 bytes of a text. Throws a TypeError on a lone surrogate, which UTF-8 cannot carry. */
export function digestText(text: string): Digest {
  // An encoder would put U+FFFD for it, and two different texts would share a digest.
  if (hasLoneSurrogate(text)) throw new TypeError('the text holds a lone surrogate');
  return `sha256-${bytesToHex(sha256(utf8ToBytes(text)))}`;
}

/** Digest of the canonical JSON (RFC 8785) of a value. */
export function digestJson(value: unknown): Digest {
  return digestText(canonicalJson(value));
}
