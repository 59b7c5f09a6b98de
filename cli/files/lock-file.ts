import { readFile, rename, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { readLock, type LockFile } from '../../core/evaluate/lock.ts';
import { LOCK_FILE } from '../../core/sheet/file-names.ts';
import type { RevisionValues } from '../../schemas/api.ts';
import { CommandFailure, EXIT } from '../exit-status.ts';

/** Puts revisions into the lock file of a folder; what it holds besides stays. Gives the path of the file. */
export async function lockRevisions(folder: string, revisions: readonly RevisionValues[]): Promise<string> {
  const path = join(folder, LOCK_FILE);
  const before = await readFile(path, 'utf8').catch((cause: NodeJS.ErrnoException) => {
    if (cause.code === 'ENOENT') return undefined;
    throw new CommandFailure(EXIT.usage, `\`${path}\` cannot be read: ${cause.code ?? cause.message}`);
  });
  const known = entriesOf(before, path);
  for (const { number, revision, manifestDigest, newest, quantities } of revisions) {
    known[`${number}@${revision}`] = { digest: manifestDigest, ...(newest === null ? {} : { newest }), quantities };
  }
  const sorted = Object.fromEntries(Object.entries(known).sort(([a], [b]) => (a < b ? -1 : 1)));
  const text = `${JSON.stringify({ antinode: 'lock/1', revisions: sorted }, null, 2)}\n`;
  // Whoever reads meanwhile sees the old file or the new one, never half of it.
  const draft = `${path}.${process.pid}.new`;
  await writeFile(draft, text).catch((cause: NodeJS.ErrnoException) => {
    throw new CommandFailure(EXIT.usage, `\`${path}\` cannot be written: ${cause.code ?? cause.message}`);
  });
  await rename(draft, path);
  return path;
}

type Entries = { -readonly [K in keyof LockFile['revisions']]: LockFile['revisions'][K] };

function entriesOf(text: string | undefined, path: string): Entries {
  if (text === undefined) return {};
  if (readLock(text) !== null) return { ...(JSON.parse(text) as LockFile).revisions };
  throw new CommandFailure(EXIT.usage, `\`${path}\` is not a lock file`, ['move it away, and pull again']);
}
