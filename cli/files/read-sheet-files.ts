import { resolve } from 'node:path';
import type { SourceFile } from '../../core/evaluate/request.ts';
import type { LocatedDiagnostic } from '../../core/report/model.ts';
import { LIMITS } from '../../core/sheet/limits.ts';
import { neededFiles } from '../../core/sheet/needed-files.ts';
import type { Surroundings } from '../terminal.ts';
import { readSource } from './read-source.ts';

export type SheetFiles =
  | { readonly entry: string; readonly files: readonly SourceFile[] }
  | { readonly entry: string; readonly fault: LocatedDiagnostic };

/**
 * Reads a sheet and all files that it uses beside it. A used file that is not there is left out: the evaluation says so
 * at the place that names it.
 */
export async function readSheetFiles(file: string, surroundings: Surroundings): Promise<SheetFiles> {
  const sheet = await readSource(file, surroundings);
  if ('fault' in sheet) return { entry: sheet.name, fault: sheet.fault };
  const files = new Map([[sheet.name, sheet.text]]);
  const waiting = [...neededFiles(sheet.name, sheet.text)];
  for (let name = waiting.shift(); name !== undefined && files.size < LIMITS.files; name = waiting.shift()) {
    if (files.has(name)) continue;
    const used = await readSource(name, surroundings);
    if ('fault' in used) {
      if (used.fault.code !== 'FILE_NOT_FOUND') return { entry: sheet.name, fault: used.fault };
      continue;
    }
    // Messages name a file as the sheet does, whatever the folder the command runs in.
    files.set(name, used.text);
    if (name.endsWith('.yaml') || name.endsWith('.yml')) waiting.push(...neededFiles(name, used.text));
  }
  return { entry: sheet.name, files: [...files].map(([name, text]) => ({ name, text })) };
}

/** The files of a sheet by their names beside it, wherever the command runs: what a server is sent. */
export async function readSheetFilesIn(folder: string, name: string, surroundings: Surroundings): Promise<SheetFiles> {
  return readSheetFiles(name, { ...surroundings, cwd: resolve(surroundings.cwd, folder) });
}
