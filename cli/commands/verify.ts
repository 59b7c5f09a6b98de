import { readFile } from 'node:fs/promises';
import { resolve } from 'node:path';
import { visible } from '../../core/diagnostics/display-text.ts';
import { evaluateSheet } from '../../core/evaluate/evaluate-sheet.ts';
import type { Verification } from '../../core/seal/model.ts';
import { verifyBundle } from '../../core/seal/verify-bundle.ts';
import { CommandFailure, EXIT, type ExitStatus } from '../exit-status.ts';
import type { Invocation } from '../program.ts';

/** Checks a bundle offline: nothing but the file is read. */
export async function verify(
  bundle: string,
  { key, format }: { readonly key?: string; readonly format: 'text' | 'json' },
  at: Invocation,
): Promise<ExitStatus> {
  const bytes = await readBundle(bundle, at);
  const verification = await verifyBundle(
    bytes,
    (files, entry) => evaluateSheet({ entry, files }),
    key === undefined ? {} : { serverKey: key },
  );
  at.streams.out(
    format === 'json'
      ? `${JSON.stringify({ antinode: 'verification/1', ...verification }, null, 2)}\n`
      : verificationText(verification, at),
  );
  if (verification.valid) return EXIT.done;
  return verification.manifest === undefined ? EXIT.sheetWrong : EXIT.checkFails;
}

async function readBundle(bundle: string, at: Invocation): Promise<Uint8Array> {
  if (bundle === '-') return at.streams.readStdin();
  return readFile(resolve(at.cwd, bundle)).catch((cause: NodeJS.ErrnoException) => {
    const reason =
      cause.code === 'EISDIR' ? 'it is a folder' : cause.code === 'ENOENT' ? 'there is no such file' : cause.code;
    throw new CommandFailure(EXIT.sheetWrong, `\`${bundle}\` cannot be read: ${reason}`);
  });
}

function verificationText(
  { valid, proofs, signers, serverKey, manifest }: Verification,
  { paintOut }: Invocation,
): string {
  const rows = proofs.map(({ subject, holds, detail, fault }) => {
    const mark = holds ? paintOut('green', '✓') : paintOut('red', '✗');
    const kind = fault === undefined ? '' : `${fault}: `;
    return `${mark} ${visible(subject)}: ${kind}${visible(detail)}`;
  });
  const people = signers.map(({ role, name, email, time }) =>
    visible(`  ${role.padEnd(9)} ${name} <${email}>, ${time}`),
  );
  const what = manifest === undefined ? '' : visible(`${manifest.number} revision ${manifest.revision}`);
  const [first] = proofs.filter(({ holds }) => !holds);
  const verdict = valid
    ? paintOut(['green', 'bold'], `valid: ${what}`)
    : paintOut(
        ['red', 'bold'],
        `refused: ${visible(first === undefined ? 'it proves nothing' : `${first.subject}: ${first.detail}`)}`,
      );
  const key = serverKey === undefined ? [] : [visible(`  server key ${serverKey}`)];
  return `${[...rows, '', ...people, ...key, ...(people.length + key.length > 0 ? [''] : []), verdict].join('\n')}\n`;
}
