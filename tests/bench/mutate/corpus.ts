import { readdirSync, readFileSync } from 'node:fs';
import { dirname, join, posix, relative, sep } from 'node:path';
import { SHEET_TEMPLATE } from '../../../cli/templates/sheet.ts';
import type { SourceFile } from '../../../core/evaluate/request.ts';
import { LOCK_FILE } from '../../../core/sheet/file-names.ts';

/** A sheet, and the files beside it that it may use. */
export interface Sheet {
  readonly entry: string;
  readonly files: readonly SourceFile[];
}

const root = join(import.meta.dirname, '../../..');
const FOLDERS = [join(root, 'examples'), join(root, 'tests/bench/corpus')];

/** All sheets there are: the examples, what `new` writes, and the small ones kept for this purpose. In a fixed order. */
export function readCorpus(): Sheet[] {
  return [{ entry: 'new.yaml', files: [{ name: 'new.yaml', text: SHEET_TEMPLATE }] }, ...FOLDERS.flatMap(sheetsIn)];
}

function sheetsIn(folder: string): Sheet[] {
  const files = readdirSync(folder, { recursive: true, encoding: 'utf8' })
    .filter((path) => /\.(yaml|csv|json)$/.test(path))
    .sort()
    .map((path) => ({ path: join(folder, path), text: readFileSync(join(folder, path), 'utf8') }));
  return files
    .filter(({ text }) => /^antinode: sheet\//m.test(text))
    .map((sheet) => {
      const seenFrom = dirname(sheet.path);
      const entry = relative(seenFrom, sheet.path);
      const beside = files.map(({ path, text }) => ({
        name: relative(seenFrom, path).split(sep).join(posix.sep),
        text,
      }));
      return { entry, files: used(entry, beside) };
    });
}

/** The sheet itself, the files whose names stand in its text, and those whose names stand in them. */
function used(entry: string, all: readonly SourceFile[]): SourceFile[] {
  const names = new Set([entry]);
  for (const name of names) {
    const text = all.find((file) => file.name === name)?.text ?? '';
    for (const other of all) if (text.includes(other.name)) names.add(other.name);
    if (/^take:/m.test(text)) names.add(LOCK_FILE);
  }
  return all.filter(({ name }) => names.has(name));
}
