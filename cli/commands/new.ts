import { mkdir, readdir, writeFile } from 'node:fs/promises';
import { dirname, join, relative, resolve } from 'node:path';
import { CommandFailure, EXIT, type ExitStatus } from '../exit-status.ts';
import type { Invocation } from '../program.ts';
import { BASIS_TEMPLATE, CONDITIONS_TEMPLATE } from '../templates/basis.ts';
import { RANGE_SHEET_TEMPLATE } from '../templates/range-sheet.ts';
import { SHEET_TEMPLATE } from '../templates/sheet.ts';

/** A folder with first sheets. An existing folder must be empty, so that nothing of the user's is overwritten. */
export async function newStudy(folder: string, at: Invocation): Promise<ExitStatus> {
  const path = resolve(at.cwd, folder);
  const existing = await readdir(path).catch((cause: NodeJS.ErrnoException) => {
    if (cause.code === 'ENOENT') return [];
    throw new CommandFailure(
      EXIT.usage,
      `\`${folder}\` cannot be made: ${cause.code === 'ENOTDIR' ? 'it is a file' : String(cause.code)}`,
    );
  });
  if (existing.length > 0)
    throw new CommandFailure(EXIT.usage, `the folder \`${folder}\` is not empty`, ['name a new folder']);
  await mkdir(path, { recursive: true });
  for (const [name, text] of STUDY) await writeNew(join(path, name), text, at);
  const sheets = ['shaking-force.yaml', 'operating-range.yaml'].map((name) => relative(at.cwd, join(path, name)));
  at.streams.err(`Next: antinode run ${sheets[0]}, then antinode run ${sheets[1]}\n`);
  return EXIT.done;
}

export async function newSheet(file: string, at: Invocation): Promise<ExitStatus> {
  const path = resolve(at.cwd, file);
  await writeNew(path, SHEET_TEMPLATE, at);
  at.streams.err(`Next: antinode run ${relative(at.cwd, path)}\n`);
  return EXIT.done;
}

/** Files of a new study: a sheet for one condition, and one for all of them with what it uses. */
const STUDY: readonly (readonly [name: string, text: string])[] = [
  ['shaking-force.yaml', SHEET_TEMPLATE],
  ['operating-range.yaml', RANGE_SHEET_TEMPLATE],
  ['basis.yaml', BASIS_TEMPLATE],
  ['conditions.csv', CONDITIONS_TEMPLATE],
];

async function writeNew(path: string, text: string, at: Invocation): Promise<void> {
  const shown = relative(at.cwd, path);
  const refuse = (reason: string): never => {
    throw new CommandFailure(EXIT.usage, `\`${shown}\` ${reason}`);
  };
  await mkdir(dirname(path), { recursive: true }).catch((cause: NodeJS.ErrnoException) =>
    refuse(`cannot be written: ${cause.code ?? cause.message}`),
  );
  await writeFile(path, text, { flag: 'wx' }).catch((cause: NodeJS.ErrnoException) =>
    refuse(cause.code === 'EEXIST' ? 'exists already' : `cannot be written: ${cause.code ?? cause.message}`),
  );
  at.streams.out(`${shown}\n`);
}
