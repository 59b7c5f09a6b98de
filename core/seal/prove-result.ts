import { compareReports } from '../report/compare-reports.ts';
import type { LocatedDiagnostic, Report } from '../report/model.ts';
import type { Bundle, Proof, SourceFile } from './model.ts';
import { invalid, judge, notAllowed, quote, unless, type Fault } from './verdict.ts';

/** What came of evaluating a sheet; no report when it has errors. */
export interface Evaluation {
  readonly report: Report | null;
  readonly diagnostics: readonly LocatedDiagnostic[];
}

/** Evaluates a sheet from its files. Given by the host, which may do it in a worker. */
export type Evaluate = (files: readonly SourceFile[], entry: string) => Evaluation | Promise<Evaluation>;

const DIFFERENCES_SHOWN = 3;

/** That nothing is left open which an approved revision must not leave open. */
export function proveHolds({ manifest, report }: Bundle): Proof {
  const count = Math.max(manifest.holds, report.summary.holds, report.holds.length);
  const names = report.holds.map(({ name }) => quote(name)).join(', ');
  return judge(
    'No open holds',
    unless(count === 0, notAllowed(`${count} ${count === 1 ? 'hold is' : 'holds are'} open${names && `: ${names}`}`)),
    'every input is confirmed',
  );
}

/** That evaluating the carried files again gives the recorded report, digit for printed digit. */
export async function proveEvaluation({ files, report }: Bundle, evaluate: Evaluate): Promise<Proof> {
  const subject = 'Evaluated again';
  try {
    const again = await evaluate(files, files[0]?.name ?? '');
    if (!again.report) return judge(subject, [invalid(`the files do not evaluate: ${firstError(again)}`)], '');
    const version =
      again.report.core === report.core
        ? `by the same core ${again.report.core}`
        : `by core ${again.report.core}; note that the report was recorded by core ${quote(report.core)}`;
    return judge(subject, differenceFaults(report, again.report), `the same results, ${version}`);
  } catch (error) {
    // A host may stop a hostile sheet that runs too long or takes too much; the other proofs must still be shown.
    const reason = error instanceof Error ? error.message : String(error);
    return judge(subject, [invalid(`the evaluation was stopped: ${reason}`)], '');
  }
}

function firstError({ diagnostics }: Evaluation): string {
  const error = diagnostics.find(({ severity }) => severity === 'error');
  return error ? `${quote(error.file)} line ${error.line}: ${error.message}` : 'no report came of them';
}

function differenceFaults(recorded: Report, again: Report): readonly Fault[] {
  const differences = compareReports(recorded, again);
  if (differences.length === 0) return [];
  const shown = differences.slice(0, DIFFERENCES_SHOWN).map(({ path, yours, ours }) => {
    return `${quote(path)} is recorded as ${quote(yours)} and evaluates to ${quote(ours)}`;
  });
  const more = differences.length > DIFFERENCES_SHOWN ? `, and ${differences.length - DIFFERENCES_SHOWN} more` : '';
  return [invalid(`${shown.join(', ')}${more}`)];
}
