import { randomBytes } from 'node:crypto';
import { exportJWK, generateKeyPair } from 'jose';
import { publicKeyOf } from '../../core/seal/keys.ts';
import type { PublicKey, SigningKey } from '../../core/seal/model.ts';
import { keyFromPassword } from './passwords.ts';
import { closeBox, openBox } from './seal-box.ts';

/** A person's key as it rests in the database. */
export interface RestingKey {
  readonly publicKey: PublicKey;
  readonly salt: string;
  readonly sealed: string;
}

const SALT_BYTES = 16;

export async function newSigningKey(): Promise<SigningKey> {
  const { privateKey } = await generateKeyPair('EdDSA', { crv: 'Ed25519', extractable: true });
  const { x, d } = await exportJWK(privateKey);
  if (x === undefined || d === undefined) throw new TypeError('the new key is not an Ed25519 key');
  return { kty: 'OKP', crv: 'Ed25519', x, d };
}

/** A new key that only the person's password opens: the server can't sign for a person who is not there. */
export async function newRestingKey(password: string): Promise<RestingKey> {
  const key = await newSigningKey();
  const publicKey = await publicKeyOf(key);
  const salt = randomBytes(SALT_BYTES);
  const sealed = closeBox(key.d, await keyFromPassword(password, salt), personPurpose(publicKey.kid));
  return { publicKey, salt: salt.toString('base64url'), sealed };
}

export async function wakeKey({ publicKey, salt, sealed }: RestingKey, password: string): Promise<SigningKey> {
  const key = await keyFromPassword(password, Buffer.from(salt, 'base64url'));
  const { kty, crv, x, kid } = publicKey;
  return { kty, crv, x, d: openBox(sealed, key, personPurpose(kid)) };
}

function personPurpose(kid: string): string {
  return `antinode person key ${kid}`;
}
