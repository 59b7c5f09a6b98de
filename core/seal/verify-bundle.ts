import type { Proof, Verification } from './model.ts';
import { proveContent } from './prove-content.ts';
import { proveLog } from './prove-log.ts';
import { provePeople } from './prove-people.ts';
import { proveEvaluation, proveHolds, type Evaluate } from './prove-result.ts';
import { proveSeal, proveServerKey } from './prove-seal.ts';
import { proveSignatures } from './prove-signatures.ts';
import { readBundle } from './read-bundle.ts';

export interface VerifyOptions {
  /** Id of the server key that the reader trusts; without it the key is trusted as carried, and the proof says so. */
  readonly serverKey?: string | undefined;
}

/**
 * Verifies a bundle offline. Every proof is made that can be made, even after others have failed, and each says what it
 * shows or why it fails. A bundle of any content, hostile or damaged, leads to proofs and never to an exception.
 *
 *   file ── form ──► content ──► signatures ──► people ──► server key ──► log ──► seal ──► holds ──► evaluated again
 *
 * Prefer to pass the file's bytes: a lenient reading as text may hide a damaged byte or a byte order mark.
 */
export async function verifyBundle(
  file: string | Uint8Array,
  evaluate: Evaluate,
  { serverKey }: VerifyOptions = {},
): Promise<Verification> {
  const { bundle, proof: form } = readBundle(file);
  if (!bundle) return conclude([form]);
  const { server } = bundle.keys;
  const serverKeys = new Map([[server.kid, server]]);
  const { proofs: signatures, signers } = await proveSignatures(bundle);
  const proofs = [
    form,
    ...proveContent(bundle),
    ...signatures,
    ...provePeople(signers),
    proveServerKey(server, serverKey),
    ...(await proveLog(bundle, serverKeys, signers)),
    await proveSeal(bundle, serverKeys),
    proveHolds(bundle),
    await proveEvaluation(bundle, evaluate),
  ];
  return { ...conclude(proofs), manifest: bundle.manifest, signers, serverKey: server.kid };
}

function conclude(proofs: readonly Proof[]): Verification {
  return { valid: proofs.every(({ holds }) => holds), proofs, signers: [] };
}
