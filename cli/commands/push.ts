import { basename, dirname } from 'node:path';
import { evaluateSheet } from '../../core/evaluate/evaluate-sheet.ts';
import type { Report } from '../../core/report/model.ts';
import type { Problem, Push, RevisionSummary } from '../../schemas/api.ts';
import { EXIT, type ExitStatus } from '../exit-status.ts';
import { readSheetFilesIn } from '../files/read-sheet-files.ts';
import { count, diagnosticsText } from '../output/print-diagnostics.ts';
import type { Invocation } from '../program.ts';
import { callApi, refusalFailure } from '../remote/api.ts';
import { requireCredentials, type Credentials } from '../remote/credentials.ts';
import { onlyStudy } from '../remote/only-study.ts';

/** Evaluates the sheet here, and sends sources and report; the server evaluates again and compares. */
export async function push(
  file: string,
  options: { readonly study?: string; readonly format: 'text' | 'json' },
  at: Invocation,
): Promise<ExitStatus> {
  const read = await readSheetFilesIn(dirname(file), basename(file), at);
  if ('fault' in read) {
    at.streams.err(diagnosticsText([read.fault], at.paintErr));
    return EXIT.sheetWrong;
  }
  const { entry, files } = read;
  const { report, diagnostics } = evaluateSheet({ entry, files });
  if (diagnostics.length > 0) at.streams.err(diagnosticsText(diagnostics, at.paintErr));
  if (report === null) return EXIT.sheetWrong;
  const credentials = await requireCredentials(at);
  const study = options.study ?? (await onlyStudy(credentials, 'engineer'));
  const revision = await send({ entry, files: [...files], report }, study, credentials, at);
  at.streams.out(
    options.format === 'json'
      ? `${JSON.stringify({ antinode: 'push/1', revision }, null, 2)}\n`
      : `${revision.number} revision ${revision.revision} pushed to ${study}\n`,
  );
  tellNext(report, revision, credentials, at);
  return EXIT.done;
}

async function send(body: Push, study: string, credentials: Credentials, at: Invocation): Promise<RevisionSummary> {
  const path = `/studies/${encodeURIComponent(study)}/sheets`;
  const answer = await callApi<RevisionSummary>({ ...credentials, method: 'POST', path, body });
  if (answer.ok) return answer.value;
  tellDifferences(answer.problem, at);
  throw refusalFailure(answer.status, answer.problem);
}

function tellDifferences({ differences = [], diagnostics = [] }: Partial<Problem>, at: Invocation): void {
  if (diagnostics.length > 0) at.streams.err(diagnosticsText(diagnostics, at.paintErr));
  for (const { path, yours, ours } of differences) at.streams.err(`  ${path}: ${yours} here, ${ours} on the server\n`);
}

function tellNext(
  report: Report,
  { study, number, revision }: RevisionSummary,
  { server }: Credentials,
  at: Invocation,
): void {
  const { failed, holds } = report.summary;
  if (failed > 0) at.streams.err(`${count(failed, 'check')} of it over the limit\n`);
  if (holds > 0) at.streams.err(`${count(holds, 'hold')} open: it can't be approved yet\n`);
  at.streams.err(`Next: hand it over for checking at ${server}/studies/${study}/sheets/${number}/${revision}\n`);
}
