import { CompactSign } from 'jose';
import { beforeAll, describe, expect, it } from 'vitest';
import { canonicalJson } from '../../../core/seal/canonical-json.ts';
import { openJws, signJws } from '../../../core/seal/jws.ts';
import { importSigningKey, keyId, publicKeyOf } from '../../../core/seal/keys.ts';
import type { PublicKey, RecordType } from '../../../core/seal/model.ts';
import { signClaims, signLogHead, signSeal } from '../../../core/seal/sign.ts';
import { RFC_8037_KEY } from './rfc8037.ts';
import { claimsOf, generateKey, sampleManifest } from './sample-bundle.ts';

const TYPE: RecordType = 'antinode-seal+jws';
const PAYLOAD = { b: [1, 'ü'], a: null };
let kid: string;
let keys: ReadonlyMap<string, PublicKey>;

beforeAll(async () => {
  kid = await keyId(RFC_8037_KEY);
  keys = new Map([[kid, await publicKeyOf(RFC_8037_KEY)]]);
});

describe('signJws', () => {
  it('writes exactly alg, kid and typ, and canonical JSON', async () => {
    const [header, payload] = (await signJws(TYPE, PAYLOAD, RFC_8037_KEY)).split('.');
    expect(text(header)).toBe(`{"alg":"EdDSA","kid":"${kid}","typ":"${TYPE}"}`);
    expect(text(payload)).toBe('{"a":null,"b":[1,"ü"]}');
  });

  it('is deterministic, and opens', async () => {
    const jws = await signJws(TYPE, PAYLOAD, RFC_8037_KEY);
    expect(await signJws(TYPE, PAYLOAD, RFC_8037_KEY)).toBe(jws);
    expect(await openJws(jws, TYPE, keys)).toEqual({ kid, payload: PAYLOAD });
  });

  it('signs nothing that JSON cannot carry', async () => {
    await expect(signJws(TYPE, { a: undefined }, RFC_8037_KEY)).rejects.toThrow(TypeError);
  });
});

describe('the kinds of records', () => {
  const digest = `sha256-${'1'.repeat(64)}`;
  const time = '2026-03-02T09:00:00Z';
  const SIGNED: readonly (readonly [RecordType, () => Promise<string>])[] = [
    ['antinode-signature+jws', () => signClaims(claimsOf('author', sampleManifest()), RFC_8037_KEY)],
    [
      'antinode-log-head+jws',
      () => signLogHead({ antinode: 'log-head/1', size: 0, root: '0'.repeat(64), time }, RFC_8037_KEY),
    ],
    ['antinode-seal+jws', () => signSeal({ antinode: 'seal/1', bundle: digest }, RFC_8037_KEY)],
  ];

  it.each(SIGNED)('%s passes as itself and as no other', async (type, sign) => {
    const jws = await sign();
    for (const [other] of SIGNED) {
      const opened = await openJws(jws, other, keys);
      if (other === type) expect(opened).toHaveProperty('payload');
      else expect(opened).toMatchObject({ fault: 'not allowed' });
    }
  });
});

