import { inclusionProof } from '../../core/seal/merkle.ts';
import type { Manifest, PublicKey } from '../../core/seal/model.ts';
import { sealBundle } from '../../core/seal/seal-bundle.ts';
import type { Person } from '../../schemas/api.ts';
import { Refusal } from '../problem.ts';
import type { Context } from './context.ts';
import { leafHashes, leavesOf, signedHead } from './event-log.ts';
import { membershipIn } from './members.ts';
import { reportOf, sourceFiles, type RevisionRef } from './read-revision.ts';
import { revisionIn, sheetRecord } from './sheet-record.ts';
import { standingSignatures, type SignatureRow } from './signatures.ts';

/** The bundle file of an approved revision: all that is needed to verify it offline. */
export async function bundleOf(context: Context, person: Person, ref: RevisionRef): Promise<string> {
  const { db, serverKey, now } = context;
  await membershipIn(db, person, ref.study);
  const revision = revisionIn(await sheetRecord(db, ref.study, ref.number), ref.revision);
  if (revision.state !== 'approved') {
    const detail = `the revision is ${revision.state}; a bundle is made of approved revisions only, since it carries all three signatures`;
    throw new Refusal('not-approved', detail);
  }
  const events = await leavesOf(db, revision.id);
  const leaves = await leafHashes(db);
  const signatures = await standingSignatures(db, revision.id);
  return sealBundle(
    {
      manifest: JSON.parse(revision.manifest) as Manifest,
      files: await sourceFiles(db, revision.id),
      report: await reportOf(db, revision.reportDigest),
      signatures: signatures.map(({ jws }) => jws),
      keys: { people: signatures.map(publicKey), server: serverKey.publicKey },
      log: {
        head: await signedHead(db, serverKey, leaves, now()),
        entries: events.map((event) => ({ event, proof: inclusionProof(leaves, event.index) })),
      },
    },
    serverKey.signingKey,
  );
}

function publicKey({ kid, x }: SignatureRow): PublicKey {
  return { kty: 'OKP', crv: 'Ed25519', x, kid };
}
