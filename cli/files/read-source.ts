import { readdir, readFile, stat } from 'node:fs/promises';
import { basename, dirname, relative, resolve } from 'node:path';
import { error, type Diagnostic } from '../../core/diagnostics/diagnostic.ts';
import { locateDiagnostic } from '../../core/diagnostics/locate.ts';
import { nearest } from '../../core/diagnostics/nearest.ts';
import type { LocatedDiagnostic } from '../../core/report/model.ts';
import type { Surroundings } from '../terminal.ts';

/** A sheet is text that people write; the server takes no more either. */
const MAX_BYTES = 1_000_000;

export type ReadSource =
  { readonly name: string; readonly text: string } | { readonly name: string; readonly fault: LocatedDiagnostic };

/** Reads a sheet from a file, or from standard input for `-`. What is wrong with the file comes back as a diagnostic. */
export async function readSource(file: string, surroundings: Surroundings): Promise<ReadSource> {
  if (file === '-') return decode('<stdin>', await surroundings.streams.readStdin());
  const path = resolve(surroundings.cwd, file);
  const name = relative(surroundings.cwd, path) || basename(path);
  const found = await stat(path).catch((cause: unknown) => cause as NodeJS.ErrnoException);
  if (found instanceof Error) return { name, fault: await notFound(name, path, found) };
  if (found.isDirectory()) {
    return at(
      name,
      error('FILE_NOT_READABLE', start(name), `\`${name}\` is a folder`, { hints: ['name the sheet in it'] }),
    );
  }
  if (found.size > MAX_BYTES) return tooLarge(name, found.size);
  const bytes = await readFile(path).catch((cause: unknown) => cause as NodeJS.ErrnoException);
  if (bytes instanceof Error)
    return at(name, error('FILE_NOT_READABLE', start(name), `\`${name}\` cannot be read: ${reason(bytes)}`));
  return decode(name, bytes);
}

function decode(name: string, bytes: Uint8Array): ReadSource {
  if (bytes.length > MAX_BYTES) return tooLarge(name, bytes.length);
  try {
    return { name, text: new TextDecoder('utf-8', { fatal: true, ignoreBOM: true }).decode(bytes) };
  } catch {
    return notUtf8(name, bytes);
  }
}

/** Points at the first byte that is not UTF-8, in the text as far as it could be read. */
function notUtf8(name: string, bytes: Uint8Array): ReadSource {
  const text = new TextDecoder('utf-8').decode(bytes);
  const offset = Math.max(text.indexOf('\uFFFD'), 0);
  const diagnostic = error(
    'FILE_NOT_UTF8',
    { file: name, start: offset, end: offset + 1 },
    'the file is not UTF-8 text',
    {
      hints: ['save it as UTF-8 (without a byte order mark)'],
    },
  );
  return { name, fault: locateDiagnostic(diagnostic, () => text) };
}

function tooLarge(name: string, size: number): ReadSource {
  const message = `the file has ${size.toLocaleString('en-GB')} bytes, more than ${MAX_BYTES.toLocaleString('en-GB')}`;
  return at(name, error('FILE_TOO_LARGE', start(name), message, { hints: ['split the sheet'] }));
}

async function notFound(name: string, path: string, cause: NodeJS.ErrnoException): Promise<LocatedDiagnostic> {
  if (cause.code !== 'ENOENT' && cause.code !== 'ENOTDIR') {
    return locateDiagnostic(
      error('FILE_NOT_READABLE', start(name), `\`${name}\` cannot be read: ${reason(cause)}`),
      () => '',
    );
  }
  const siblings = await readdir(dirname(path)).catch(() => []);
  const near = nearest(basename(path), siblings);
  const hints = near.length > 0 ? [`did you mean \`${near.join('`, `')}\`?`] : [];
  return locateDiagnostic(error('FILE_NOT_FOUND', start(name), `there is no file \`${name}\``, { hints }), () => '');
}

function reason(cause: NodeJS.ErrnoException): string {
  return cause.code === 'EACCES' ? 'permission denied' : (cause.code ?? cause.message);
}

function start(file: string): { file: string; start: number; end: number } {
  return { file, start: 0, end: 0 };
}

function at(name: string, diagnostic: Diagnostic): ReadSource {
  return { name, fault: locateDiagnostic(diagnostic, () => '') };
}
