import { existsSync } from 'node:fs';
import { resolve } from 'node:path';
import type { Evaluation } from '../../core/evaluate/request.ts';
import { compareRevisions } from '../../core/report/compare-revisions.ts';
import type { RevisionDetail } from '../../schemas/api.ts';
import type { CompareOptions } from '../evaluating-commands.ts';
import { EXIT, type ExitStatus } from '../exit-status.ts';
import { evaluateFile } from '../files/evaluate-file.ts';
import { comparisonText } from '../output/comparison-text.ts';
import { writeFaults } from '../output/print-diagnostics.ts';
import type { Invocation } from '../program.ts';
import { requireApi } from '../remote/api.ts';
import { requireCredentials } from '../remote/credentials.ts';
import { onlyStudy } from '../remote/only-study.ts';
import { referenceOf, revisionPath } from '../remote/reference.ts';

/** Says what changed from one sheet or revision to another. Warnings of either are for `lint` and `run`. */
export async function compare(
  before: string,
  after: string,
  options: CompareOptions,
  at: Invocation,
): Promise<ExitStatus> {
  const [a, b] = [await reportOf(before, options, at), await reportOf(after, options, at)];
  if (a.report === null || b.report === null) {
    const wrong = [a, b].filter(({ report }) => report === null);
    writeFaults(
      wrong.flatMap(({ diagnostics }) => diagnostics),
      options.format,
      at,
    );
    return EXIT.sheetWrong;
  }
  const comparison = compareRevisions(a.report, b.report);
  at.streams.out(
    options.format === 'json' ? `${JSON.stringify(comparison, null, 2)}\n` : comparisonText(comparison, at.paintOut),
  );
  return EXIT.done;
}

/** The report of a sheet; or, where no file has that name, the recorded one of a revision on the server. */
async function reportOf(named: string, options: CompareOptions, at: Invocation): Promise<Evaluation> {
  const isRevision = /^[^/@]+@[^/@]+$/.test(named) && !existsSync(resolve(at.cwd, named));
  if (!isRevision) return evaluateFile(named, options, at);
  const credentials = await requireCredentials(at);
  const study = options.study ?? (await onlyStudy(credentials));
  const path = revisionPath(study, referenceOf(named));
  const { report } = await requireApi<RevisionDetail>({ ...credentials, path });
  return { report, diagnostics: [] };
}
