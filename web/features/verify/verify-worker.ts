/**
 * Verifies a bundle away from the page: it may evaluate a hostile sheet, and must be stoppable. Reads what it is sent,
 * and answers once; it has no network business of any kind.
 */
import { evaluateSheet } from '../../../core/evaluate/evaluate-sheet.ts';
import type { Bundle } from '../../../core/seal/model.ts';
import { verifyBundle } from '../../../core/seal/verify-bundle.ts';
import type { VerifyAnswer, VerifyRequest } from './protocol.ts';

self.addEventListener('message', (event: MessageEvent<VerifyRequest>) => {
  verify(event.data).then(
    (answer) => self.postMessage(answer),
    (error: unknown) => self.postMessage({ kind: 'failed', message: String(error) } satisfies VerifyAnswer),
  );
});

async function verify({ file, serverKey }: VerifyRequest): Promise<VerifyAnswer> {
  const verification = await verifyBundle(file, (files, entry) => evaluateSheet({ files, entry }), { serverKey });
  // Only a valid bundle's report is worth reading; its form has been proved by then.
  const report = verification.valid ? (JSON.parse(new TextDecoder().decode(file)) as Bundle).report : null;
  return { kind: 'verified', verification, report };
}
