/**
 * Compact JWS (RFC 7515, EdDSA) in one strict spelling: the header is the canonical JSON of exactly `alg`, `kid` and
 * `typ`, the payload is canonical JSON, every part is canonical base64url. What is signed has one form only, and a
 * record of one kind never passes as another.
 */
import { CompactSign, compactVerify, errors } from 'jose';
import { canonicalJson, isCanonical } from './canonical-json.ts';
import { decodeBase64url, importPublicKey, importSigningKey, keyId } from './keys.ts';
import type { PublicKey, RecordType, SigningKey } from './model.ts';
import { invalid, notAllowed, type Fault } from './verdict.ts';

const ALGORITHM = 'EdDSA';

/** A JWS whose signature is good: the id of the key, and the payload, whose shape is still to be checked. */
export interface OpenedJws {
  readonly kid: string;
  readonly payload: unknown;
}

/** The fields are the signer's word once the signature is good; until then they may be anybody's. */
interface JwsParts {
  readonly alg: string;
  readonly kid: string;
  readonly typ: string;
  readonly payload: unknown;
}

export async function signJws(type: RecordType, payload: unknown, key: SigningKey): Promise<string> {
  const header = { alg: ALGORITHM, kid: await keyId(key), typ: type };
  return new CompactSign(new TextEncoder().encode(canonicalJson(payload)))
    .setProtectedHeader(header)
    .sign(await importSigningKey(key));
}

/** Opens a JWS of the wanted kind, signed by one of `keys`. The text may come from an attacker. */
export async function openJws(
  jws: string,
  type: RecordType,
  keys: ReadonlyMap<string, PublicKey>,
): Promise<OpenedJws | Fault> {
  const parts = readParts(jws);
  if ('fault' in parts) return parts;
  const { alg, kid, typ, payload } = parts;
  if (alg !== ALGORITHM) return notAllowed('its algorithm is not EdDSA');
  if (typ !== type) return notAllowed(`it is signed as another kind of record than ${type}`);
  const key = keys.get(kid);
  if (!key) return notAllowed('its key is not among the keys that may sign it');
  return (await signatureFault(jws, key)) ?? { kid, payload };
}

function readParts(jws: string): JwsParts | Fault {
  const [header, payload, signature, ...more] = jws.split('.');
  if (header === undefined || payload === undefined || signature === undefined || more.length > 0) {
    return invalid('it is not a compact JWS of three parts');
  }
  const headerValue = readJson(header);
  if ('fault' in headerValue) return invalid(`its header ${headerValue.detail}`);
  if (!isHeader(headerValue.value)) return invalid('its header is not exactly alg, kid and typ');
  const payloadValue = readJson(payload);
  if ('fault' in payloadValue) return invalid(`its payload ${payloadValue.detail}`);
  if (!decodeBase64url(signature)) return invalid('its signature is not canonical base64url');
  return { ...headerValue.value, payload: payloadValue.value };
}

function readJson(part: string): { readonly value: unknown } | Fault {
  const bytes = decodeBase64url(part);
  if (!bytes) return invalid('is not canonical base64url');
  try {
    const text = new TextDecoder('utf-8', { fatal: true, ignoreBOM: true }).decode(bytes);
    const value: unknown = JSON.parse(text);
    return isCanonical(text, value) ? { value } : invalid('is not canonical JSON');
  } catch {
    // Only the decoder and the parser throw here, and both mean the same to the reader.
    return invalid('is not JSON');
  }
}

function isHeader(value: unknown): value is Pick<JwsParts, 'alg' | 'kid' | 'typ'> {
  if (typeof value !== 'object' || value === null) return false;
  const names = Object.keys(value).join();
  return names === 'alg,kid,typ' && Object.values(value).every((member) => typeof member === 'string');
}

async function signatureFault(jws: string, key: PublicKey): Promise<Fault | null> {
  try {
    await compactVerify(jws, await importPublicKey(key), { algorithms: [ALGORITHM] });
    return null;
  } catch (error) {
    if (error instanceof errors.JWSSignatureVerificationFailed)
      return invalid('its signature does not fit its content');
    // Old browsers lack Ed25519, and pages that are not served securely lack all of WebCrypto.
    if (error instanceof Error) return invalid(`its signature could not be checked here (${error.message})`);
    throw error;
  }
}
