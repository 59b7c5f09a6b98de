import { CompactSign, compactVerify } from 'jose';
import { describe, expect, it } from 'vitest';
import {
  decodeBase64url,
  importPublicKey,
  importSigningKey,
  isSoundKey,
  keyId,
  publicKeyOf,
} from '../../../core/seal/keys.ts';
import { RFC_8037_KEY } from './rfc8037.ts';

// RFC 8037 appendices A.3 (thumbprint), A.4 and A.5 (JWS).
const KID = 'kPrK_qmxVWaYVA9wwBF6Iuo3vVzz7TxHCTwXBygrS4k';
const JWS =
  'eyJhbGciOiJFZERTQSJ9.RXhhbXBsZSBvZiBFZDI1NTE5IHNpZ25pbmc.' +
  'hgyY0il_MGCjP0JzlnLWG1PPOt7-09PGcvMg3AIbQR6dWbhijcNR4ki4iylGjg5BhVsPt9g7sVvpAr_MuM0KAg';
const TEXT = 'Example of Ed25519 signing';

describe('the key of RFC 8037 appendix A', () => {
  it('has the thumbprint of A.3 as its id', async () => {
    expect(await keyId(RFC_8037_KEY)).toBe(KID);
    expect(await publicKeyOf(RFC_8037_KEY)).toEqual({ kty: 'OKP', crv: 'Ed25519', x: RFC_8037_KEY.x, kid: KID });
  });

  it('signs as in A.4', async () => {
    const signer = new CompactSign(new TextEncoder().encode(TEXT)).setProtectedHeader({ alg: 'EdDSA' });
    expect(await signer.sign(await importSigningKey(RFC_8037_KEY))).toBe(JWS);
  });

  it('verifies as in A.5', async () => {
    const { payload } = await compactVerify(JWS, await importPublicKey(RFC_8037_KEY));
    expect(new TextDecoder().decode(payload)).toBe(TEXT);
  });
});

describe('isSoundKey', () => {
  const key = { kty: 'OKP', crv: 'Ed25519', x: RFC_8037_KEY.x, kid: KID } as const;

  it('takes a key with its own id', () => {
    expect(isSoundKey(key)).toBe(true);
  });

  it('refuses an id that is not its thumbprint', () => {
    expect(isSoundKey({ ...key, kid: RFC_8037_KEY.d })).toBe(false);
  });

  it('refuses a second spelling of the same key, which would have an id of its own', async () => {
    const x = `${key.x.slice(0, -1)}p`;
    expect(Buffer.from(x, 'base64url')).toEqual(Buffer.from(key.x, 'base64url'));
    expect(isSoundKey({ ...key, x, kid: await keyId({ ...key, x }) })).toBe(false);
  });

  it('refuses a key that is too short', async () => {
    const x = Buffer.alloc(31).toString('base64url');
    expect(isSoundKey({ ...key, x, kid: await keyId({ ...key, x }) })).toBe(false);
  });
});

describe('decodeBase64url', () => {
  // RFC 4648 section 10, and the octets of RFC 7515 appendix C.
  it.each([
    ['Zg', [102]],
    ['Zm8', [102, 111]],
    ['Zm9v', [102, 111, 111]],
    ['A-z_4ME', [3, 236, 255, 224, 193]],
  ])('%s', (text, bytes) => {
    expect(decodeBase64url(text)).toEqual(Uint8Array.from(bytes));
  });

  it.each(['Zh', 'Zm9', 'Zg==', 'Zg=', 'Z', ' Zg', 'Zg\n', 'Z g', '+z/4', 'é', ''])('refuses %j', (text) => {
    expect(decodeBase64url(text)).toBeNull();
  });
});