describe('openJws refuses, although the signature itself is good,', () => {
  const payload = canonicalJson(PAYLOAD);

  it.each<[string, (kid: string) => object, string]>([
    ['an extra header member', (id) => ({ alg: 'EdDSA', kid: id, typ: TYPE, z: 1 }), 'not exactly alg, kid and typ'],
    ['a critical extension', (id) => ({ alg: 'EdDSA', crit: ['b64'], b64: true, kid: id, typ: TYPE }), 'header'],
    ['a missing kid', () => ({ alg: 'EdDSA', typ: TYPE }), 'not exactly alg, kid and typ'],
    ['reordered header members', (id) => ({ typ: TYPE, kid: id, alg: 'EdDSA' }), 'header is not canonical JSON'],
    ['a key that may not sign', () => ({ alg: 'EdDSA', kid: 'x', typ: TYPE }), 'not among the keys'],
    ['another name of the algorithm', (id) => ({ alg: 'Ed25519', kid: id, typ: TYPE }), 'not EdDSA'],
  ])('%s', async (_, header, reason) => {
    const opened = await openJws(await signRaw(header(kid), payload), TYPE, keys);
    expect(opened).toHaveProperty('detail', expect.stringContaining(reason));
  });

  it.each([
    ['white space', '{"a":null, "b":[1,"ü"]}'],
    ['another order', '{"b":[1,"ü"],"a":null}'],
    ['a member twice', '{"a":1,"a":null,"b":[1,"ü"]}'],
    ['a trailing line feed', `${payload}\n`],
    ['a byte order mark', `\ufeff${payload}`],
    ['text that is not JSON', 'payload'],
  ])('a payload with %s', async (_, raw) => {
    const opened = await openJws(await signRaw({ alg: 'EdDSA', kid, typ: TYPE }, raw), TYPE, keys);
    expect(opened).toMatchObject({ fault: 'invalid', detail: expect.stringContaining('payload') as unknown });
  });

  it('an unsigned one', async () => {
    const [, body] = (await signJws(TYPE, PAYLOAD, RFC_8037_KEY)).split('.');
    const header = Buffer.from(canonicalJson({ alg: 'none', kid, typ: TYPE })).toString('base64url');
    expect(await openJws(`${header}.${body}.AA`, TYPE, keys)).toMatchObject({ fault: 'not allowed' });
    expect(await openJws(`${header}.${body}.`, TYPE, keys)).toMatchObject({ fault: 'invalid' });
  });
});

describe('openJws refuses', () => {
  it('another spelling of the very same signature', async () => {
    const jws = await signJws(TYPE, PAYLOAD, RFC_8037_KEY);
    const last = jws.slice(-1);
    // 64 bytes leave four unused bits in the last character: all but one of 16 spellings must be refused.
    const ALPHABET = 'ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz0123456789-_';
    const group = ALPHABET.indexOf(last) & ~15;
    for (let offset = 0; offset < 16; offset += 1) {
      const respelt = jws.slice(0, -1) + ALPHABET.charAt(group + offset);
      const opened = await openJws(respelt, TYPE, keys);
      if (respelt === jws) expect(opened).toHaveProperty('payload');
      else expect(opened).toMatchObject({ fault: 'invalid', detail: 'its signature is not canonical base64url' });
    }
  });

  it.each(['', '.', '..', 'a.b', 'a.b.c', 'a.b.c.d', 'é.é.é', '....'])('%j', async (jws) => {
    expect(await openJws(jws, TYPE, keys)).toMatchObject({ fault: 'invalid' });
  });

  it.each([' ', '\n', '=', '.'])('a good one followed by %j', async (tail) => {
    const jws = await signJws(TYPE, PAYLOAD, RFC_8037_KEY);
    expect(await openJws(jws + tail, TYPE, keys)).toMatchObject({ fault: 'invalid' });
    expect(await openJws(tail + jws, TYPE, keys)).toMatchObject({ fault: 'invalid' });
  });

  it('the signature of another key under this id', async () => {
    const other = await importSigningKey(await generateKey());
    const jws = await new CompactSign(new TextEncoder().encode(canonicalJson(PAYLOAD)))
      .setProtectedHeader({ alg: 'EdDSA', kid, typ: TYPE })
      .sign(other);
    expect(await openJws(jws, TYPE, keys)).toEqual({
      fault: 'invalid',
      detail: 'its signature does not fit its content',
    });
  });

  it('the payload of one record with the signature of another', async () => {
    const [header, payload] = (await signJws(TYPE, { a: 1 }, RFC_8037_KEY)).split('.');
    const [, , signature] = (await signJws(TYPE, { a: 2 }, RFC_8037_KEY)).split('.');
    expect(await openJws(`${header}.${payload}.${signature}`, TYPE, keys)).toMatchObject({ fault: 'invalid' });
  });
});

/** A JWS with any header and any payload, its signature good. */
async function signRaw(header: object, payload: string): Promise<string> {
  const input = [JSON.stringify(header), payload].map((part) => Buffer.from(part).toString('base64url')).join('.');
  const key = await importSigningKey(RFC_8037_KEY);
  const signature = await crypto.subtle.sign('Ed25519', key, new TextEncoder().encode(input));
  return `${input}.${Buffer.from(signature).toString('base64url')}`;
}

function text(part: string | undefined): string {
  return Buffer.from(part ?? '', 'base64url').toString();
}
