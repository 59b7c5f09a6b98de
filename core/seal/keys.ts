import { sha256 } from '@noble/hashes/sha2.js';
import { utf8ToBytes } from '@noble/hashes/utils.js';
import { base64url, importJWK, type CryptoKey } from 'jose';
import { canonicalJson } from './canonical-json.ts';
import type { PublicKey, SigningKey } from './model.ts';

type KeyMembers = Pick<PublicKey, 'kty' | 'crv' | 'x'>;

const KEY_BYTES = 32;

/** Id of a key: its RFC 7638 thumbprint by SHA-256, computed from the key itself and never taken on trust. */
export function keyId(key: KeyMembers): Promise<string> {
  return Promise.resolve(thumbprint(key));
}

/** The half of a signing key that may be shown to everyone. */
export async function publicKeyOf({ kty, crv, x }: KeyMembers): Promise<PublicKey> {
  return { kty, crv, x, kid: await keyId({ kty, crv, x }) };
}

export async function importSigningKey({ kty, crv, x, d }: SigningKey): Promise<CryptoKey> {
  return asCryptoKey(await importJWK({ kty, crv, x, d }, 'EdDSA'));
}

export async function importPublicKey({ kty, crv, x }: KeyMembers): Promise<CryptoKey> {
  return asCryptoKey(await importJWK({ kty, crv, x }, 'EdDSA'));
}

/**
 * Whether the members of a carried key are well formed and its id is its own. The spelling of `x` matters: with loose
 * trailing bits one key could be carried under several ids, and pass for several people.
 */
export function isSoundKey(key: PublicKey): boolean {
  return decodeBase64url(key.x)?.length === KEY_BYTES && thumbprint(key) === key.kid;
}

/** Bytes of unpadded base64url in its one canonical spelling (unused trailing bits zero); otherwise null. */
export function decodeBase64url(text: string): Uint8Array | null {
  if (!/^[A-Za-z0-9_-]+$/.test(text) || text.length % 4 === 1) return null;
  const bytes = base64url.decode(text);
  return base64url.encode(bytes) === text ? bytes : null;
}

/** Made without WebCrypto, which pages that are not served securely lack: verification must explain itself there too. */
function thumbprint({ kty, crv, x }: KeyMembers): string {
  return base64url.encode(sha256(utf8ToBytes(canonicalJson({ crv, kty, x }))));
}

function asCryptoKey(key: CryptoKey | Uint8Array): CryptoKey {
  if (key instanceof Uint8Array) throw new TypeError('an Ed25519 key cannot be a shared secret');
  return key;
}
