import { describe, expect, it } from 'vitest';
import { digestJson } from '../../../core/seal/digest.ts';
import { publicKeyOf } from '../../../core/seal/keys.ts';
import type { SignatureClaims } from '../../../core/seal/model.ts';
import { signClaims, signSeal } from '../../../core/seal/sign.ts';
import { claimsOf, generateKey, sampleManifest, signAll, STORY, type Deed, type Keys } from './sample-bundle.ts';
import { detail, failures, makeSample } from './sample-verification.ts';

const { keys, parts, verifySealed, withLog } = await makeSample();

async function signatures(
  changes: Partial<Record<keyof Keys, Partial<SignatureClaims>>>,
  by = keys,
): Promise<string[]> {
  const roles = ['author', 'checker', 'approver'] as const;
  return Promise.all(
    roles.map((role) => signClaims({ ...claimsOf(role, parts.manifest), ...changes[role] }, by[role])),
  );
}

describe('signatures', () => {
  it('a missing checker is not allowed', async () => {
    const [author = '', , approver = ''] = parts.signatures;
    const people = parts.keys.people.filter((_, index) => index !== 1);
    const verification = await verifySealed({ signatures: [author, approver], keys: { ...parts.keys, people } });
    expect(failures(verification)).toContain('All three have signed: not allowed');
    expect(detail(verification, 'All three have signed')).toBe('a good signature of the checker is missing');
    expect(failures(verification)).toContain('Log and signatures agree: not allowed');
  });

  it('no signature at all is not allowed', async () => {
    const verification = await verifySealed({ signatures: [], keys: { ...parts.keys, people: [] } });
    expect(failures(verification)).toContain('All three have signed: not allowed');
    expect(failures(verification)).toContain('Three different people: not allowed');
  });

  it('the same signature twice is not a second person', async () => {
    const [author = '', checker = '', approver = ''] = parts.signatures;
    const verification = await verifySealed({ signatures: [author, checker, checker, approver] });
    expect(failures(verification)).toEqual([
      'All three have signed: not allowed',
      'Three different people: not allowed',
    ]);
  });

  it.each(['ines@tarn.example', 'INES@tarn.example', ' Ines@Tarn.Example'])(
    'the author may not check, also not as %j with a second key',
    async (email) => {
      const deeds = STORY.map(([event, actor, clock]): Deed => [event, event === 'checked' ? email : actor, clock]);
      const verification = await verifySealed({
        ...(await withLog(deeds)),
        signatures: await signatures({ checker: { email } }),
      });
      expect(failures(verification)).toEqual(['Three different people: not allowed']);
      expect(detail(verification, 'Three different people')).toBe('one e-mail address signs in two places');
    },
  );

  it('the author may not check under another address with the same key', async () => {
    const people = [keys.author, keys.approver];
    const verification = await verifySealed({
      signatures: await signatures({}, { ...keys, checker: keys.author }),
      keys: { ...parts.keys, people: await Promise.all(people.map((key) => publicKeyOf(key))) },
    });
    expect(failures(verification)).toEqual(['Three different people: not allowed']);
    expect(detail(verification, 'Three different people')).toBe('one key signs in two places');
  });

  it('one key may not be carried under two spellings', async () => {
    const { x } = keys.author;
    const ALPHABET = 'ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz0123456789-_';
    const respelt = { ...keys.author, x: x.slice(0, -1) + ALPHABET.charAt(ALPHABET.indexOf(x.slice(-1)) + 1) };
    const people = await Promise.all([keys.author, respelt, keys.approver].map((key) => publicKeyOf(key)));
    const verification = await verifySealed({
      signatures: await signatures({}, { ...keys, checker: respelt }),
      keys: { ...parts.keys, people },
    });
    expect(failures(verification)).toContain('Keys of the signers: invalid');
    expect(failures(verification)).toContain('All three have signed: not allowed');
  });

  it('signatures of another manifest are good, but not allowed', async () => {
    const replayed = await signAll(sampleManifest({ revision: 'A' }), keys);
    const verification = await verifySealed({ signatures: replayed });
    expect(failures(verification)).toEqual(
      expect.arrayContaining(['Signature 1: not allowed', 'Signature 2: not allowed', 'Signature 3: not allowed']),
    );
    expect(detail(verification, 'Signature 1')).toBe('it is good, but over another manifest than this one');
    expect(verification.signers).toEqual([]);
  });

  it('swapped signature parts are invalid', async () => {
    const [author = '', checker = '', approver = ''] = parts.signatures;
    const swap = (jws: string, other: string): string => [...jws.split('.').slice(0, 2), other.split('.')[2]].join('.');
    const verification = await verifySealed({ signatures: [swap(author, checker), swap(checker, author), approver] });
    expect(failures(verification)).toEqual(expect.arrayContaining(['Signature 1: invalid', 'Signature 2: invalid']));
  });

  it('keys under swapped ids are invalid', async () => {
    const [author, checker, approver] = parts.keys.people;
    if (!author || !checker || !approver) throw new Error('a key is missing');
    const people = [{ ...author, kid: checker.kid }, { ...checker, kid: author.kid }, approver];
    const verification = await verifySealed({ keys: { ...parts.keys, people } });
    expect(failures(verification)).toContain('Keys of the signers: invalid');
    expect(verification.signers.map(({ role }) => role)).toEqual(['approver']);
  });

  it('a key that nobody used, and the key of the server, are not allowed among those of people', async () => {
    for (const stranger of [await generateKey(), keys.server]) {
      const people = [...parts.keys.people, await publicKeyOf(stranger)];
      const verification = await verifySealed({ keys: { ...parts.keys, people } });
      expect(failures(verification)).toEqual(['Keys of the signers: not allowed']);
    }
  });

  it('a signature of an unknown key is not allowed', async () => {
    const stranger = await generateKey();
    const verification = await verifySealed({ signatures: await signatures({}, { ...keys, checker: stranger }) });
    expect(failures(verification)).toContain('Signature 2: not allowed');
  });

  it('a record of another kind does not pass as a signature', async () => {
    const [author = '', , approver = ''] = parts.signatures;
    const seal = await signSeal({ antinode: 'seal/1', bundle: digestJson(parts.manifest) }, keys.checker);
    const verification = await verifySealed({ signatures: [author, seal, approver] });
    expect(failures(verification)).toContain('Signature 2: not allowed');
    expect(detail(verification, 'Signature 2')).toContain('another kind of record');
  });

  it.each<[string, object]>([
    ['an unknown role', { role: 'owner' }],
    ['an extra claim', { note: 'extra' }],
    ['an empty name', { name: ' ' }],
    ['a time without a zone', { time: '2026-03-02T10:00:00' }],
    ['a time in words', { time: 'yesterday' }],
    ['another version', { antinode: 'signature/2' }],
  ])('%s in the claims is invalid', async (_, changes) => {
    const verification = await verifySealed({ signatures: await signatures({ checker: changes }) });
    expect(failures(verification)).toContain('Signature 2: invalid');
  });

  it('the checker may not sign before the author', async () => {
    const verification = await verifySealed({
      signatures: await signatures({ checker: { time: '2026-03-02T08:59:59.999Z' } }),
    });
    expect(failures(verification)).toEqual(['Order of signing: not allowed']);
  });
});
