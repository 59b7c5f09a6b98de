import { compareRevisions } from '../../core/report/compare-revisions.ts';
import type { CompareOptions } from '../evaluating-commands.ts';
import { EXIT, type ExitStatus } from '../exit-status.ts';
import { evaluateFile } from '../files/evaluate-file.ts';
import { comparisonText } from '../output/comparison-text.ts';
import { writeFaults } from '../output/print-diagnostics.ts';
import type { Invocation } from '../program.ts';

/** Says what changed from one sheet to another. Warnings of either are for `lint` and `run`. */
export async function compare(
  before: string,
  after: string,
  options: CompareOptions,
  at: Invocation,
): Promise<ExitStatus> {
  const [a, b] = [await evaluateFile(before, options, at), await evaluateFile(after, options, at)];
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
