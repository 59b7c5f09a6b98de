import { mkdir, readdir, writeFile } from 'node:fs/promises';
import { dirname, join, relative, resolve } from 'node:path';
import { CommandFailure, EXIT, type ExitStatus } from '../exit-status.ts';
import type { Invocation } from '../program.ts';
import { SHEET_TEMPLATE } from '../templates/sheet.ts';

/** A folder with a first sheet. An existing folder must be empty, so that nothing of the user's is overwritten. */
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
  return writeSheet(join(path, 'shaking-force.yaml'), at);
}

export function newSheet(file: string, at: Invocation): Promise<ExitStatus> {
  return writeSheet(resolve(at.cwd, file), at);
}

async function writeSheet(path: string, at: Invocation): Promise<ExitStatus> {
  const shown = relative(at.cwd, path);
  const refuse = (reason: string): never => {
    throw new CommandFailure(EXIT.usage, `\`${shown}\` ${reason}`);
  };
  await mkdir(dirname(path), { recursive: true }).catch((cause: NodeJS.ErrnoException) =>
    refuse(`cannot be written: ${cause.code ?? cause.message}`),
  );
  await writeFile(path, SHEET_TEMPLATE, { flag: 'wx' }).catch((cause: NodeJS.ErrnoException) =>
    refuse(cause.code === 'EEXIST' ? 'exists already' : `cannot be written: ${cause.code ?? cause.message}`),
  );
  at.streams.out(`${shown}\n`);
  at.streams.err(`Next: antinode run ${shown}\n`);
  return EXIT.done;
}
