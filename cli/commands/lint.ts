import { evaluateSheet } from '../../core/evaluate/evaluate-sheet.ts';
import type { LocatedDiagnostic } from '../../core/report/model.ts';
import { EXIT, type ExitStatus } from '../exit-status.ts';
import { readSheetFiles } from '../files/read-sheet-files.ts';
import { harmlessText } from '../output/harmless.ts';
import { count, diagnosticsText } from '../output/print-diagnostics.ts';
import { sarif } from '../output/sarif.ts';
import type { Invocation } from '../program.ts';

export interface LintOptions {
  readonly format: 'text' | 'short' | 'json' | 'sarif';
  readonly strict?: true;
}

export async function lint(files: readonly string[], options: LintOptions, at: Invocation): Promise<ExitStatus> {
  const diagnostics: LocatedDiagnostic[] = [];
  for (const file of files) {
    const sheet = await readSheetFiles(file, at);
    diagnostics.push(...('fault' in sheet ? [sheet.fault] : evaluateSheet(sheet).diagnostics));
  }
  tell(diagnostics, files.length, options, at);
  return diagnosticsStatus(diagnostics, options.strict === true);
}

/** People read diagnostics as a remark on the side; to machines they are the answer. */
function tell(
  diagnostics: readonly LocatedDiagnostic[],
  sheets: number,
  { format }: LintOptions,
  at: Invocation,
): void {
  const { streams, paintErr } = at;
  switch (format) {
    case 'json':
      streams.out(`${JSON.stringify({ antinode: 'diagnostics/1', diagnostics }, null, 2)}\n`);
      return;
    case 'sarif':
      streams.out(sarif(diagnostics));
      return;
    case 'short':
      for (const diagnostic of diagnostics) streams.out(`${shortLine(diagnostic)}\n`);
      return;
    case 'text':
      if (diagnostics.length > 0) streams.err(diagnosticsText(diagnostics, paintErr));
      else streams.err(`${count(sheets, 'sheet')}: nothing to report\n`);
  }
}

/** The form that editors find places by: `file:line:column: error[CODE]: message`. */
function shortLine({ file, line, column, severity, code, message }: LocatedDiagnostic): string {
  return harmlessText(`${file}:${line}:${column}: ${severity}[${code}]: ${message}`.replace(/\s+/g, ' '));
}

/** Warnings do not change the exit status, unless they are asked to. */
export function diagnosticsStatus(diagnostics: readonly LocatedDiagnostic[], strict: boolean): ExitStatus {
  const wrong = diagnostics.some(({ severity }) => severity === 'error' || (strict && severity === 'warning'));
  return wrong ? EXIT.sheetWrong : EXIT.done;
}
