import type { Proof, Verification } from '../../../core/seal/model.ts';
import { Time } from '../../ui/time.tsx';

/** The verdict in one line, and each proof with what it shows. */
export function ProofList({ verification }: { readonly verification: Verification }) {
  const failed = verification.proofs.filter(({ holds }) => !holds);
  return (
    <>
      <p
        role="status"
        className={`border-l-4 bg-sheet px-5 py-4 font-serif text-xl font-semibold ${verification.valid ? 'border-verdigris text-verdigris' : 'border-madder text-madder'}`}
      >
        {verification.valid
          ? `✓ Valid: all ${verification.proofs.length} proofs hold`
          : `▲ Not valid: ${failed.length} of ${verification.proofs.length} proofs ${failed.length === 1 ? 'fails' : 'fail'}`}
      </p>
      {verification.manifest !== undefined && <ManifestFacts verification={verification} />}
      <ol className="mt-8 border-t border-ink">
        {verification.proofs.map((proof, index) => (
          <ProofRow key={index} proof={proof} />
        ))}
      </ol>
    </>
  );
}

function ProofRow({ proof }: { readonly proof: Proof }) {
  return (
    <li className="grid gap-x-6 border-b border-rule py-2.5 sm:grid-cols-[7.5rem_13rem_1fr]">
      <span className={`font-semibold ${proof.holds ? 'text-verdigris' : 'text-madder'}`}>
        {proof.holds ? '✓ holds' : `▲ ${proof.fault ?? 'fails'}`}
      </span>
      <span className="font-medium">{proof.subject}</span>
      <span className="break-words text-pencil">{proof.detail}</span>
    </li>
  );
}

function ManifestFacts({
  verification: { manifest, signers, serverKey, valid },
}: {
  readonly verification: Verification;
}) {
  return (
    <dl className="mt-6 grid gap-x-6 gap-y-1 sm:grid-cols-[7.5rem_1fr]">
      <dt className="text-pencil">{valid ? 'Revision' : 'Says it is'}</dt>
      <dd className="font-semibold">
        {manifest?.number} revision {manifest?.revision}, study {manifest?.study}
      </dd>
      {signers.map((signer) => (
        <div key={signer.kid + signer.role} className="contents">
          <dt className="text-pencil">{signer.role}</dt>
          <dd>
            {signer.name}, {signer.email}, <Time iso={signer.time} precise />
          </dd>
        </div>
      ))}
      {serverKey !== undefined && (
        <>
          <dt className="text-pencil">Server key</dt>
          <dd className="font-mono text-[0.8125rem] break-all">{serverKey}</dd>
        </>
      )}
    </dl>
  );
}
