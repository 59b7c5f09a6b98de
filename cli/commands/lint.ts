import { evaluateSheet } from '../../core/evaluate/evaluate-sheet.ts';
import type { LocatedDiagnostic } from '../../core/report/model.ts';
import { EXIT, type ExitStatus } from '../exit-status.ts';
import { readSource } from '../files/read-source.ts';
import { count, diagnosticsText } from '../output/print-diagnostics.ts';
import type { Invocation } from '../program.ts';

export async function lint(
  files: readonly string[],
  options: { readonly format: 'text' | 'json'; readonly strict?: true },
  { streams, paintErr, ...surroundings }: Invocation,
): Promise<ExitStatus> {
  const diagnostics: LocatedDiagnostic[] = [];
  for (const file of files) {
    const source = await readSource(file, { streams, ...surroundings });
    if ('fault' in source) diagnostics.push(source.fault);
    else diagnostics.push(...evaluateSheet({ entry: source.name, files: [source] }).diagnostics);
  }
  if (options.format === 'json')
    streams.out(`${JSON.stringify({ antinode: 'diagnostics/1', diagnostics }, null, 2)}\n`);
  else if (diagnostics.length > 0) streams.err(diagnosticsText(diagnostics, paintErr));
  else streams.err(`${count(files.length, 'sheet')}: nothing to report\n`);
  return diagnosticsStatus(diagnostics, options.strict === true);
}

/** Warnings do not change the exit status, unless they are asked to. */
export function diagnosticsStatus(diagnostics: readonly LocatedDiagnostic[], strict: boolean): ExitStatus {
  const wrong = diagnostics.some(({ severity }) => severity === 'error' || (strict && severity === 'warning'));
  return wrong ? EXIT.sheetWrong : EXIT.done;
}
