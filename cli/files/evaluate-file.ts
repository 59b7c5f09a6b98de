import { evaluateSheet } from '../../core/evaluate/evaluate-sheet.ts';
import type { EvaluateRequest, Evaluation, Override } from '../../core/evaluate/request.ts';
import type { LocatedDiagnostic } from '../../core/report/model.ts';
import { CommandFailure, EXIT } from '../exit-status.ts';
import type { Surroundings } from '../terminal.ts';
import { readSheetFiles } from './read-sheet-files.ts';

/** How a command wants its sheet evaluated; the options carry these names on the command line too. */
export interface EvaluateOptions {
  /** `name=value`, each in place of what the sheet says. */
  readonly set?: readonly string[];
  readonly units?: 'us' | 'si';
  /** One operating condition instead of all. */
  readonly condition?: string;
}

/** Reads and evaluates a sheet. What is wrong with the file comes back as a diagnostic, like what is wrong in it. */
export async function evaluateFile(
  file: string,
  options: EvaluateOptions,
  surroundings: Surroundings,
): Promise<Evaluation> {
  const read = await readRequest(file, options, surroundings);
  return 'fault' in read ? { report: null, diagnostics: [read.fault] } : evaluateSheet(read.request);
}

/** What is to be evaluated: the sheet with all files that it uses, and the options. */
export async function readRequest(
  file: string,
  { set = [], units, condition }: EvaluateOptions,
  surroundings: Surroundings,
): Promise<{ readonly request: EvaluateRequest } | { readonly fault: LocatedDiagnostic }> {
  const overrides = set.map(readOverride);
  const sheet = await readSheetFiles(file, surroundings);
  if ('fault' in sheet) return { fault: sheet.fault };
  const request = {
    ...sheet,
    overrides,
    ...(units === undefined ? {} : { units }),
    ...(condition === undefined ? {} : { condition }),
  };
  return { request };
}

function readOverride(text: string): Override {
  const [name, value] = [text.slice(0, text.indexOf('=')).trim(), text.slice(text.indexOf('=') + 1).trim()];
  if (text.includes('=') && name !== '' && value !== '') return { name, value };
  throw new CommandFailure(EXIT.usage, `\`--set ${text}\` does not name an input and its value`, [
    'write `--set p_d=915psig`, or `--set "p_d=915 psig"`',
  ]);
}
