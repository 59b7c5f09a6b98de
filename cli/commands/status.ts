import type { RevisionSummary, StudyDetail, StudySummary } from '../../schemas/api.ts';
import { EXIT, type ExitStatus } from '../exit-status.ts';
import { harmless } from '../output/harmless.ts';
import { count } from '../output/print-diagnostics.ts';
import type { Invocation } from '../program.ts';
import { requireApi } from '../remote/api.ts';
import { requireCredentials } from '../remote/credentials.ts';

/** The newest revision of each sheet of the person's studies (or of one), and what it waits for. */
export async function status(
  study: string | undefined,
  { format }: { readonly format: 'text' | 'json' },
  at: Invocation,
): Promise<ExitStatus> {
  const credentials = await requireCredentials(at);
  const ids =
    study === undefined
      ? (await requireApi<StudySummary[]>({ ...credentials, path: '/studies' })).map((summary) => summary.study)
      : [study];
  const details: StudyDetail[] = [];
  for (const id of ids) {
    details.push(await requireApi<StudyDetail>({ ...credentials, path: `/studies/${encodeURIComponent(id)}` }));
  }
  const data = details.map(({ study: id, title, sheets }) => ({ study: id, title, sheets }));
  if (format === 'json') at.streams.out(`${JSON.stringify({ antinode: 'status/1', studies: data }, null, 2)}\n`);
  else
    at.streams.out(
      data.length === 0
        ? 'you are in no study\n'
        : `${harmless(data)
            .map((entry) => studyText(entry, at))
            .join('\n\n')}\n`,
    );
  return EXIT.done;
}

function studyText(
  { study, title, sheets }: Pick<StudyDetail, 'study' | 'title' | 'sheets'>,
  { paintOut }: Invocation,
): string {
  if (sheets.length === 0)
    return `${paintOut('bold', title)} (${study})\n  no sheets yet: antinode push FILE --study ${study}`;
  const number = Math.max(...sheets.map((sheet) => sheet.number.length));
  const rows = sheets.map((sheet) => `  ${sheet.number.padEnd(number)}  ${sheet.revision}  ${sheetText(sheet)}`);
  return [`${paintOut('bold', title)} (${study})`, ...rows].join('\n');
}

function sheetText({ state, waitsOn, governing, failed, holds, remarks, title }: RevisionSummary): string {
  const facts = [
    ...(governing === null ? [] : [`governs ${governing.utilisation.toFixed(2)}`]),
    ...(failed > 0 ? [`${count(failed, 'check')} over`] : []),
    ...(holds > 0 ? [`${count(holds, 'hold')} open`] : []),
    ...(remarks.open > 0 ? [`${count(remarks.open, 'remark')} open`] : []),
  ];
  const waits = waitsOn === '' ? '' : `, waits on ${waitsOn}`;
  return `${state}${waits}  ${title}${facts.length > 0 ? `  (${facts.join(', ')})` : ''}`;
}
