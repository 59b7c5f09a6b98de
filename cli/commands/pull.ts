import { mkdir, readdir, writeFile } from 'node:fs/promises';
import { dirname, join, relative, resolve } from 'node:path';
import { parseSheet } from '../../core/sheet/parse-sheet.ts';
import type { RevisionDetail, RevisionValues } from '../../schemas/api.ts';
import { CommandFailure, EXIT, type ExitStatus } from '../exit-status.ts';
import { lockRevisions } from '../files/lock-file.ts';
import { readSource } from '../files/read-source.ts';
import { harmlessText } from '../output/harmless.ts';
import type { Invocation } from '../program.ts';
import { requireApi, requireText } from '../remote/api.ts';
import { referenceOf, revisionPath, type Reference } from '../remote/reference.ts';
import { requireCredentials, type Credentials } from '../remote/credentials.ts';
import { onlyStudy } from '../remote/only-study.ts';

export interface PullOptions {
  readonly all?: string;
  readonly study?: string;
  readonly lock: string;
  readonly files?: string;
  readonly format: 'text' | 'json';
}

/** Fetches the values of revisions into the lock file beside the sheet that takes them. */
export async function pull(revision: string | undefined, options: PullOptions, at: Invocation): Promise<ExitStatus> {
  const references = await referencesOf(revision, options, at);
  const folder = resolve(at.cwd, options.all === undefined ? options.lock : dirname(options.all));
  const credentials = await requireCredentials(at);
  const study = options.study ?? (await onlyStudy(credentials));
  const values: RevisionValues[] = [];
  for (const reference of references) {
    values.push(await requireApi<RevisionValues>({ ...credentials, path: `${revisionPath(study, reference)}/values` }));
  }
  const lock = relative(at.cwd, await lockRevisions(folder, values));
  const [only] = references;
  if (options.files !== undefined && only !== undefined) await writeFiles(only, study, options.files, credentials, at);
  at.streams.out(options.format === 'json' ? json(study, lock, values) : text(lock, values));
  return EXIT.done;
}

async function referencesOf(
  revision: string | undefined,
  { all, files }: PullOptions,
  at: Invocation,
): Promise<readonly Reference[]> {
  if ((revision === undefined) === (all === undefined)) {
    throw new CommandFailure(EXIT.usage, 'say what to pull: a revision, or `--all` and a sheet', [
      '`antinode pull TH3-C-102@B`, or `antinode pull --all sheet.yaml`',
    ]);
  }
  if (revision !== undefined) return [referenceOf(revision)];
  if (files !== undefined) throw new CommandFailure(EXIT.usage, '`--files` is for one revision');
  return takenBy(all ?? '', at);
}

/** The revisions that a sheet takes values from, each once. */
async function takenBy(file: string, at: Invocation): Promise<readonly Reference[]> {
  const source = await readSource(file, at);
  if ('fault' in source) throw new CommandFailure(EXIT.usage, source.fault.message, source.fault.hints);
  const { value: sheet } = parseSheet(source.name, source.text);
  const references = (sheet?.take ?? []).map(({ from }) => from.text.replace(/#.*$/, ''));
  if (references.length === 0) throw new CommandFailure(EXIT.usage, `\`${file}\` takes nothing from other sheets`);
  return [...new Set(references)].map(referenceOf);
}

/** Writes the source files and the report of a revision into a folder that holds nothing yet. */
async function writeFiles(
  reference: Reference,
  study: string,
  folder: string,
  credentials: Credentials,
  at: Invocation,
): Promise<void> {
  const path = resolve(at.cwd, folder);
  await mkdir(path, { recursive: true });
  if ((await readdir(path)).length > 0)
    throw new CommandFailure(EXIT.usage, `the folder \`${folder}\` is not empty`, ['name a new folder']);
  const { files, report } = await requireApi<RevisionDetail>({ ...credentials, path: revisionPath(study, reference) });
  for (const name of files) {
    if (!isSaneName(name))
      throw new CommandFailure(EXIT.server, `the server names a file \`${harmlessText(name)}\`, which leads out`);
    const call = { ...credentials, path: `${revisionPath(study, reference)}/files/${encodeURIComponent(name)}` };
    await mkdir(dirname(join(path, name)), { recursive: true });
    await writeFile(join(path, name), await requireText(call));
  }
  await writeFile(join(path, 'report.json'), `${JSON.stringify(report, null, 2)}\n`);
  at.streams.err(`written to ${folder}\n`);
}

/** Names come from a server: none may lead out of the folder. */
function isSaneName(name: string): boolean {
  return !/[\\:]/.test(name) && name.split('/').every((part) => part !== '' && part !== '.' && part !== '..');
}

function text(lock: string, values: readonly RevisionValues[]): string {
  return values
    .map(({ number, revision, state, quantities, newest }) => {
      const later = newest === null ? '' : `; revision ${newest} is approved since`;
      return harmlessText(
        `${number}@${revision} (${state}): ${Object.keys(quantities).length} values in ${lock}${later}`,
      );
    })
    .join('\n')
    .concat('\n');
}

function json(study: string, lock: string, values: readonly RevisionValues[]): string {
  const revisions = values.map(({ number, revision, state, manifestDigest, newest }) => ({
    number,
    revision,
    state,
    manifestDigest,
    newest,
  }));
  return `${JSON.stringify({ antinode: 'pull/1', study, lock, revisions }, null, 2)}\n`;
}
