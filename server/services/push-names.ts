import { hasLoneSurrogate } from '../../core/seal/canonical-json.ts';
import type { Push } from '../../schemas/api.ts';
import { Refusal } from '../problem.ts';

const LONGEST_NAME = 200;
const NUMBER = /^[\p{L}\p{N}](?:[\p{L}\p{N} ._-]{0,78}[\p{L}\p{N}])?$/u;

/**
 * Names of files come from outside and go into bundles, which people unpack: plain relative paths without anything that a
 * file system reads as more than a name. The text must be Unicode that the database and a digest can hold.
 */
export function checkFiles({ entry, files }: Pick<Push, 'entry' | 'files'>): void {
  const names = files.map(({ name }) => name);
  const bad = names.find((name) => !isSaneName(name));
  if (bad !== undefined) {
    throw new Refusal('bad-file-name', `${JSON.stringify(bad)} is not a plain relative path with slashes`);
  }
  if (new Set(names.map((name) => name.toLowerCase())).size !== names.length) {
    throw new Refusal('bad-file-name', 'two files have the same name');
  }
  if (!names.includes(entry))
    throw new Refusal('bad-file-name', `the sheet ${JSON.stringify(entry)} is not among the files`);
  const unreadable = files.find(({ text }) => text.includes('\0') || hasLoneSurrogate(text));
  if (unreadable) throw new Refusal('bad-body', `${unreadable.name} holds characters that no text file can hold`);
}

function isSaneName(name: string): boolean {
  if (name.length > LONGEST_NAME || hasLoneSurrogate(name)) return false;
  if (/[\p{Cc}\p{Cf}\\:*?"<>|]/u.test(name)) return false;
  return name.split('/').every((part) => part !== '' && part !== '.' && part !== '..' && part === part.trim());
}

/** The number of a sheet stands in addresses and in names of files. */
export function checkNumber(number: string): void {
  if (NUMBER.test(number)) return;
  throw new Refusal(
    'bad-number',
    `the document number ${JSON.stringify(number)} must be of letters, digits, blanks, dots, dashes and underscores, at most 80`,
  );
}
