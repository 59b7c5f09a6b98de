import { writeFile } from 'node:fs/promises';
import { resolve } from 'node:path';
import type { Evaluation } from '../../core/evaluate/request.ts';
import type { Report } from '../../core/report/model.ts';
import { CORE_VERSION } from '../../core/version.ts';
import type { RunOptions } from '../evaluating-commands.ts';
import { CommandFailure, EXIT, type ExitStatus } from '../exit-status.ts';
import { evaluateFile } from '../files/evaluate-file.ts';
import { diagnosticsText } from '../output/print-diagnostics.ts';
import { reportText } from '../output/report-text.ts';
import type { Invocation } from '../program.ts';
import { diagnosticsStatus } from './lint.ts';

/** Evaluates a sheet and writes its report; the checks decide the exit status. */
export async function run(file: string, options: RunOptions, at: Invocation): Promise<ExitStatus> {
  const evaluation = await evaluateFile(file, options, at);
  const { report, diagnostics } = evaluation;
  if (diagnostics.length > 0) at.streams.err(diagnosticsText(diagnostics, at.paintErr));
  if (report === null) {
    if (options.format === 'json') await answer(jsonText(failedReport(evaluation)), options, at);
    return EXIT.sheetWrong;
  }
  await answer(await rendered(report, options, at), options, at);
  const status = diagnosticsStatus(diagnostics, options.strict === true);
  if (status !== EXIT.done) return status;
  return report.summary.failed > 0 ? EXIT.checkFails : EXIT.done;
}

async function rendered(report: Report, { format, out }: RunOptions, at: Invocation): Promise<string> {
  switch (format) {
    case 'json':
      return jsonText(report);
    case 'csv':
      return (await import('../output/report-csv.ts')).reportCsv(report);
    case 'html':
      return (await import('../output/report-html.ts')).reportHtml(report);
    case 'text':
      return reportText(report, out === undefined || out === '-' ? at.paintOut : (_, text) => text);
  }
}

async function answer(text: string, { out }: RunOptions, at: Invocation): Promise<void> {
  if (out === undefined || out === '-') {
    at.streams.out(text);
    return;
  }
  const path = resolve(at.cwd, out);
  await writeFile(path, text).catch((cause: NodeJS.ErrnoException) => {
    throw new CommandFailure(EXIT.usage, `\`${out}\` cannot be written: ${cause.code ?? cause.message}`);
  });
  at.streams.err(`written to ${out}\n`);
}

function jsonText(report: unknown): string {
  return `${JSON.stringify(report, null, 2)}\n`;
}

/** What machines read of a sheet that is wrong: the same shape, with nothing in it but the diagnostics. */
function failedReport({ diagnostics }: Evaluation): unknown {
  return {
    antinode: 'report/1',
    core: CORE_VERSION,
    sheet: { number: '', title: '', digest: '' },
    quantities: {},
    checks: [],
    holds: [],
    diagnostics,
  };
}
