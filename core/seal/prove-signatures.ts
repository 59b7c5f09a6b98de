import { isSignatureClaims } from './claims.ts';
import { digestJson } from './digest.ts';
import { openJws } from './jws.ts';
import { isSoundKey } from './keys.ts';
import type { Bundle, Proof, PublicKey, SignatureClaims } from './model.ts';
import { invalid, judge, notAllowed, quote, unless, type Fault } from './verdict.ts';

/** What a person has signed, once the signature is found good. */
export type Signer = SignatureClaims & { readonly kid: string };

export interface SignatureProofs {
  readonly proofs: readonly Proof[];
  /** Signers of this very manifest whose signatures are good. */
  readonly signers: readonly Signer[];
}

/** That each signature is good and covers this manifest, and that the carried keys are those of the signers. */
export async function proveSignatures({ manifest, signatures, keys }: Bundle): Promise<SignatureProofs> {
  const digest = digestJson(manifest);
  const sound = soundKeys(keys.people);
  const opened = await Promise.all(signatures.map((jws) => openSignature(jws, digest, sound)));
  const signers = opened.filter((result): result is Signer => !('fault' in result));
  return {
    proofs: [...opened.map(proveSignature), proveKeys(keys, sound, signers)],
    signers,
  };
}

function soundKeys(people: readonly PublicKey[]): ReadonlyMap<string, PublicKey> {
  return new Map(people.filter(isSoundKey).map((key) => [key.kid, key]));
}

async function openSignature(
  jws: string,
  manifest: string,
  keys: ReadonlyMap<string, PublicKey>,
): Promise<Signer | Fault> {
  const opened = await openJws(jws, 'antinode-signature+jws', keys);
  if ('fault' in opened) return opened;
  const { kid, payload } = opened;
  if (!isSignatureClaims(payload)) return invalid('it does not say what a signature must say');
  if (payload.manifest !== manifest) return notAllowed('it is good, but over another manifest than this one');
  return { ...payload, kid };
}

function proveSignature(result: Signer | Fault, index: number): Proof {
  if ('fault' in result) return judge(`Signature ${index + 1}`, [result], '');
  const { role, name, email, time, meaning } = result;
  return judge(`Signature ${index + 1}, ${role}`, [], `${quote(name)}, ${quote(email)}, at ${time}: ${quote(meaning)}`);
}

function proveKeys(keys: Bundle['keys'], sound: ReadonlyMap<string, PublicKey>, signers: readonly Signer[]): Proof {
  const ids = keys.people.map(({ kid }) => kid);
  const signing = new Set(signers.map(({ kid }) => kid));
  return judge(
    'Keys of the signers',
    [
      ...unless(
        keys.people.every((key) => sound.has(key.kid)),
        invalid('a key is malformed, or its id is not its thumbprint'),
      ),
      ...unless(new Set(ids).size === ids.length, notAllowed('a key is carried twice')),
      ...unless(!ids.includes(keys.server.kid), notAllowed("a person signs with the server's key")),
      ...unless(
        ids.every((id) => signing.has(id)),
        notAllowed('a key is carried that no good signature uses'),
      ),
    ],
    `${ids.length} keys, each with its thumbprint as id`,
  );
}
