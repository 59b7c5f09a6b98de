/**
 * A thread that evaluates sheets for the server. Sheets and claimed reports come from outside: here they can take no more
 * time and memory than this thread is given, and the server goes on whatever they do.
 */
import { parentPort } from 'node:worker_threads';
import { evaluateSheet } from '../../core/evaluate/evaluate-sheet.ts';
import { compareReports } from '../../core/report/compare-reports.ts';
import { validateReport } from '../../core/report/generated/validate-report.js';
import type { Answer, Outcome, Task } from './protocol.ts';

/** More would tell nobody more. */
const MOST_DIFFERENCES = 50;
const LONGEST_VALUE = 400;

function evaluate({ entry, files, claimed }: Task): Outcome {
  const { report, diagnostics } = evaluateSheet({ entry, files });
  if (report === null || claimed === undefined) return { report, diagnostics, differences: [] };
  if (!validateReport(claimed)) return { report, diagnostics, differences: [], fault: shapeFault() };
  const differences = compareReports(claimed, report)
    .slice(0, MOST_DIFFERENCES)
    .map(({ path, yours, ours }) => ({ path: cut(path), yours: cut(yours), ours: cut(ours) }));
  return { report, diagnostics, differences };
}

function shapeFault(): string {
  const [first] = validateReport.errors ?? [];
  return `${cut(first?.instancePath ?? '') || 'the report'} ${first?.message ?? 'is wrong'}`;
}

function cut(text: string): string {
  return text.length > LONGEST_VALUE ? `${text.slice(0, LONGEST_VALUE)}…` : text;
}

function answer(message: Answer): void {
  parentPort?.postMessage(message);
}

parentPort?.on('message', (task: Task) => {
  try {
    answer({ answer: 'outcome', outcome: evaluate(task) });
  } catch (cause) {
    // The core throws on a bug of ours only; the server logs it and answers for it.
    answer({ answer: 'failed', message: cause instanceof Error ? (cause.stack ?? cause.message) : String(cause) });
  }
});
answer({ answer: 'ready' });
