import { basename, dirname } from 'node:path';
import { evaluateSheet } from '../../core/evaluate/evaluate-sheet.ts';
import type { Report } from '../../core/report/model.ts';
import type { Problem, Push, RevisionSummary, StudySummary } from '../../schemas/api.ts';
import { CommandFailure, EXIT, type ExitStatus } from '../exit-status.ts';
import { readSheetFilesIn } from '../files/read-sheet-files.ts';
import { count, diagnosticsText } from '../output/print-diagnostics.ts';
import type { Invocation } from '../program.ts';
import { callApi, refusalFailure, requireApi } from '../remote/api.ts';
import { requireCredentials, type Credentials } from '../remote/credentials.ts';

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
  const study = options.study ?? (await onlyStudy(credentials));
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

/** The study of the person, where there is only one in which sheets may be pushed. */
async function onlyStudy(credentials: Credentials): Promise<string> {
  const studies = await requireApi<StudySummary[]>({ ...credentials, path: '/studies' });
  const mine = studies.filter(({ roles }) => roles.includes('engineer'));
  const [only] = mine;
  if (only !== undefined && mine.length === 1) return only.study;
  const reason = mine.length === 0 ? 'you are an engineer of no study' : 'you are an engineer of several studies';
  throw new CommandFailure(
    EXIT.usage,
    reason,
    mine.map(({ study, title }) => `--study ${study}  (${title})`),
  );
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
