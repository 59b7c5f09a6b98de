import { explainBlock } from '../../core/report/explain.ts';
import type { ExplainOptions } from '../evaluating-commands.ts';
import { CommandFailure, EXIT, type ExitStatus } from '../exit-status.ts';
import { evaluateFile } from '../files/evaluate-file.ts';
import { explanationText } from '../output/explanation-text.ts';
import { diagnosticsText, writeFaults } from '../output/print-diagnostics.ts';
import type { Invocation } from '../program.ts';

/** Shows where one result of a sheet comes from, as a tree. */
export async function explain(
  file: string,
  name: string,
  options: ExplainOptions,
  at: Invocation,
): Promise<ExitStatus> {
  const { report, diagnostics } = await evaluateFile(file, options, at);
  if (report === null) {
    writeFaults(diagnostics, options.format, at);
    return EXIT.sheetWrong;
  }
  if (diagnostics.length > 0) at.streams.err(diagnosticsText(diagnostics, at.paintErr));
  const found = explainBlock(report, name);
  if ('nearest' in found) {
    const hints = found.nearest.length === 0 ? [] : [`did you mean \`${found.nearest.join('`, `')}\`?`];
    throw new CommandFailure(EXIT.usage, `the sheet has no quantity and no check \`${name}\``, hints);
  }
  const { number, title, digest } = report.sheet;
  at.streams.out(
    options.format === 'json'
      ? `${JSON.stringify({ antinode: 'explanation/1', sheet: { number, title, digest }, tree: found.tree }, null, 2)}\n`
      : explanationText(found.tree, at.paintOut),
  );
  return EXIT.done;
}
