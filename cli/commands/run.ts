import { writeFile } from 'node:fs/promises';
import { resolve } from 'node:path';
import { evaluateSheet } from '../../core/evaluate/evaluate-sheet.ts';
import type { EvaluateRequest } from '../../core/evaluate/request.ts';
import type { Sensitivity } from '../../core/evaluate/sensitivity.ts';
import type { LocatedDiagnostic, Report } from '../../core/report/model.ts';
import { CORE_VERSION } from '../../core/version.ts';
import type { RunOptions } from '../evaluating-commands.ts';
import { CommandFailure, EXIT, type ExitStatus } from '../exit-status.ts';
import { readRequest } from '../files/evaluate-file.ts';
import { diagnosticsText } from '../output/print-diagnostics.ts';
import { reportText } from '../output/report-text.ts';
import type { Invocation } from '../program.ts';
import { diagnosticsStatus } from './lint.ts';

/** Evaluates a sheet and writes its report; the checks decide the exit status. */
export async function run(file: string, options: RunOptions, at: Invocation): Promise<ExitStatus> {
  if (options.sensitivity === true && options.format !== 'text' && options.format !== 'json') {
    throw new CommandFailure(EXIT.usage, '`--sensitivity` is shown as text or JSON', ['leave `--format` out']);
  }
  if (options.watch !== true) return (await runOnce(file, options, at)).status;
  if (file === '-') throw new CommandFailure(EXIT.usage, 'standard input cannot be watched', ['name a file']);
  const { watchFiles } = await import('../files/watch-files.ts');
  return watchFiles(() => runAgain(file, options, at), at);
}

interface Ran {
  readonly status: ExitStatus;
  /** Names of the files that were read. */
  readonly files: readonly string[];
}

async function runAgain(file: string, options: RunOptions, at: Invocation): Promise<readonly string[]> {
  const start = performance.now();
  const { files } = await runOnce(file, options, at);
  at.streams.err(
    `${at.paintErr('dim', `evaluated in ${(performance.now() - start).toFixed(0)} ms; waiting for changes, Ctrl-C ends`)}\n`,
  );
  return files;
}

async function runOnce(file: string, options: RunOptions, at: Invocation): Promise<Ran> {
  const read = await readRequest(file, options, at);
  if ('fault' in read) return { status: await refuse([read.fault], options, at), files: [file] };
  const { request } = read;
  const files = request.files.map(({ name }) => name);
  const { report, diagnostics } = evaluateSheet(request);
  if (report === null) return { status: await refuse(diagnostics, options, at), files };
  if (diagnostics.length > 0) at.streams.err(diagnosticsText(diagnostics, at.paintErr));
  const sensitivity = options.sensitivity === true ? await sensitivityOf(request) : null;
  await answer(await rendered(report, sensitivity, options, at), options, at);
  return { status: statusOf(report, diagnostics, options), files };
}

async function sensitivityOf(request: EvaluateRequest): Promise<Sensitivity | null> {
  return (await import('../../core/evaluate/sensitivity.ts')).evaluateSensitivity(request);
}

/** A sheet that is wrong: people read why, and machines read the same in the shape of a report. */
async function refuse(
  diagnostics: readonly LocatedDiagnostic[],
  options: RunOptions,
  at: Invocation,
): Promise<ExitStatus> {
  at.streams.err(diagnosticsText(diagnostics, at.paintErr));
  if (options.format === 'json') await answer(jsonText(failedReport(diagnostics)), options, at);
  return EXIT.sheetWrong;
}

function statusOf(report: Report, diagnostics: readonly LocatedDiagnostic[], { strict }: RunOptions): ExitStatus {
  const status = diagnosticsStatus(diagnostics, strict === true);
  if (status !== EXIT.done) return status;
  return report.summary.failed > 0 ? EXIT.checkFails : EXIT.done;
}

async function rendered(
  report: Report,
  sensitivity: Sensitivity | null,
  { format, out }: RunOptions,
  at: Invocation,
): Promise<string> {
  switch (format) {
    case 'json':
      return jsonText(sensitivity === null ? report : { ...report, sensitivity: sensitivity.checks });
    case 'csv':
      return (await import('../output/report-csv.ts')).reportCsv(report);
    case 'html':
      return (await import('../output/report-html.ts')).reportHtml(report);
    case 'text': {
      const paint = out === undefined || out === '-' ? at.paintOut : (_: unknown, text: string) => text;
      const text = reportText(report, paint);
      if (sensitivity === null) return text;
      const { sensitivityText } = await import('../output/text/sensitivity-text.ts');
      return `${text}\n${sensitivityText(sensitivity, paint)}`;
    }
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
function failedReport(diagnostics: readonly LocatedDiagnostic[]): unknown {
  return {
    antinode: 'report/1',
    core: CORE_VERSION,
    sheet: { number: '', title: '', digest: '' },
    axes: [],
    quantities: {},
    checks: [],
    holds: [],
    diagnostics,
  };
}
